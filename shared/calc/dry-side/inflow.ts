import { gapFlow } from '../ground/gap-flow'
import { groundSeepage } from '../ground/ground-seepage'
import { rationalRunoff } from '../ground/rational-runoff'
import { overflow, overtopping } from '../moving-water/overtopping'
import { valueWithin } from '../series/time-series'
import type {
  Creases,
  InflowSource,
  OpenEnd,
  Opening,
  OverTheCrest,
  SeepingGround,
} from './inflow-source'

/** The dry side at a moment. */
export interface DryMoment {
  readonly time: number
  /** Level on the wet side and of the pond [m], in one datum. */
  readonly waterLevel: number
  readonly pondLevel: number
  readonly gravity: number
}

/**
 * What comes in on one way [m³/s], 0 or more. The head of ways under and through the barrier is that
 * of the water over the higher of ground and pond; a pond that stands higher sends nothing back.
 */
export function inflowOf(source: InflowSource, at: DryMoment): number {
  if (source.isPlugged) return 0
  switch (source.kind) {
    case 'seepage':
      return seepage(source, headOver(source.groundLevel, at))
    case 'creases':
      return creases(source, headOver(source.groundLevel, at), at.gravity)
    case 'joint':
      return source.flowPerHead * headOver(source.groundLevel, at)
    case 'opening':
      return orifice(source, at)
    case 'spring':
      return at.waterLevel > source.above ? source.flow : 0
    case 'open-end':
      return roundTheEnd(source, at)
    case 'over-crest':
      return overTheCrest(source, at)
    case 'rain':
      return rationalRunoff(source.coefficient, valueWithin(source.intensity, at.time), source.area)
    case 'brook':
      return valueWithin(source.flow, at.time)
  }
}

function headOver(floor: number, { waterLevel, pondLevel }: DryMoment): number {
  return Math.max(0, waterLevel - Math.max(floor, pondLevel))
}

function seepage({ permeability, layerThickness, baseWidth, length }: SeepingGround, head: number) {
  return length * groundSeepage({ permeability, head, baseWidth, layerThickness })
}

function creases({ height, path, length, viscosity }: Creases, head: number, gravity: number) {
  return length * gapFlow({ width: height, head, path, viscosity, gravity }).perMetre
}

/** Orifice C_d A √(2 g h), h over the higher of its invert and the pond. */
function orifice({ area, invert, coefficient }: Opening, at: DryMoment): number {
  return coefficient * area * Math.sqrt(2 * at.gravity * headOver(invert, at))
}

/**
 * Broad crest; where the pond stands above two thirds of the head, h_d √(2 g (H − h_d)), which joins
 * it without a step.
 */
function roundTheEnd({ width, sill }: OpenEnd, { waterLevel, pondLevel, gravity }: DryMoment) {
  const head = Math.max(0, waterLevel - sill)
  const behind = Math.max(0, pondLevel - sill)
  if (behind <= (2 / 3) * head) return width * overflow(head, gravity)
  return width * behind * Math.sqrt(2 * gravity * Math.max(0, head - behind))
}

function overTheCrest({ crestLevel, length, waveHeight }: OverTheCrest, at: DryMoment): number {
  const { waterLevel, gravity } = at
  const crestFreeboard = crestLevel - waterLevel
  const waves = overtopping({ height: waveHeight, crestFreeboard, gravity })
  return length * (waves + overflow(-crestFreeboard, gravity))
}
