/** A point of a pump curve: flow [m³/s] and head [m]. */
export type CurvePoint = readonly [flow: number, head: number]

/** Head as a polynomial of the flow, a + b Q + c Q². */
export interface PumpCurve {
  readonly a: number
  readonly b: number
  readonly c: number
  /** Flow of the last point, to which the curve is known [m³/s]. */
  readonly lastFlow: number
}

/**
 * Curve of a pump through its points: a line through two, the parabola through three, the parabola
 * of least squares through more.
 *
 * @param points Two or more, by rising flow, the first at no flow.
 */
export function fitPumpCurve(points: readonly CurvePoint[]): PumpCurve {
  const lastFlow = points[points.length - 1]![0]
  if (points.length === 2) {
    const [[q0, h0], [q1, h1]] = points as readonly [CurvePoint, CurvePoint]
    const b = (h1 - h0) / (q1 - q0)
    return { a: h0 - b * q0, b, c: 0, lastFlow }
  }
  // Flows as shares of the last one keep the normal equations well conditioned.
  const [a, b, c] = leastSquares(points.map(([flow, head]) => [flow / lastFlow, head]))
  return { a, b: b / lastFlow, c: c / lastFlow ** 2, lastFlow }
}

/** Head of one pump at a flow [m]. */
export function pumpHead({ a, b, c }: PumpCurve, flow: number): number {
  return a + b * flow + c * flow ** 2
}

/** Parabola of least squares; through three points it is the parabola itself. */
function leastSquares(points: readonly CurvePoint[]): readonly [number, number, number] {
  const moment = (power: number): number => points.reduce((sum, [x]) => sum + x ** power, 0)
  const weighted = (power: number): number =>
    points.reduce((sum, [x, y]) => sum + y * x ** power, 0)
  const [m0, m1, m2, m3, m4] = [0, 1, 2, 3, 4].map(moment) as [
    number,
    number,
    number,
    number,
    number,
  ]
  const [w0, w1, w2] = [0, 1, 2].map(weighted) as [number, number, number]
  const rows = [
    [m0, m1, m2],
    [m1, m2, m3],
    [m2, m3, m4],
  ] as const
  const whole = determinant(rows)
  const column = (at: number): number =>
    determinant(
      rows.map((row, i) =>
        row.map((value, j) => (j === at ? [w0, w1, w2][i]! : value)),
      ) as unknown as Matrix,
    ) / whole
  return [column(0), column(1), column(2)]
}

type Matrix = readonly [Row, Row, Row]
type Row = readonly [number, number, number]

function determinant([[a, b, c], [d, e, f], [g, h, i]]: Matrix): number {
  return a * (e * i - f * h) - b * (d * i - f * g) + c * (d * h - e * g)
}
