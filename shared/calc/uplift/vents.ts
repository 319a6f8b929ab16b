import { findRoot } from '../numerics/find-root'
import { cumulative, headOf, settledHead, type Cumulative, type ModeState } from './mode-sums'

/** A part of the base where the head would stand above the water that lies on the skirt. */
export interface Vent {
  /** Fractions from the wet edge. */
  readonly from: number
  readonly to: number
  /** Integrals of the head up to both ends. */
  readonly atFrom: Cumulative
  readonly atTo: Cumulative
}

/** Places along the base that are looked at for a crossing, closer together at the wet edge. */
const LOOKS = 40
const PLACES = Array.from({ length: LOOKS + 1 }, (_, i) => (i === 0 ? 1e-9 : (i / LOOKS) ** 2))

/** Sines of all modes at the places that are looked at; filled when the water first falls. */
export class LookTable {
  private table: Float64Array | null = null

  constructor(private readonly modes: number) {}

  /** Head at the place i [m]. */
  headAt(state: ModeState, i: number): number {
    const table = (this.table ??= sinesAtPlaces(this.modes))
    const { modes, moving } = state
    const row = i * this.modes
    let sum = settledHead(state, PLACES[i]!)
    for (let n = 0; n < moving; n += 1) sum += modes[n]! * table[row + n]!
    return sum
  }
}

function sinesAtPlaces(modes: number): Float64Array {
  return Float64Array.from({ length: modes * PLACES.length }, (_, at) => {
    const place = PLACES[Math.floor(at / modes)]!
    return Math.sin(((at % modes) + 1) * Math.PI * place)
  })
}

/** Parts of the base where the head is above `cap` [m], from the wet edge to the toe. */
export function ventsOf(state: ModeState, cap: number, looks: LookTable): readonly Vent[] {
  // The edge itself equals the cap for η = 1: a hair above it is no vent.
  const limit = cap * (1 + 1e-12)
  const above = (xi: number): number => headOf(state, xi) - limit
  const vents: Vent[] = []
  let atLow = looks.headAt(state, 0) - limit
  let from = atLow > 0 ? 0 : null
  for (let i = 1; i <= LOOKS; i += 1) {
    const atHigh = looks.headAt(state, i) - limit
    if (atLow > 0 !== atHigh > 0) {
      const bracket = { low: PLACES[i - 1]!, high: PLACES[i]!, atLow, atHigh }
      const crossing = findRoot(above, bracket, 1e-10)
      if (from === null) from = crossing
      else {
        vents.push(vent(state, from, crossing))
        from = null
      }
    }
    atLow = atHigh
  }
  if (from !== null) vents.push(vent(state, from, 1))
  return vents
}

const NOTHING: Cumulative = { area: 0, moment: 0 }

function vent(state: ModeState, from: number, to: number): Vent {
  const atFrom = from === 0 ? NOTHING : cumulative(state, from)
  return { from, to, atFrom, atTo: cumulative(state, to) }
}

/** What the cap cuts off between the wet edge and ξ: area and moment about the edge [m]. */
export function excessUpTo(
  state: ModeState,
  cap: number,
  vents: readonly Vent[],
  xi: number,
): Cumulative {
  let area = 0
  let moment = 0
  for (const { from, to, atFrom, atTo } of vents) {
    if (xi <= from) break
    const end = Math.min(to, xi)
    const atEnd = end === to ? atTo : cumulative(state, end)
    area += atEnd.area - atFrom.area - cap * (end - from)
    moment += atEnd.moment - atFrom.moment - (cap * (end * end - from * from)) / 2
  }
  return { area, moment }
}
