import { LAYING_ORDERS, type LayingOrder } from '../schemas/deployment'
import { groundwork, moment, type DeploymentInput } from './groundwork'
import { orderOf } from './chosen-order'
import { layInOrder } from './laying-run'
import { leastMargin } from './worst-margin'

/** What an order, or more people, would make of the plan. */
export interface OrderFigures {
  readonly order: LayingOrder
  /** Chainage that it begins at and ends at [m]. */
  readonly begins: number
  readonly ends: number
  /** The last section is finished [ms]. */
  readonly finish: number
  /** Least margin in the band that is judged by [s]; null where the water comes to no section. */
  readonly margin: number | null
  /** Chainage of the section with the least margin, where it begins, and its lowest ground [m]. */
  readonly from: number | null
  readonly lowestAt: number | null
  /** Time of the pairs that a blower keeps waiting [s]. */
  readonly waiting: number
  /** Chainages in the order of laying [m]. */
  readonly chainages: readonly number[]
  /** Of the best order: no joined order is better. Otherwise null. */
  readonly isProven: boolean | null
}

/** Figures of the plan with some of its settings changed; null where nothing is laid. */
export function orderFigures(
  input: DeploymentInput,
  change: Partial<DeploymentInput['settings']> = {},
): OrderFigures | null {
  const settings = { ...input.settings, ...change }
  const ground = groundwork({ ...input, settings })
  const { works, deadlines, force } = ground
  if (works.length === 0) return null
  const { order, isProven } = orderOf(settings, ground)
  const laid = layInOrder(order, works, force)
  const least = leastMargin(laid, deadlines[settings.judgedBy])
  const at = least && works[least.job]!
  const chainages = order.map((job) => works[job]!.section.from)
  return {
    order: settings.order,
    begins: chainages[0]!,
    ends: chainages[chainages.length - 1]!,
    finish: moment(Math.max(...laid.map(({ finish }) => finish))),
    margin: least?.margin ?? null,
    from: at?.section.from ?? null,
    lowestAt: at?.lowest.lowestAt ?? null,
    waiting: laid.reduce((sum, { waited }) => sum + waited, 0),
    chainages,
    isProven,
  }
}

/** Every order of laying, with the same people and blowers. */
export function compareOrders(input: DeploymentInput): readonly OrderFigures[] {
  return LAYING_ORDERS.flatMap((order) => orderFigures(input, { order }) ?? [])
}

/** What one more would change. */
export interface Gain {
  readonly of: 'pair' | 'blower'
  /** Earlier finish [s]; negative: later, which a blower in another order can bring about. */
  readonly finish: number
  /** Larger worst margin [s]; null where the water comes to no section. */
  readonly margin: number | null
  readonly figures: OrderFigures
  /** A depot has it; otherwise it is taken to come with the last one that is there. */
  readonly isInStore: boolean
  /** When it is at the line [ms]. */
  readonly onSite: number
}

/** What one more pair, and one more blower, would gain in the order that is chosen; computed. */
export function gains(input: DeploymentInput): readonly Gain[] {
  const now = orderFigures(input)
  if (!now) return []
  const { pairs, blowers, decidedAt } = input.settings
  const more = [
    { of: 'pair', change: { pairs: pairs + 1 } },
    { of: 'blower', change: { blowers: blowers + 1 } },
  ] as const
  return more.map(({ of, change }) => {
    const figures = orderFigures(input, change)!
    const ground = groundwork({ ...input, settings: { ...input.settings, ...change } })
    const last = (of === 'pair' ? ground.pairs : ground.blowers).at(-1)!
    return {
      of,
      figures,
      finish: (now.finish - figures.finish) / 1000,
      margin: now.margin === null || figures.margin === null ? null : figures.margin - now.margin,
      isInStore: last.isInStore,
      onSite: decidedAt + moment(last.after),
    }
  })
}
