import type { SectionCase } from '../schemas/section-case'

/** A barrier as the catalogue keeps it. All of these are invented examples: the user enters their own. */
export interface CatalogueBarrier extends Readonly<SectionCase['barrier']> {
  readonly id: string
  /** Height on the maker's label [m]; it is not what the barrier defends. */
  readonly statedHeight: number
  readonly fabricStrength: number
  readonly isExample: true
}

/** Example tubes by diameter; SI units. */
export const BARRIERS: readonly CatalogueBarrier[] = [
  {
    id: 'tube-0.50',
    diameter: 0.5,
    skirtLength: 1.6,
    contactWidth: 0.1,
    mass: 3.4,
    airPressure: 12_000,
    sectionLength: 10,
    fabricStrength: 60_000,
    statedHeight: 0.5,
    isExample: true,
  },
  {
    id: 'tube-0.70',
    diameter: 0.7,
    skirtLength: 2.2,
    contactWidth: 0.12,
    mass: 4.8,
    airPressure: 15_000,
    sectionLength: 10,
    fabricStrength: 60_000,
    statedHeight: 0.7,
    isExample: true,
  },
  {
    id: 'tube-1.00',
    diameter: 1,
    skirtLength: 3.1,
    contactWidth: 0.18,
    mass: 7.8,
    airPressure: 18_000,
    sectionLength: 10,
    fabricStrength: 60_000,
    statedHeight: 1,
    isExample: true,
  },
]
