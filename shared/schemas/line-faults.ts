import { isInRange, rangeFault, showValue, type AllowedRange, type Fault } from '../errors'
import { lineCrossing } from '../calc/line/line-crossings'
import { lineSections } from '../calc/line/line-sections'
import { lineTurns } from '../calc/line/line-turns'
import { isTurnTooSharp } from '../catalogue/joints'
import type { Station } from './line'
import type { LineMark } from './mark'
import { STATION_RANGES } from './station-ranges'

/** A survey as it is sent: stations, and the section length that is laid on them. */
export interface Survey {
  readonly stations: readonly Station[]
  readonly sectionLength: number
  /** Marks on the line; its turns count where x and y are not known. */
  readonly marks?: readonly LineMark[]
}

/** Something that may be right, but looks like a slip. */
export interface SurveyWarning {
  readonly path: string
  readonly message: string
}

/** Least distance between two stations [m]: below it they are one place. */
export const LEAST_STATION_GAP = 0.001

/** Most sections that one line is checked in: 20 km of 10 m. */
export const MOST_SECTIONS = 2000

/** Bounds of a local grid; they catch degrees and millimetres, not places. */
const COORDINATE: AllowedRange = { min: -10_000_000, max: 10_000_000, unit: 'm' }

/** Keeps rounding of a decimal chainage from counting as a difference [m]. */
const ROUNDING = 1e-9

/** Everything that makes a survey unusable. An empty list: the line can be checked. */
export function lineFaults(survey: Survey): readonly Fault[] {
  const faults = survey.stations.flatMap((station, i) => [
    ...rangeFaults(station, i),
    ...halfPlace(station, i),
    ...notRising(survey.stations, i),
  ])
  return faults.length > 0 ? faults : [...tooManySections(survey), ...crossing(survey)]
}

function rangeFaults(station: Station, index: number): Fault[] {
  const ranges = { ...STATION_RANGES, x: COORDINATE, y: COORDINATE }
  return Object.entries(ranges).flatMap(([field, range]) => {
    const value = station[field as keyof typeof ranges]
    if (value === null || isInRange(value, range)) return []
    return [rangeFault(`stations[${index}].${field}`, value, range)]
  })
}

/** A line that crosses itself has no wet side. */
function crossing({ stations }: Survey): Fault[] {
  const found = lineCrossing(stations)
  if (!found) return []
  const span = (index: number) =>
    `ch ${stations[index]!.chainage} to ${stations[index + 1]!.chainage}`
  const path = `stations[${found.second}].x`
  const allowed = `such that ${span(found.second)} does not cross ${span(found.first)}`
  const value = stations[found.second]!.x
  const message = `${path}: ${value} is not allowed; it must be ${allowed}`
  return [{ path, value, allowed, unit: 'm', message }]
}

/** A place in the grid needs both coordinates. */
function halfPlace({ x, y }: Station, index: number): Fault[] {
  if ((x === null) === (y === null)) return []
  const missing = x === null ? 'x' : 'y'
  const path = `stations[${index}].${missing}`
  const fault = rangeFault(path, null, COORDINATE)
  return [{ ...fault, message: `${fault.message} (x and y belong together)` }]
}

function notRising(stations: readonly Station[], index: number): Fault[] {
  const before = stations[index - 1]
  const { chainage } = stations[index]!
  if (!before || chainage - before.chainage >= LEAST_STATION_GAP - ROUNDING) return []
  const path = `stations[${index}].chainage`
  const allowed = `${LEAST_STATION_GAP} m or more above the station before it, ${before.chainage} m`
  const message = `${path}: ${chainage} is not allowed; it must be ${allowed}`
  return [{ path, value: chainage, allowed, unit: 'm', message }]
}

function tooManySections({ stations, sectionLength, marks }: Survey): Fault[] {
  const length = stations[stations.length - 1]!.chainage - stations[0]!.chainage
  const isTooMany =
    length / sectionLength > MOST_SECTIONS ||
    lineSections(stations, sectionLength, marks).length > MOST_SECTIONS
  if (!isTooMany) return []
  const path = 'sectionLength'
  const allowed = `long enough for ${MOST_SECTIONS} sections or fewer on ${length} m`
  const message = `${path}: ${sectionLength} is not allowed; it must be ${allowed}`
  return [{ path, value: sectionLength, allowed, unit: 'm', message }]
}

/**
 * What looks like a slip in a survey: a distance in the grid that differs from the chainage by more
 * than 0.05 m or 1 %, a turn that no joint takes, a line shorter than one section, or a surface that
 * the catalogue does not know, so that each scenario must say what it assumes of it.
 *
 * @param knownSurfaces Grounds of the catalogue.
 * @param sectionLength Length of a tube [m]; left out: not compared.
 */
export function lineWarnings(
  stations: readonly Station[],
  knownSurfaces: readonly string[],
  sectionLength = 0,
): readonly SurveyWarning[] {
  const unknown = new Set(
    stations.map(({ surface }) => surface).filter((surface) => !knownSurfaces.includes(surface)),
  )
  return [
    ...stations.flatMap((_, i) => strayDistance(stations, i)),
    ...sharpTurns(stations),
    ...shortLine(stations, sectionLength),
    ...[...unknown].map((surface) => {
      const index = stations.findIndex((station) => station.surface === surface)
      const path = `stations[${index}].surface`
      const message = `${path}: ${showValue(surface)} is not in the catalogue; each scenario must say what it assumes of it`
      return { path, message }
    }),
  ]
}

/** Turns that no joint takes: the line must turn in two places, a section apart. */
function sharpTurns(stations: readonly Station[]): SurveyWarning[] {
  return lineTurns(stations)
    .filter(({ angle }) => isTurnTooSharp(angle))
    .map(({ chainage, angle }) => {
      const index = stations.findIndex((station) => station.chainage === chainage)
      const degrees = Math.round(Math.abs((angle * 180) / Math.PI))
      const path = `stations[${index}].chainage`
      const message = `${path}: the line turns by ${degrees}° at ch ${chainage}; a joint takes 90° at most. Turn in two places, one section apart`
      return { path, message }
    })
}

function shortLine(stations: readonly Station[], sectionLength: number): SurveyWarning[] {
  const length = stations[stations.length - 1]!.chainage - stations[0]!.chainage
  if (stations.length < 2 || length >= sectionLength) return []
  const path = 'sectionLength'
  const message = `${path}: one section is ${sectionLength} m long, the whole line ${length} m: the tube reaches beyond its end`
  return [{ path, message }]
}

function strayDistance(stations: readonly Station[], index: number): SurveyWarning[] {
  const before = stations[index - 1]
  const here = stations[index]!
  if (!before) return []
  const distance = distanceBetween(before, here)
  if (distance === null) return []
  const step = here.chainage - before.chainage
  if (Math.abs(distance - step) <= Math.min(0.05, 0.01 * step) + ROUNDING) return []
  const path = `stations[${index}].chainage`
  const message = `${path}: ${here.chainage} is ${step.toFixed(2)} m from the station before it, x and y are ${distance.toFixed(2)} m away`
  return [{ path, message }]
}

/** Distance of two stations in the grid [m]; null where it is not known. */
function distanceBetween(a: Station, b: Station): number | null {
  if (a.x === null || a.y === null || b.x === null || b.y === null) return null
  return Math.hypot(b.x - a.x, b.y - a.y)
}
