/** What an order looks at in a section. */
export interface OrderedSection {
  /** Lowest ground [m]. */
  readonly lowestGround: number
  /** When the water reaches it [s]; infinite where it does not. */
  readonly deadline: number
}

/** From the lower chainage to the higher, or the other way round. */
export function fromOneEnd(count: number, end: 'start' | 'end'): readonly number[] {
  return Array.from({ length: count }, (_, i) => (end === 'start' ? i : count - 1 - i))
}

/**
 * Outward from a section: each next is the neighbour of the laid run whose deadline is earlier; of
 * two with one deadline the lower, of two as low the one at the higher chainage.
 *
 * @param first Place of the section that is laid first.
 * @see Method page, "Deployment".
 */
export function outward(sections: readonly OrderedSection[], first: number): readonly number[] {
  const order = [first]
  let [low, high] = [first - 1, first + 1]
  while (order.length < sections.length) {
    const below = sections[low]
    const above = sections[high]
    const isBelow = below !== undefined && (above === undefined || comesFirst(below, above))
    order.push(isBelow ? low : high)
    if (isBelow) low -= 1
    else high += 1
  }
  return order
}

function comesFirst(below: OrderedSection, above: OrderedSection): boolean {
  if (below.deadline !== above.deadline) return below.deadline < above.deadline
  return below.lowestGround < above.lowestGround
}

/** Lowest ground first, whatever lies between; the lower chainage first among equals. */
export function lowestFirst(
  sections: readonly Pick<OrderedSection, 'lowestGround'>[],
): readonly number[] {
  return sections
    .map((_, i) => i)
    .sort((a, b) => sections[a]!.lowestGround - sections[b]!.lowestGround || a - b)
}

/** True where what is laid is one run at every moment. */
export function isJoined(order: readonly number[]): boolean {
  let [low, high] = [order[0]!, order[0]!]
  return order.slice(1).every((section) => {
    if (section !== low - 1 && section !== high + 1) return false
    low = Math.min(low, section)
    high = Math.max(high, section)
    return true
  })
}
