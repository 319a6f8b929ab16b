/** Heads at both ends of a base by time [m]. */
export interface DiffusionCase {
  readonly base: number
  readonly diffusivity: number
  readonly edgeAt: (time: number) => number
  readonly toeAt: (time: number) => number
  /** Head under the base at the start, by the fraction ξ. */
  readonly initial: (xi: number) => number
  readonly until: number
}

/**
 * Head under a base by implicit finite differences (Crank–Nicolson), at equal distances from the wet
 * edge to the toe: slow, and independent of the product's modes and series.
 */
export function diffuse(input: DiffusionCase, cells = 400, steps = 4000): Float64Array {
  const { base, diffusivity, edgeAt, toeAt, initial, until } = input
  const dt = until / steps
  const ratio = (diffusivity / base ** 2) * dt * cells ** 2
  let head = Float64Array.from({ length: cells + 1 }, (_, i) => initial(i / cells))
  const c = new Float64Array(cells)
  const d = new Float64Array(cells)
  for (let step = 1; step <= steps; step += 1) {
    const next = new Float64Array(cells + 1)
    next[0] = edgeAt(step * dt)
    next[cells] = toeAt(step * dt)
    // Thomas algorithm on (1 + r) u_i − r/2 (u_{i−1} + u_{i+1}) = explicit half.
    for (let i = 1; i < cells; i += 1) {
      const ends = (i === 1 ? next[0] : 0) + (i === cells - 1 ? next[cells] : 0)
      const explicit = (1 - ratio) * head[i]! + (ratio / 2) * (head[i - 1]! + head[i + 1]! + ends)
      const pivot = 1 + ratio + (i > 1 ? (ratio / 2) * c[i - 1]! : 0)
      c[i] = -ratio / 2 / pivot
      d[i] = (explicit + (i > 1 ? (ratio / 2) * d[i - 1]! : 0)) / pivot
    }
    for (let i = cells - 1; i >= 1; i -= 1) {
      next[i] = d[i]! - (i === cells - 1 ? 0 : c[i]! * next[i + 1]!)
    }
    head = next
  }
  return head
}

/** ∫ min(head, cap) and its moment about the toe, over the base or its first `length` metres. */
export function cappedResultant(head: Float64Array, base: number, cap: number, length = base) {
  const cells = head.length - 1
  const dx = base / cells
  let force = 0
  let moment = 0
  for (let i = 0; i < cells; i += 1) {
    const share = Math.max(0, Math.min(1, length / dx - i))
    const left = Math.min(head[i]!, cap)
    const right = left + share * (Math.min(head[i + 1]!, cap) - left)
    const piece = ((left + right) / 2) * share * dx
    force += piece
    moment += piece * (base - (i + share / 2) * dx)
  }
  return { force, moment }
}
