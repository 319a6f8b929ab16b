/** Cells over the thickness of the layer, coarse and fine. */
const CELLS = [24, 48] as const

/**
 * q/(k h) under a flat base on a layer of thickness 1 by finite differences (successive
 * over-relaxation): slow, and independent of the conformal map. By symmetry only the dry half is
 * solved: head 1/2 under the middle of the base, 0 on the ground beside it. The edge of the base is
 * singular, so the error falls with the first power of the spacing; two grids take it away.
 *
 * @param ratio Base over thickness, B/T.
 */
export function seepageByDifferences(ratio: number): number {
  const [coarse, fine] = CELLS.map((cells) => flowOnGrid(ratio, cells))
  return 2 * fine! - coarse!
}

function flowOnGrid(ratio: number, cells: number): number {
  const base = Math.round((ratio / 2) * cells)
  const columns = base + 3 * cells
  const head = Array.from({ length: columns + 1 }, (_, i) =>
    new Float64Array(cells + 1).fill(i === 0 ? 0.5 : 0.5 * Math.max(0, 1 - i / (base + cells))),
  )
  // Row 0 is the surface; beside the base it is wetted by the dry side.
  for (let i = base; i <= columns; i += 1) head[i]![0] = 0
  const factor = 2 / (1 + Math.PI / columns)
  for (let sweep = 0; sweep < 12 * cells; sweep += 1) relax(head, base, factor)
  let flow = 0
  for (let j = 0; j <= cells; j += 1) {
    const weight = j === 0 || j === cells ? 0.5 : 1
    flow += weight * (head[0]![j]! - head[1]![j]!)
  }
  return flow
}

function relax(head: readonly Float64Array[], base: number, factor: number): void {
  const last = head.length - 1
  const bottom = head[0]!.length - 1
  for (let i = 1; i <= last; i += 1) {
    const [left, here, right] = [head[i - 1]!, head[i]!, head[Math.min(i + 1, last)]!]
    for (let j = i < base ? 0 : 1; j <= bottom; j += 1) {
      // No flow through base, rock and the far end: the neighbour beyond is the one before.
      const above = here[j === 0 ? 1 : j - 1]!
      const below = here[j === bottom ? bottom - 1 : j + 1]!
      const beyond = i === last ? left[j]! : right[j]!
      here[j]! += factor * ((left[j]! + beyond + above + below) / 4 - here[j]!)
    }
  }
}
