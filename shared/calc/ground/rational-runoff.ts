/**
 * Peak runoff by the rational method: Q = C i A   [m³/s].
 *
 * @param coefficient Runoff coefficient, C [–], 0 to 1.
 * @param intensity Rain, i [m/s].
 * @param area Catchment, A [m²].
 */
export function rationalRunoff(coefficient: number, intensity: number, area: number): number {
  return coefficient * intensity * area
}
