import { loadedShape } from '../../calc/loaded-shape/loaded-shape'

/** Pressure ratios p/(ρ g D) that the design chart shows. */
export const DESIGN_RATIOS = [0.5, 0.75, 1, 1.5, 2, 3, 5] as const

/** One curve of the design chart: depth and crest in diameters. */
export interface DesignCurve {
  /** p/(ρ g D). */
  readonly ratio: number
  readonly points: readonly DesignPoint[]
}

export interface DesignPoint {
  /** h/D. */
  readonly depth: number
  /** Crest over D. */
  readonly crest: number
}

/** A skirt so long that it is never the reason why a tube gives way, in diameters. */
const ENDLESS_SKIRT = 100

/** Steps of h/D along a curve, and halvings towards its end. */
const STEP = 0.02
const HALVINGS = 30

/** Crest over D of a tube of one pressure ratio at h/D; null where no shape stands. */
export function designCrest(ratio: number, depth: number): number | null {
  const shape = loadedShape({
    diameter: 1,
    airPressure: ratio,
    wettedSkirt: ENDLESS_SKIRT,
    depth,
    unitWeight: 1,
  })
  return shape.solved ? shape.crest : null
}

/** The curve of a pressure ratio, from no water to the largest h/D at which a shape stands. */
export function designCurve(ratio: number): DesignCurve {
  const points: DesignPoint[] = []
  let standing = 0
  let falling = 1
  for (let i = 0; i * STEP < 1; i += 1) {
    const depth = i * STEP
    const crest = designCrest(ratio, depth)
    if (crest === null) {
      falling = depth
      break
    }
    points.push({ depth, crest })
    standing = depth
  }
  for (let i = 0; i < HALVINGS; i += 1) {
    const middle = (standing + falling) / 2
    if (designCrest(ratio, middle) === null) falling = middle
    else standing = middle
  }
  const crest = designCrest(ratio, standing)
  if (crest !== null && standing > points.at(-1)!.depth) points.push({ depth: standing, crest })
  return { ratio, points }
}

/** Depths at which the figures behind the chart are listed, in diameters. */
export const DESIGN_DEPTHS = [
  0.1, 0.2, 0.3, 0.4, 0.5, 0.55, 0.6, 0.65, 0.7, 0.75, 0.8, 0.85, 0.9, 0.95,
] as const

/** One row of the figures behind the chart. */
export interface DesignRow {
  readonly depth: number
  /** Crest over D for each of the ratios; null where no shape stands. */
  readonly crests: readonly (number | null)[]
}

/** The figures behind the chart, and the largest h/D of each ratio. */
export function designTable(ratios: readonly number[]): {
  readonly rows: readonly DesignRow[]
  readonly largest: readonly number[]
} {
  return {
    rows: DESIGN_DEPTHS.map((depth) => ({
      depth,
      crests: ratios.map((ratio) => designCrest(ratio, depth)),
    })),
    largest: ratios.map((ratio) => designCurve(ratio).points.at(-1)!.depth),
  }
}

/** The same as comma-separated values, with a line that names the columns. */
export function designCsv(ratios: readonly number[]): string {
  const { rows, largest } = designTable(ratios)
  const head = ['h/D', ...ratios.map((ratio) => `crest/D at p/(rho g D) ${ratio}`)]
  const lines = rows.map(({ depth, crests }) =>
    [String(depth), ...crests.map((crest) => crest?.toFixed(5) ?? '')].join(','),
  )
  const last = ['largest h/D', ...largest.map((depth) => depth.toFixed(5))]
  return `${[head.join(','), ...lines, last.join(',')].join('\r\n')}\r\n`
}
