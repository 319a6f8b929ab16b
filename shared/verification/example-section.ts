import type { SectionCase } from '../schemas/section-case'

/** The parts of a section that a check value varies. */
export interface SectionChange {
  readonly barrier?: Partial<SectionCase['barrier']>
  readonly ground?: Partial<SectionCase['ground']>
  readonly water?: Partial<SectionCase['water']>
  readonly uplift?: Partial<SectionCase['uplift']>
}

const TUBE_070: SectionCase = {
  barrier: {
    diameter: 0.7,
    skirtLength: 2.2,
    contactWidth: 0.12,
    mass: 4.8,
    airPressure: 15_000,
    sectionLength: 10,
    fabricStrength: 60_000,
  },
  ground: { friction: 0.45, fall: 0, suitable: true, permeability: null, layerThickness: null },
  uplift: { model: 'linear', edgeFactor: 1, diffusivity: null, time: null },
  water: {
    depth: 0.55,
    dryDepth: 0,
    density: 1000,
    currentSpeed: 0,
    dragCoefficient: 2,
    waveHeight: 0,
    wavePeriod: null,
  },
  debris: { force: 0, draught: 0.25 },
  gravity: 9.81,
  requiredFreeboard: 0.1,
  basis: 'global-1.5',
}

/** Tube 0.70 m on turf under 0.55 m of water, with what the check value changes. */
export function exampleSection(change: SectionChange = {}): SectionCase {
  return {
    ...TUBE_070,
    barrier: { ...TUBE_070.barrier, ...change.barrier },
    ground: { ...TUBE_070.ground, ...change.ground },
    water: { ...TUBE_070.water, ...change.water },
    uplift: { ...TUBE_070.uplift, ...change.uplift },
  }
}
