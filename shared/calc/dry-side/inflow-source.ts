import type { KnownReading } from '../series/time-series'

/** What every way has that water takes to the dry side. */
interface Way {
  readonly name: string
  /** Dealt with: plugged, or the line moved past it. It lets nothing through. */
  readonly isPlugged?: boolean
}

/** Ground under a stretch of the line. */
export interface SeepingGround extends Way {
  readonly kind: 'seepage'
  readonly permeability: number
  readonly layerThickness: number
  readonly baseWidth: number
  /** Length of the stretch [m]. */
  readonly length: number
  readonly groundLevel: number
}

/** Creases of the skirt on a stretch of the line. */
export interface Creases extends Way {
  readonly kind: 'creases'
  /** Height of a crease [m]. */
  readonly height: number
  /** Length of the way under the skirt [m]. */
  readonly path: number
  /** Length of line that is creased [m]. */
  readonly length: number
  readonly viscosity: number
  readonly groundLevel: number
}

/** Joints that let through a flow per metre of head. Common practice, no source. */
export interface LeakingJoint extends Way {
  readonly kind: 'joint'
  /** Flow per metre of head of all these joints [m²/s]. */
  readonly flowPerHead: number
  /** Lowest ground beside the joint [m]. */
  readonly groundLevel: number
}

/** A gully, an outfall, a pipe under the line. */
export interface Opening extends Way {
  readonly kind: 'opening'
  /** Cross-section [m²]. */
  readonly area: number
  /** Level at which it comes out on the dry side [m]. */
  readonly invert: number
  /** Discharge coefficient [–]. */
  readonly coefficient: number
}

/** An old well, a spring: a flow once the water on the wet side stands above a level. */
export interface Spring extends Way {
  readonly kind: 'spring'
  readonly flow: number
  readonly above: number
}

/** An end of the line that does not tie in: the water flows round it. */
export interface OpenEnd extends Way {
  readonly kind: 'open-end'
  /** Width through which it flows [m], and its ground [m]. */
  readonly width: number
  readonly sill: number
}

/** Waves and still water over the crest of a stretch. */
export interface OverTheCrest extends Way {
  readonly kind: 'over-crest'
  /** Loaded crest [m] and length of the stretch [m]. */
  readonly crestLevel: number
  readonly length: number
  /** Significant wave height [m]; 0: still water only. */
  readonly waveHeight: number
}

/** Rain on the catchment of the dry side: Q = C i A. */
export interface Rain extends Way {
  readonly kind: 'rain'
  readonly coefficient: number
  readonly area: number
  /** Rain by time [m/s]. */
  readonly intensity: readonly KnownReading[]
}

/** A brook from behind, ground water: what it brings by time [m³/s]. */
export interface Brook extends Way {
  readonly kind: 'brook'
  readonly flow: readonly KnownReading[]
}

/** One way on which water comes to the dry side. */
export type InflowSource =
  SeepingGround | Creases | LeakingJoint | Opening | Spring | OpenEnd | OverTheCrest | Rain | Brook
