import { describe, expect, it } from 'vitest'
import { runBatch } from '../../../server/batch/batch-command'
import { sectionCommand } from '../../../server/batch/commands'
import type { CourseScene, Topic } from '../../../shared/demonstrator/course'
import { sceneFigures } from '../../../shared/demonstrator/figures'
import { sceneFacts } from '../../../shared/demonstrator/scene-facts'
import { sectionOf, withValues, type DemoSetting } from '../../../shared/demonstrator/setting'
import { STANDARD_SCENES } from '../../../shared/demonstrator/standard-scenes'
import type { SectionResult } from '../../../shared/schemas/section-result'
import { textResolver } from '../../../shared/texts/format-text'
import { demonstratorAreaTexts } from '../../../shared/texts/demonstrator-area'
import { playedScene } from '../../support/played-scene'

const say = textResolver(demonstratorAreaTexts.en, 'metric')
const scene = (topic: Topic): CourseScene => STANDARD_SCENES.find((one) => one.topic === topic)!

/** What `npm run calc -- section` answers for a setting: it only ever sees JSON. */
function calc(setting: DemoSetting): SectionResult {
  const input: unknown = JSON.parse(JSON.stringify(sectionOf(setting)))
  return runBatch(sectionCommand, input) as SectionResult
}

function shown(topic: Topic) {
  const one = scene(topic)
  const setting = playedScene(one)
  const { head, lines } = sceneFigures(one, setting, 'metric')
  return { setting, facts: sceneFacts(one, one.start), said: [head, ...lines].map(say).join(' ') }
}

describe('figures of the first five scenes are those of `calc section`', () => {
  it('1: the push', () => {
    const { setting, facts, said } = shown('push')
    const { thrust } = calc(setting)
    expect(facts.answer).toBeCloseTo(thrust.total / 9.81, 9)
    expect(said).toContain(`${Math.round(thrust.total / 9.81)}\u00a0kg on every metre`)
    expect(thrust.total / calc(scene('push').start).thrust.total).toBeCloseTo(4, 9)
    expect(said).toContain('4.0 times the push')
  })

  it('2: without a skirt the engine says fails, and sliding is lost at the depth named', () => {
    const { setting, facts } = shown('floats')
    const { answer } = facts
    expect(calc(setting).verdict).toBe('fails')
    const factorAt = (depth: number) => calc(withValues(setting, { depth })).sliding.factor
    expect(factorAt(answer! - 1e-5)).toBeGreaterThan(1)
    expect(factorAt(answer! + 1e-5)).toBeLessThan(1)
  })

  it('3: the water on the skirt', () => {
    const { setting, facts, said } = shown('unroll')
    const { anchoringMassPerSection, thrust } = calc(setting)
    const mass = anchoringMassPerSection / setting.tube.sectionLength
    expect(facts.answer).toBeCloseTo(mass, 9)
    expect(said).toContain(`${Math.round(mass)}\u00a0kg stand on every metre`)
    expect(said).toContain(`Push: ${Math.round(thrust.total / 9.81)}\u00a0kg/m`)
  })

  it('4: push and grip cross where the factor is 1, and we stop at what it holds to', () => {
    const { setting, facts, said } = shown('grip')
    const { sliding, skirt, holdsTo } = calc(setting)
    expect(Math.min(sliding.factor!, skirt.factor!)).toBeCloseTo(1, 4)
    expect(facts.holdsTo).toBe(holdsTo.depth)
    expect(said).toContain(`We stop at ${(Math.floor(holdsTo.depth * 1000) / 1000).toFixed(3)}`)
  })

  it('5: what water under the skirt takes, and what each edge holds to', () => {
    const { setting, facts, said } = shown('creep')
    const at = (edgeFactor: number) => calc(withValues(setting, { edgeFactor }))
    const gripOf = ({ sliding, skirt, thrust }: SectionResult) =>
      Math.min(sliding.factor!, skirt.factor!) * thrust.total
    expect(facts.answer).toBeCloseTo(1 - gripOf(at(1)) / gripOf(at(0)), 9)
    for (const [name, edge] of [
      ['open edge', 1],
      ['weighed', 0.5],
      ['sealed', 0],
    ] as const) {
      const limit = Math.floor(at(edge).holdsTo.depth * 1000) / 1000
      expect(said).toContain(`${name} ${limit.toFixed(3)}\u00a0m`)
    }
  })
})
