import type { SourceTag } from '../catalogue/check-bases'

/** Where a formula comes from. */
export interface SheetSource {
  /** As it stands beside the line. */
  readonly short: string
  /** Title, number and edition, for the list of references; null: nothing to look up. */
  readonly reference: string | null
  readonly tag: SourceTag
}

/** Sources of the lines of a sheet. */
export const SHEET_SOURCES = {
  given: { short: 'input', reference: null, tag: 'seen' },
  statics: {
    short: 'hydrostatics',
    reference:
      'R. K. Bansal, A Textbook of Fluid Mechanics, chapter 3: thrust of still water, lift of a cylinder on the ground',
    tag: 'seen',
  },
  equilibrium: { short: 'equilibrium', reference: null, tag: 'derived' },
  current: {
    short: 'ASCE 7, 5.4.3',
    reference:
      'ASCE/SEI 7, Minimum Design Loads, 5.4.3, and FEMA P-259, Engineering Principles and Practices, 3rd edition, 2012: hydrodynamic loads below 10 ft/s',
    tag: 'memory',
  },
  goda: {
    short: 'Goda',
    reference:
      'Y. Goda, Random Seas and Design of Maritime Structures, 2000, in the form of EM 1110-2-1100, part VI-5: waves on a vertical wall',
    tag: 'memory',
  },
  linearWaves: {
    short: 'linear waves',
    reference: 'EM 1110-2-1100, Coastal Engineering Manual, part II-1: dispersion of linear waves',
    tag: 'memory',
  },
  debris: { short: 'force entered', reference: null, tag: 'practice' },
  creep: {
    short: 'line of creep',
    reference:
      'EM 1110-2-2100, Stability Analysis of Concrete Structures, 2005: uplift falling evenly along the base',
    tag: 'memory',
  },
  harr: {
    short: 'Harr',
    reference:
      'M. E. Harr, Groundwater and Seepage, 1962, after Pavlovsky: flat base on a pervious layer',
    tag: 'memory',
  },
  diffusion: {
    short: 'diffusion',
    reference: 'H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 3.4: the series',
    tag: 'derived',
  },
  membrane: {
    short: 'loaded shape',
    reference:
      'H. O. Anwar, Inflatable Dams, Journal of the Hydraulics Division 93, 1967: theory of the membrane; the form with a skirt is derived on the Method page',
    tag: 'derived',
  },
  basis: { short: 'check basis', reference: null, tag: 'seen' },
  ec7: {
    short: 'EN 1997-1, A',
    reference: 'EN 1997-1:2004+A1:2013, Eurocode 7, Annex A: partial factors; 2.4.6.1(6)P',
    tag: 'seen',
  },
  freeboard: { short: 'freeboard', reference: null, tag: 'practice' },
  scan: { short: 'all checks', reference: null, tag: 'derived' },
  leave: { short: 'leave level', reference: null, tag: 'practice' },
} as const satisfies Record<string, SheetSource>

export type SourceId = keyof typeof SHEET_SOURCES

/** Works of reference behind these sources, each once, in the order of the table. */
export function referencesOf(ids: readonly SourceId[]): readonly string[] {
  const used = new Set<SourceId>(ids)
  return Object.entries(SHEET_SOURCES).flatMap(([id, { reference }]) =>
    used.has(id as SourceId) && reference !== null ? [`${reference}.`] : [],
  )
}
