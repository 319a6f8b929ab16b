import type { Store, StoreItem, StoreKind } from '../../schemas/depot'
import type { LineMark } from '../../schemas/mark'
import type { LayoutBill } from './layout-bill'

/** What is needed of one kind and size, and what the depots hold of it. */
export interface StoreRow {
  readonly kind: StoreKind
  /** Tube of the catalogue; null for anything else, and for a tube with figures of its own. */
  readonly barrierId: string | null
  /** Of a tube, or of the pipe that a plug fits [m]; null where the kind has none. */
  readonly diameter: number | null
  readonly needed: number
  readonly serviceable: number
  readonly inRepair: number
  /** Pieces that are missing; those in repair do not count as there. */
  readonly short: number
  readonly depots: readonly DepotRow[]
}

export interface DepotRow {
  readonly name: string
  readonly serviceable: number
  readonly inRepair: number
}

type Wanted = Pick<StoreRow, 'kind' | 'barrierId' | 'diameter' | 'needed'>

/** What is counted against the store. */
export type Needs = Pick<LayoutBill, 'tubes' | 'closures' | 'edgeBags'> & {
  /** Bags against the wind; left out where no gust is known. */
  readonly ballastBags?: number
}

/**
 * Compares what a layout needs with what the depots hold: tubes by size, closures, bags for edge and
 * ballast, and a plug for each pipe that is still open.
 *
 * @param marks Marks of the line.
 */
export function againstStore(
  bill: Needs,
  store: Pick<Store, 'depots'>,
  marks: readonly LineMark[] = [],
): readonly StoreRow[] {
  return wantedOf(bill, marks).map((wanted) => rowOf(wanted, store))
}

function wantedOf(
  { tubes, closures, edgeBags, ballastBags = 0 }: Needs,
  marks: readonly LineMark[],
): readonly Wanted[] {
  const none = { barrierId: null, diameter: null }
  return [
    ...tubes.map(({ barrierId, diameter, count }) => ({
      kind: 'tube' as const,
      barrierId,
      diameter,
      needed: count,
    })),
    ...(closures > 0 ? [{ kind: 'closure' as const, ...none, needed: closures }] : []),
    ...(edgeBags > 0 ? [{ kind: 'edge-bag' as const, ...none, needed: edgeBags }] : []),
    ...(ballastBags > 0 ? [{ kind: 'ballast-bag' as const, ...none, needed: ballastBags }] : []),
    ...plugsOf(marks),
  ]
}

/** Pipes that stand open, by their diameter. */
function plugsOf(marks: readonly LineMark[]): readonly Wanted[] {
  const counts = new Map<number, number>()
  for (const { kind, state, diameter } of marks) {
    const isPipe = kind === 'gully' || kind === 'outfall' || kind === 'pipe'
    if (!isPipe || state !== 'open' || diameter === null) continue
    counts.set(diameter, (counts.get(diameter) ?? 0) + 1)
  }
  return [...counts].map(([diameter, needed]) => ({
    kind: 'plug' as const,
    barrierId: null,
    diameter,
    needed,
  }))
}

function rowOf(wanted: Wanted, { depots }: Pick<Store, 'depots'>): StoreRow {
  const rows = depots
    .map(({ name, items }) => {
      const mine = items.filter((item) => isOf(item, wanted))
      const sum = (part: 'serviceable' | 'inRepair') =>
        mine.reduce((total, item) => total + item[part], 0)
      return { name, serviceable: sum('serviceable'), inRepair: sum('inRepair') }
    })
    .filter(({ serviceable, inRepair }) => serviceable + inRepair > 0)
  const serviceable = rows.reduce((sum, row) => sum + row.serviceable, 0)
  const inRepair = rows.reduce((sum, row) => sum + row.inRepair, 0)
  const short = Math.max(0, wanted.needed - serviceable)
  return { ...wanted, serviceable, inRepair, short, depots: rows }
}

/** Diameters this close are one [m]. */
const SAME_DIAMETER = 0.001

function isOf(item: StoreItem, { kind, barrierId, diameter }: Wanted): boolean {
  if (item.kind !== kind) return false
  if (kind === 'tube') return barrierId !== null && item.barrierId === barrierId
  if (kind !== 'plug') return true
  return item.diameter !== null && Math.abs(item.diameter - diameter!) < SAME_DIAMETER
}
