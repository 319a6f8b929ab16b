import { describe, expect, it } from 'vitest'
import {
  deploymentSettingsSchema,
  type DeploymentSettings,
} from '../../../shared/schemas/deployment'
import { deploymentFaults } from '../../../shared/schemas/deployment-faults'
import { scenarioFaults } from '../../../shared/schemas/scenario-faults'
import { lowRoadContent, LOW_ROAD_SURVEY } from '../../support/ferry-quay'

const LINE = { min: 0, max: 180, unit: 'm' }
const settings = (changes: Partial<DeploymentSettings>) => ({
  ...deploymentSettingsSchema.parse({}),
  ...changes,
})
const times = { carry: 60, unroll: 60, align: 60, fill: 60, join: 60, ballast: 60 }

describe('faults of a deployment plan', () => {
  it('has none where nobody has planned, or all can be computed', () => {
    expect(deploymentFaults(null, LINE)).toEqual([])
    expect(deploymentFaults(undefined, LINE)).toEqual([])
    expect(deploymentFaults(settings({ gust: 14, outwardFrom: 40 }), LINE)).toEqual([])
  })

  it.each([
    ['no pair', { pairs: 0 }, 'pairs', '1 to 50'],
    ['a crowd of blowers', { blowers: 51 }, 'blowers', '1 to 50'],
    ['a storm beyond the formula', { gust: 61 }, 'gust', '0 to 60 m/s'],
    ['a margin below zero', { wantedMargin: -1 }, 'wantedMargin', '0 to 172800 s'],
    ['a place off the line', { outwardFrom: 181 }, 'outwardFrom', '0 to 180 m'],
    ['a decision before 1970', { decidedAt: -1 }, 'decidedAt', '0 to 7258118400000 ms since 1970'],
    [
      'a step that takes no number',
      { sizeTimes: [{ diameter: 0.7, times: { ...times, fill: Number.NaN } }] },
      'sizeTimes[0].times.fill',
      '0 to 86400 s',
    ],
    [
      'a size that no barrier has',
      { sizeTimes: [{ diameter: 9, times }] },
      'sizeTimes[0].diameter',
      '0.2 to 3 m',
    ],
  ])('names field, value and range for %s', (_what, changes, path, allowed) => {
    const [fault, ...others] = deploymentFaults(settings(changes), LINE)
    expect(others).toEqual([])
    expect(fault).toMatchObject({ path: `content.deployment.${path}`, allowed })
    expect(fault!.message).toContain(allowed)
  })

  it('is told with the other faults of a scenario', () => {
    const content = { ...lowRoadContent(), deployment: settings({ pairs: 0 }) }
    const paths = scenarioFaults(content, LOW_ROAD_SURVEY).map(({ path }) => path)
    expect(paths).toContain('content.deployment.pairs')
  })
})
