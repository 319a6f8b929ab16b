import { groundLevelAt, surfaceAt } from '../../calc/line/line-sections'
import { pathBetween, locatedStations, nearestOn } from '../../calc/line/line-path'
import type { Station } from '../../schemas/line'
import type { Survey } from '../../schemas/line-faults'
import type { ScenarioBarrier, ScenarioContent } from '../../schemas/scenario'
import type { Verdict } from '../../schemas/section-result'
import { checkLine, type HoldingProfiles } from '../line-check'
import { bestLayout, runsOfLayout } from './best-layout'
import { layoutBill, type LayoutBill } from './layout-bill'

/** A line in a few figures: what its best layout would need, and what it would hold. */
export interface LineFigures {
  /** Length along the chainage [m]. */
  readonly length: number
  /** Lowest ground [m]. */
  readonly lowestGround: number
  readonly verdict: Verdict
  readonly holdsToLevel: number | null
  readonly bill: LayoutBill
}

/** Figures of a line under the assumptions of a scenario, laid in the best way at its level. */
export function lineFigures(
  survey: Survey,
  content: ScenarioContent,
  sizes: readonly ScenarioBarrier[],
  profiles: HoldingProfiles = new Map(),
): LineFigures {
  const first = survey.stations[0]!
  const last = survey.stations[survey.stations.length - 1]!
  const bare = { ...content, place: first.chainage, sizes: [] }
  const runs = runsOfLayout(bestLayout(survey, bare, sizes), bare)
  const laid = { ...bare, sizes: [...runs] }
  const { weakest, verdict } = checkLine(survey, laid, profiles)
  return {
    length: last.chainage - first.chainage,
    lowestGround: Math.min(...survey.stations.map(({ groundLevel }) => groundLevel)),
    verdict,
    holdsToLevel: weakest.holdsToLevel,
    bill: layoutBill(survey, laid),
  }
}

/**
 * A stretch of a line as a line of its own; where it begins and ends between stations, the ground is
 * taken straight.
 *
 * @param from Below `to`, both on the line.
 */
export function stretchOf(survey: Survey, from: number, to: number): Survey {
  const { stations, marks = [] } = survey
  const path = locatedStations(stations)
  const at = (chainage: number): Station => {
    const known = stations.find((station) => Math.abs(station.chainage - chainage) < 1e-6)
    if (known) return known
    const place = path.length > 1 ? pathBetween(path, chainage, chainage)[0]! : null
    return {
      chainage,
      x: place?.x ?? null,
      y: place?.y ?? null,
      groundLevel: groundLevelAt(stations, chainage),
      surface: surfaceAt(stations, chainage),
      clearWidth: stations.filter((s) => s.chainage <= chainage).at(-1)?.clearWidth ?? null,
      note: '',
    }
  }
  const inside = stations.filter(({ chainage }) => chainage > from + 1e-6 && chainage < to - 1e-6)
  return {
    ...survey,
    stations: [at(from), ...inside, at(to)],
    marks: marks.filter(({ chainage }) => chainage >= from && chainage <= to),
  }
}

/** Farther than this a line does not meet another [m]. */
const MEETS = 2

/**
 * The stretch of a line that another one replaces: between the places where its ends meet it; null
 * where they do not.
 */
export function replacedStretch(
  line: readonly Station[],
  other: readonly Station[],
): { readonly from: number; readonly to: number } | null {
  const path = locatedStations(line)
  const ends = locatedStations(other)
  const [first, last] = [ends[0], ends[ends.length - 1]]
  if (path.length < 2 || !first || !last) return null
  const [a, b] = [nearestOn(path, first), nearestOn(path, last)]
  if (a.distance > MEETS || b.distance > MEETS) return null
  const [from, to] = [a.chainage, b.chainage].sort((x, y) => x - y)
  return to! - from! > 1 ? { from: round(from!), to: round(to!) } : null
}

function round(chainage: number): number {
  return Number(chainage.toFixed(2))
}
