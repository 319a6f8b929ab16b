import type { Station } from '../../schemas/line'
import type { LineMark } from '../../schemas/mark'
import { lineTurns } from './line-turns'

/** A part of a section with one surface, and its lowest ground. */
export interface SectionPiece {
  readonly from: number
  readonly to: number
  readonly surface: string
  /** Lowest ground of the piece and where it lies [m]. */
  readonly lowestGround: number
  readonly lowestAt: number
}

/** One tube length of the line. */
export interface LineSection {
  readonly from: number
  readonly to: number
  readonly pieces: readonly SectionPiece[]
  /** Least clear width on the wet side in the section [m]; null where it is not known. */
  readonly clearWidth: number | null
  /** Turns at its ends, positive to the left, away from the water [rad]; 0: straight on. */
  readonly turnAtStart: number
  readonly turnAtEnd: number
}

/** Chainages closer than this are one place [m]. */
const SAME_PLACE = 1e-6

/**
 * Cuts a line into sections. Turns of 5° and more and both ends bound runs; each run is laid from its
 * lower chainage in ⌈run / section length⌉ sections. A line with one station is one section.
 *
 * @param stations In order of chainage, one or more.
 * @param marks Marks of the line; its turns count where x and y are not known.
 */
export function lineSections(
  stations: readonly Station[],
  sectionLength: number,
  marks: readonly LineMark[] = [],
): readonly LineSection[] {
  const first = stations[0]!
  const last = stations[stations.length - 1]!
  if (stations.length === 1) return [singleSection(first, sectionLength)]
  const bounds = [
    { chainage: first.chainage, angle: 0 },
    ...lineTurns(stations, marks),
    { chainage: last.chainage, angle: 0 },
  ]
  const finder = spanFinder(stations)
  return bounds.slice(1).flatMap((end, i) => {
    const start = bounds[i]!
    const run = end.chainage - start.chainage
    const count = Math.max(1, Math.ceil(run / sectionLength - SAME_PLACE))
    return Array.from({ length: count }, (_, n) => {
      const from = start.chainage + n * sectionLength
      const to = Math.min(end.chainage, from + sectionLength)
      return {
        ...sectionBetween(finder, from, to),
        turnAtStart: n === 0 ? start.angle : 0,
        turnAtEnd: n === count - 1 ? end.angle : 0,
      }
    })
  })
}

/** Without a survey: one section on the one ground that is known. */
function singleSection(station: Station, sectionLength: number): LineSection {
  const { chainage, surface, groundLevel, clearWidth } = station
  const to = chainage + sectionLength
  const piece = {
    from: chainage,
    to,
    surface,
    lowestGround: groundLevel,
    lowestAt: chainage,
  }
  return { from: chainage, to, pieces: [piece], clearWidth, turnAtStart: 0, turnAtEnd: 0 }
}

type FindSpans = (from: number, to: number) => readonly Span[]

/** Finds spans between stations; sections come in order, so the search goes on where it was. */
function spanFinder(stations: readonly Station[]): FindSpans {
  let first = 0
  return (from, to) => {
    while (first < stations.length - 2 && stations[first + 1]!.chainage <= from) first += 1
    const spans: Span[] = []
    for (let i = first; i < stations.length - 1 && stations[i]!.chainage < to; i += 1) {
      const [station, next] = [stations[i]!, stations[i + 1]!]
      const start = Math.max(from, station.chainage)
      const end = Math.min(to, next.chainage)
      if (end - start > SAME_PLACE) spans.push({ station, next, start, end })
    }
    return spans
  }
}

function sectionBetween(find: FindSpans, from: number, to: number) {
  const spans = find(from, to)
  const widths = spans.flatMap(({ station }) => station.clearWidth ?? [])
  return {
    from,
    to,
    pieces: mergeBySurface(spans.map(pieceOf)),
    clearWidth: widths.length > 0 ? Math.min(...widths) : null,
  }
}

interface Span {
  readonly station: Station
  readonly next: Station
  readonly start: number
  readonly end: number
}

/** Ground is linear between stations, so the lowest point of a span is one of its ends. */
function pieceOf({ station, next, start, end }: Span): SectionPiece {
  const atStart = groundBetween(station, next, start)
  const atEnd = groundBetween(station, next, end)
  const isStart = atStart <= atEnd
  return {
    from: start,
    to: end,
    surface: station.surface,
    lowestGround: isStart ? atStart : atEnd,
    lowestAt: isStart ? start : end,
  }
}

function groundBetween(a: Station, b: Station, chainage: number): number {
  const share = (chainage - a.chainage) / (b.chainage - a.chainage)
  return a.groundLevel + share * (b.groundLevel - a.groundLevel)
}

/** Joins neighbours on one surface; the lower ground of both is that of the whole. */
function mergeBySurface(pieces: readonly SectionPiece[]): readonly SectionPiece[] {
  const merged: SectionPiece[] = []
  for (const piece of pieces) {
    const before = merged.at(-1)
    if (before?.surface !== piece.surface) {
      merged.push(piece)
      continue
    }
    const lower = piece.lowestGround < before.lowestGround ? piece : before
    merged[merged.length - 1] = {
      ...before,
      to: piece.to,
      lowestGround: lower.lowestGround,
      lowestAt: lower.lowestAt,
    }
  }
  return merged
}

/** Ground level at a chainage [m], linear between stations, level beyond the ends. */
export function groundLevelAt(stations: readonly Station[], chainage: number): number {
  const first = stations[0]!
  if (chainage <= first.chainage) return first.groundLevel
  for (let i = 1; i < stations.length; i += 1) {
    const next = stations[i]!
    if (chainage <= next.chainage) return groundBetween(stations[i - 1]!, next, chainage)
  }
  return stations[stations.length - 1]!.groundLevel
}

/** Surface from the last station at or before a chainage on. */
export function surfaceAt(stations: readonly Station[], chainage: number): string {
  const before = stations.filter((station) => station.chainage <= chainage + SAME_PLACE)
  return (before.at(-1) ?? stations[0]!).surface
}
