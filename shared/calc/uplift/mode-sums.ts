/**
 * Head under a base in eigenmodes of one-dimensional diffusion, at the fraction ξ from the wet edge:
 *
 *     u(ξ) = a (1 − ξ) + b ξ − T [s_a P(ξ) + s_b P(1 − ξ)] + Σ w_n sin(nπξ)
 *     P(ξ) = ξ/3 − ξ²/2 + ξ³/6,   T = B²/c
 *
 * a, b are the heads at both ends, s_a, s_b how fast they change; the polynomials carry what all modes
 * have settled to, w_n what is still on its way there.
 */
export interface ModeState {
  readonly edge: number
  readonly toe: number
  /** T s_a and T s_b [m]. */
  readonly edgeDrift: number
  readonly toeDrift: number
  /** w_1 … w_N [m]. */
  readonly modes: Float64Array
  /** Modes that still matter; those beyond are settled. */
  readonly moving: number
}

/** Head at ξ [m]. */
export function headOf(state: ModeState, xi: number): number {
  return settledHead(state, xi) + sines(state, xi)
}

/** Head at ξ without what the modes still have to go [m]. */
export function settledHead({ edge, toe, edgeDrift, toeDrift }: ModeState, xi: number): number {
  const fromEdge = xi * (1 / 3 + xi * (-1 / 2 + xi / 6))
  const fromToe = (xi - xi * xi * xi) / 6
  return edge * (1 - xi) + toe * xi - edgeDrift * fromEdge - toeDrift * fromToe
}

/** Σ w_n sin(nθ), θ = πξ, by the recurrence sin(n+1)θ = 2 cos θ sin nθ − sin(n−1)θ. */
function sines({ modes, moving }: ModeState, xi: number): number {
  const twice = 2 * Math.cos(Math.PI * xi)
  let before = 0
  let now = Math.sin(Math.PI * xi)
  let sum = 0
  for (let i = 0; i < moving; i += 1) {
    sum += modes[i]! * now
    const next = twice * now - before
    before = now
    now = next
  }
  return sum
}

/** ∫₀^ξ u and ∫₀^ξ u ξ′ over the fraction [m]. */
export interface Cumulative {
  readonly area: number
  readonly moment: number
}

/** Integrals of the head from the wet edge to ξ, in closed form. */
export function cumulative(state: ModeState, xi: number): Cumulative {
  const { edge, toe, edgeDrift, toeDrift } = state
  const x2 = xi * xi
  const x3 = x2 * xi
  const x4 = x2 * x2
  const x5 = x4 * xi
  const waves = waveIntegrals(state, xi)
  return {
    area:
      edge * (xi - x2 / 2) +
      (toe * x2) / 2 -
      edgeDrift * (x2 / 6 - x3 / 6 + x4 / 24) -
      toeDrift * (x2 / 12 - x4 / 24) +
      waves.area,
    moment:
      edge * (x2 / 2 - x3 / 3) +
      (toe * x3) / 3 -
      edgeDrift * (x3 / 9 - x4 / 8 + x5 / 30) -
      toeDrift * (x3 / 18 - x5 / 30) +
      waves.moment,
  }
}

function waveIntegrals({ modes, moving }: ModeState, xi: number): Cumulative {
  const theta = Math.PI * xi
  const twice = 2 * Math.cos(theta)
  let [sineBefore, cosineBefore] = [0, 1]
  let [sine, cosine] = [Math.sin(theta), Math.cos(theta)]
  let area = 0
  let moment = 0
  for (let i = 0; i < moving; i += 1) {
    const scaled = modes[i]! / ((i + 1) * Math.PI)
    area += scaled * (1 - cosine)
    moment += scaled * (sine / ((i + 1) * Math.PI) - xi * cosine)
    const nextSine = twice * sine - sineBefore
    const nextCosine = twice * cosine - cosineBefore
    sineBefore = sine
    cosineBefore = cosine
    sine = nextSine
    cosine = nextCosine
  }
  return { area, moment }
}

/** The same integrals over the whole base: the even modes have no area. */
export function wholeBase(state: ModeState): Cumulative {
  const { edge, toe, edgeDrift, toeDrift, modes, moving } = state
  let area = (edge + toe) / 2 - (edgeDrift + toeDrift) / 24
  let moment = edge / 6 + toe / 3 - edgeDrift * (7 / 360) - toeDrift / 45
  for (let i = 0; i < moving; i += 1) {
    const scaled = modes[i]! / ((i + 1) * Math.PI)
    if (i % 2 === 0) {
      area += 2 * scaled
      moment += scaled
    } else {
      moment -= scaled
    }
  }
  return { area, moment }
}
