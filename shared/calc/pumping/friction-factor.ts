/** Up to this Reynolds number the flow is laminar; above, Colebrook's formula is used at once. */
const LAMINAR_UP_TO = 2000

/**
 * Darcy friction factor f of a pipe or hose: 64/Re below Re 2000, else Colebrook–White
 *
 *     1/√f = −2 log₁₀( (ε/D)/3.7 + 2.51/(Re √f) )
 *
 * solved by Newton in 1/√f from Haaland's estimate, to the last digit.
 *
 * @param reynolds V D/ν [–], above 0.
 * @param relativeRoughness ε/D [–], 0 to 0.05.
 * @see Colebrook, Journal of the ICE 11 (1939); White, Fluid Mechanics, ch. 6.
 */
export function frictionFactor(reynolds: number, relativeRoughness: number): number {
  if (reynolds < LAMINAR_UP_TO) return 64 / reynolds
  const rough = relativeRoughness / 3.7
  const perRoot = 2.51 / reynolds
  let x = -1.8 * Math.log10(rough ** 1.11 + 6.9 / reynolds)
  for (let step = 0; step < 20; step += 1) {
    const inner = rough + perRoot * x
    const change = (x + 2 * Math.log10(inner)) / (1 + (2 * perRoot) / (Math.LN10 * inner))
    x -= change
    if (Math.abs(change) < 1e-15 * x) break
  }
  return 1 / x ** 2
}
