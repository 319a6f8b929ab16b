import { groundLevelAt, surfaceAt } from '../../calc/line/line-sections'
import type { Station } from '../../schemas/line'
import type { ChainageWindow, LongSectionInput } from './long-section-input'

/** Parts shorter than this show nothing [m]. */
const LEAST_WINDOW = 0.5

/** What a long section shows of a window: everything cut at its ends, whatever lies outside left out. */
export function windowed(input: LongSectionInput): LongSectionInput {
  const window = input.window ? insideOf(input, input.window) : null
  if (!window) return input
  const isIn = (chainage: number) => window.from <= chainage && chainage <= window.to
  const cut = <Part extends { readonly from: number; readonly to: number }>(
    parts: readonly Part[],
  ) =>
    parts
      .filter(({ from, to }) => to > window.from && from < window.to)
      .map((part) => ({
        ...part,
        from: Math.max(part.from, window.from),
        to: Math.min(part.to, window.to),
      }))
  return {
    ...input,
    stations: cutStations(input.stations, window),
    runs: cut(input.runs),
    sections: cut(input.sections),
    weakest: input.weakest && isIn(input.weakest.chainage) ? input.weakest : null,
    place: input.place !== null && isIn(input.place) ? input.place : null,
  }
}

/** The window, kept on the line; null where it shows all of it, or a part too short to show. */
function insideOf({ stations, sectionLength }: LongSectionInput, window: ChainageWindow) {
  const first = stations[0]!.chainage
  const end = stations[stations.length - 1]!.chainage
  const last = end > first ? end : first + sectionLength
  const from = Math.max(first, window.from)
  const to = Math.min(last, window.to)
  const isWhole = from <= first && to >= last
  return isWhole || to - from < LEAST_WINDOW ? null : { from, to }
}

function cutStations(stations: readonly Station[], { from, to }: ChainageWindow): Station[] {
  const at = (chainage: number): Station => ({
    chainage,
    x: null,
    y: null,
    groundLevel: groundLevelAt(stations, chainage),
    surface: surfaceAt(stations, chainage),
    clearWidth: null,
    note: '',
  })
  const inside = stations.filter(({ chainage }) => chainage > from && chainage < to)
  return [at(from), ...inside, at(to)]
}
