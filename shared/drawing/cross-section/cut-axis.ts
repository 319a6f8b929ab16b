/** A piece of the section that is left out, so that a long skirt fits. */
export interface AxisCut {
  /** Where the left part ends and the right part begins, in metres and in pixels. */
  readonly fromX: number
  readonly toX: number
  readonly fromPx: number
  readonly toPx: number
}

/** Maps the horizontal axis of the section [m] to the scene [px]: one scale on both sides of a cut. */
export interface CutAxis {
  readonly cut: AxisCut | null
  readonly toPx: (x: number) => number
  readonly toMetres: (px: number) => number
}

/** An axis without a cut. */
export function wholeAxis(originPx: number, scale: number): CutAxis {
  return {
    cut: null,
    toPx: (x) => originPx + scale * x,
    toMetres: (px) => (px - originPx) / scale,
  }
}

/** An axis whose part right of the cut has its origin at `originPx`. */
export function cutAxis(originPx: number, scale: number, cut: AxisCut): CutAxis {
  const across = (cut.toPx - cut.fromPx) / (cut.toX - cut.fromX)
  return {
    cut,
    toPx: (x) => {
      if (x >= cut.toX) return originPx + scale * x
      if (x <= cut.fromX) return cut.fromPx + scale * (x - cut.fromX)
      return cut.fromPx + across * (x - cut.fromX)
    },
    toMetres: (px) => {
      if (px >= cut.toPx) return (px - originPx) / scale
      if (px <= cut.fromPx) return cut.fromX + (px - cut.fromPx) / scale
      return cut.fromX + (px - cut.fromPx) / across
    },
  }
}
