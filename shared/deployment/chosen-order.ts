import type { DeploymentSettings, LayingOrder } from '../schemas/deployment'
import { bestJoinedOrder } from './best-joined-order'
import type { Groundwork } from './groundwork'
import { fromOneEnd, lowestFirst, outward, type OrderedSection } from './laying-orders'

type OrderSettings = Pick<DeploymentSettings, 'order' | 'outwardFrom' | 'judgedBy'>

export interface ChosenOrder {
  /** Places in the list of works. */
  readonly order: readonly number[]
  /** Chainage that an outward order begins at [m]. */
  readonly outwardFrom: number | null
  /** Only of the best order: no other joined order is better. */
  readonly isProven: boolean | null
}

/** The order that the settings ask for, with the hours of the band that they judge by. */
export function orderOf(
  settings: OrderSettings,
  ground: Pick<Groundwork, 'works' | 'deadlines' | 'force'>,
): ChosenOrder {
  const { works, deadlines, force } = ground
  const count = works.length
  const sections = works.map(({ lowest }, i): OrderedSection => ({
    lowestGround: lowest.lowestGround,
    deadline: deadlines[settings.judgedBy][i]!,
  }))
  const first = firstSection(works, settings.outwardFrom)
  const plain = (order: readonly number[]): ChosenOrder => ({
    order,
    outwardFrom: null,
    isProven: null,
  })
  if (count === 0) return plain([])
  const orders: Readonly<Record<LayingOrder, () => ChosenOrder>> = {
    'from-start': () => plain(fromOneEnd(count, 'start')),
    'from-end': () => plain(fromOneEnd(count, 'end')),
    'lowest-first': () => plain(lowestFirst(sections)),
    outward: () => {
      const outwardFrom = works[first]!.section.from
      return { ...plain(outward(sections, first)), outwardFrom }
    },
    best: () => {
      const { order, isProven } = bestJoinedOrder({ sections, jobs: works, force })
      return { ...plain(order), isProven }
    },
  }
  return orders[settings.order]()
}

/** The section at a chainage, or the nearest; where none is named, the one with the lowest ground. */
function firstSection(works: Groundwork['works'], at: number | null): number {
  const distance = ({ section, lowest }: Groundwork['works'][number]): number =>
    at === null ? lowest.lowestGround : Math.max(section.from - at, at - section.to, 0)
  return works.reduce((best, work, i) => (distance(work) < distance(works[best]!) ? i : best), 0)
}
