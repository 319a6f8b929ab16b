import { FILM } from '../../constants'
import type { HorizontalLoad } from '../hydrostatics/still-water-thrust'
import { waveNumber } from './wave-number'

/** Waves that run square onto the barrier. */
export interface WaveAttack {
  /** Significant wave height, H_s [m]. */
  readonly height: number
  /** Wave period, used as it is, T [s]. */
  readonly period: number
  readonly depth: number
  /** Height of the loaded crest above the ground [m]. */
  readonly crest: number
  readonly unitWeight: number
  readonly gravity: number
}

/** Load of the waves over and above still water, with the pressures that give it. */
export interface WaveThrust extends HorizontalLoad {
  /** Design wave height, H [m]. */
  readonly designHeight: number
  /** Height to which pressure would reach on an endless wall, η* [m]. */
  readonly runUp: number
  /** Part of η* that the wall has, h_c* [m]. */
  readonly wettedAbove: number
  readonly alpha1: number
  /** Pressures at the water surface, at the ground and at the crest [Pa]. */
  readonly surfacePressure: number
  readonly groundPressure: number
  readonly crestPressure: number
}

const NO_WAVES: WaveThrust = {
  force: 0,
  moment: 0,
  designHeight: 0,
  runUp: 0,
  wettedAbove: 0,
  alpha1: 0,
  surfacePressure: 0,
  groundPressure: 0,
  crestPressure: 0,
}

/**
 * Wave height that the depth lets through: H = min(factor · H_s, 0.78 h) [m].
 *
 * @see McCowan's breaker limit H/h = 0.78, as in the Coastal Engineering Manual.
 */
export function depthLimitedHeight(height: number, depth: number, factor: number): number {
  return Math.min(factor * height, 0.78 * depth)
}

/**
 * Wave thrust after Goda on a vertical wall, level bed, no berm, waves square to the line:
 *
 *     H   = min(1.8 H_s, 0.78 h)          η* = 1.5 H
 *     α₁  = 0.6 + ½ (2kh / sinh 2kh)²     p₁ = α₁ ρ g H
 *     p₃  = p₁ / cosh kh                  h_c* = max(0, min(η*, crest − h))
 *     p₄  = p₁ (1 − h_c* / η*)
 *     F   = ½ (p₁ + p₃) h + ½ (p₁ + p₄) h_c*
 *     M   = (2p₁ + p₃) h²/6 + ½ (p₁ + p₄) h h_c* + (p₁ + 2p₄) h_c*²/6
 *
 * @remarks Added to still water. Impulsive breaking, H_s > 0.35 h, is not covered.
 * @see Goda, Random Seas and Design of Maritime Structures, 2000; EM 1110-2-1100, VI-5.
 */
export function waveThrust(waves: WaveAttack): WaveThrust {
  const { height, period, depth: h, crest, unitWeight, gravity } = waves
  const designHeight = depthLimitedHeight(height, h, 1.8)
  if (designHeight < FILM) return NO_WAVES

  const kh = waveNumber(period, h, gravity) * h
  const alpha1 = 0.6 + 0.5 * (2 * kh < 700 ? (2 * kh) / Math.sinh(2 * kh) : 0) ** 2
  const p1 = alpha1 * unitWeight * designHeight
  const p3 = p1 / Math.cosh(kh)
  const runUp = 1.5 * designHeight
  const hc = Math.max(0, Math.min(runUp, crest - h))
  const p4 = p1 * (1 - hc / runUp)

  return {
    force: ((p1 + p3) * h + (p1 + p4) * hc) / 2,
    moment: ((2 * p1 + p3) * h ** 2 + (p1 + 2 * p4) * hc ** 2) / 6 + ((p1 + p4) * h * hc) / 2,
    designHeight,
    runUp,
    wettedAbove: hc,
    alpha1,
    surfacePressure: p1,
    groundPressure: p3,
    crestPressure: p4,
  }
}
