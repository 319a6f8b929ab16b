import { lineSections } from '../calc/line/line-sections'
import { isInRange, rangeFault, showValue, type AllowedRange, type Fault } from '../errors'
import { caseAt, sizeAt } from '../checks/place-case'
import { eventSettingsFaults } from './event-settings-faults'
import { STATION_RANGES } from './station-ranges'
import { deploymentFaults } from './deployment-faults'
import type { Survey } from './line-faults'
import type { GroundAssumption, ScenarioContent, SizeRun } from './scenario'
import { sectionFaults } from './section-faults'
import { resolveRange, type NumericPath } from './section-ranges'

const LEVEL = STATION_RANGES.groundLevel

/** Fastest rise that can be meant: 10 m/h. */
const RATE_OF_RISE: AllowedRange = { min: 0, max: 10 / 3600, unit: 'm/s' }

/** Longest time to clear an area: a day. */
const TIME_TO_CLEAR: AllowedRange = { min: 0, max: 86_400, unit: 's' }

/**
 * Everything in a scenario that cannot be computed on its line. Gaps between sizes are no faults:
 * their sections are answered as not checked.
 */
export function scenarioFaults(content: ScenarioContent, survey: Survey): readonly Fault[] {
  const faults = [
    ...ownFaults(content, survey),
    ...content.sizes.flatMap(emptyRun),
    ...groundFaults(content, survey),
    ...caseFaults(content),
  ]
  return faults.length > 0 ? faults : dryLevelFaults(content, survey)
}

function ownFaults(content: ScenarioContent, { stations, sectionLength }: Survey): Fault[] {
  const first = stations[0]!.chainage
  const last = stations[stations.length - 1]!.chainage
  const place = { min: first, max: last > first ? last : first + sectionLength, unit: 'm' }
  return [
    ...faultOutside('waterLevel', content.waterLevel, LEVEL),
    ...faultOutside('levelNow', content.levelNow, LEVEL),
    ...faultOutside('levelLow', content.levelLow, LEVEL),
    ...faultOutside('levelHigh', content.levelHigh, LEVEL),
    ...faultOutside('dryLevel', content.dryLevel, LEVEL),
    ...faultOutside('place', content.place, place),
    ...faultOutside('rateOfRise', content.rateOfRise, RATE_OF_RISE),
    ...faultOutside('timeToClear', content.timeToClear, TIME_TO_CLEAR),
    ...(content.event ? eventSettingsFaults(content.event) : []),
    ...deploymentFaults(content.deployment, place),
  ]
}

function faultOutside(
  field: string,
  value: number | null | undefined,
  range: AllowedRange,
): Fault[] {
  // Contents that were stored before a field was there lack it.
  if (value === null || value === undefined || isInRange(value, range)) return []
  return [rangeFault(`content.${field}`, value, range)]
}

/** A run of sizes goes up the chainage. */
function emptyRun({ from, to }: SizeRun, index: number): Fault[] {
  const path = `content.sizes[${index}]`
  const outside = (['from', 'to'] as const).flatMap((end) => {
    const value = end === 'from' ? from : to
    const isInside = isInRange(value, STATION_RANGES.chainage)
    return isInside ? [] : [rangeFault(`${path}.${end}`, value, STATION_RANGES.chainage)]
  })
  if (outside.length > 0 || to > from) return outside
  const { max, unit } = STATION_RANGES.chainage
  return [rangeFault(`${path}.to`, to, { min: from, minExcluded: true, max, unit })]
}

/** Each surface of the line is assumed once. */
function groundFaults({ grounds }: ScenarioContent, { stations }: Survey): Fault[] {
  const assumed = grounds.map(({ surface }) => surface)
  const twice = assumed.flatMap((surface, i) => {
    if (assumed.indexOf(surface) === i) return []
    return [wordFault(`content.grounds[${i}].surface`, surface, 'a surface that is not there yet')]
  })
  const missing = [...new Set(stations.map(({ surface }) => surface))]
    .filter((surface) => !assumed.includes(surface))
    .map((surface) => {
      const allowed = `given an assumption for ${showValue(surface)}, which the line has`
      return wordFault('content.grounds', grounds, allowed)
    })
  return [...twice, ...missing]
}

function wordFault(path: string, value: unknown, allowed: string): Fault {
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return { path, value, allowed, unit: '–', message }
}

/** Faults of the cross-sections, named as the scenario names their fields. */
function caseFaults(content: ScenarioContent): Fault[] {
  const [firstRun] = content.sizes
  const [firstGround] = content.grounds
  const ofSizes = content.sizes.flatMap((run, size) =>
    faultsOfCase(content, { run, ground: firstGround!, size, assumption: 0 }),
  )
  const ofGrounds = content.grounds.flatMap((ground, assumption) =>
    faultsOfCase(content, { run: firstRun!, ground, size: 0, assumption }),
  )
  const byPath = new Map([...ofSizes, ...ofGrounds].map((fault) => [fault.path, fault]))
  return [...byPath.values()]
}

interface Pairing {
  readonly run: SizeRun
  readonly ground: GroundAssumption
  readonly size: number
  readonly assumption: number
}

function faultsOfCase(content: ScenarioContent, pairing: Pairing): Fault[] {
  const { run, ground } = pairing
  // Depths follow from levels: here both are 0, so that only what was typed can be at fault.
  const dry = { ...content, waterLevel: 0, dryLevel: null }
  const section = caseAt(dry, { chainage: 0, groundLevel: 0, surface: ground.surface }, run, ground)
  return sectionFaults(section).map((fault) => renamed(fault, scenarioPath(fault.path, pairing)))
}

function scenarioPath(path: string, { run, size, assumption }: Pairing): string {
  if (path.startsWith('barrier.')) return `content.sizes[${size}].${path}`
  if (path === 'ground.fall') return 'content.fall'
  if (path.startsWith('ground.')) return path.replace('ground.', `content.grounds[${assumption}].`)
  if (path === 'uplift.edgeFactor' && run.edgeFactor !== null) {
    return `content.sizes[${size}].edgeFactor`
  }
  return `content.${path}`
}

/** Messages begin with the path. */
function renamed(fault: Fault, path: string): Fault {
  return { ...fault, path, message: `${path}${fault.message.slice(fault.path.length)}` }
}

/** Water on the dry side is computed up to 1.5 diameters; the lowest place decides. */
function dryLevelFaults(content: ScenarioContent, survey: Survey): Fault[] {
  const { dryLevel } = content
  if (dryLevel === null) return []
  const tops = lineSections(survey.stations, survey.sectionLength, survey.marks).flatMap(
    (section) => {
      const run = sizeAt(content, (section.from + section.to) / 2)
      if (!run) return []
      const read = (path: NumericPath) =>
        path === 'barrier.diameter' ? run.barrier.diameter : undefined
      const { max } = resolveRange('water.dryDepth', read)
      return section.pieces.map(({ lowestGround }) => lowestGround + max)
    },
  )
  const top = tops.length > 0 ? Math.min(...tops) : LEVEL.max
  return faultOutside('dryLevel', dryLevel, { min: LEVEL.min, max: top, unit: 'm' })
}
