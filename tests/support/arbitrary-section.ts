import fc from 'fast-check'
import { BASIS_IDS } from '../../shared/catalogue/check-bases'
import { UPLIFT_MODELS, type SectionCase } from '../../shared/schemas/section-case'

/** A number in a range, with the ends and zero turning up often. */
const between = (min: number, max: number) =>
  fc.double({ min, max, noNaN: true, noDefaultInfinity: true })

/** Any case inside the ranges of the contract, corners included. */
export const arbitrarySection: fc.Arbitrary<SectionCase> = fc
  .record({
    diameter: between(0.2, 3),
    skirt: fc.oneof(fc.constant(0), between(0, 15), between(0, 0.3)),
    strip: between(0, 0.5),
    mass: between(0, 500),
    pressure: fc.oneof(between(1, 100_000), between(1, 3000), fc.constantFrom(1, 100_000)),
    depth: fc.oneof(between(0, 1.5), between(0, 1e-6), fc.constantFrom(0, 1, 1.5)),
    dry: fc.oneof(fc.constant(0), between(0, 1.5)),
    friction: between(1e-6, 1.5),
    fall: fc.oneof(fc.constant(0), between(-0.1, 0.1)),
    model: fc.constantFrom(...UPLIFT_MODELS),
    edge: between(0, 1),
    diffusivity: between(1e-9, 1),
    time: fc.oneof(fc.constant(0), between(0, 1e7)),
    density: between(900, 1200),
    speed: fc.oneof(fc.constant(0), between(0, 3.048)),
    wave: fc.oneof(fc.constant(0), between(0, 3)),
    period: between(0.5, 20),
    debris: fc.oneof(fc.constant(0), between(0, 1e6)),
    freeboard: between(0, 2),
    basis: fc.constantFrom(...BASIS_IDS),
    strength: fc.option(between(1, 1e6)),
    suitable: fc.boolean(),
    permeability: fc.option(between(0, 1)),
  })
  .map((drawn) => ({
    barrier: {
      diameter: drawn.diameter,
      skirtLength: drawn.skirt,
      contactWidth: drawn.strip * drawn.diameter,
      mass: drawn.mass,
      airPressure: drawn.pressure,
      sectionLength: 10,
      fabricStrength: drawn.strength,
    },
    ground: {
      friction: drawn.friction,
      fall: drawn.fall,
      suitable: drawn.suitable,
      permeability: drawn.permeability,
      layerThickness: drawn.permeability === null ? null : 2,
    },
    uplift: {
      model: drawn.model,
      edgeFactor: drawn.edge,
      diffusivity: drawn.diffusivity,
      time: drawn.time,
    },
    water: {
      depth: drawn.depth * drawn.diameter,
      dryDepth: drawn.dry * drawn.diameter,
      density: drawn.density,
      currentSpeed: drawn.speed,
      dragCoefficient: 2,
      waveHeight: drawn.wave,
      wavePeriod: drawn.period,
    },
    debris: { force: drawn.debris, draught: 0.25 },
    gravity: 9.81,
    requiredFreeboard: drawn.freeboard,
    basis: drawn.basis,
  }))
