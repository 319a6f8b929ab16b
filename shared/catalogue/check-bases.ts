/** Check bases that come with every database. */
export const BASIS_IDS = ['global-1.5', 'usual', 'unusual', 'extreme', 'partial-ec7'] as const
export type BasisId = (typeof BASIS_IDS)[number]

/** How sure a source is: seen in the text, recalled, derived by us, trade practice, or engineering judgement. */
export type SourceTag = 'seen' | 'memory' | 'derived' | 'practice' | 'judgement'

/** Required factors of a check basis; null: the basis does not have this check. */
export interface CheckBasis {
  readonly id: BasisId
  /** `global`: resistance over demand; `partial`: factored effects against factored resistances. */
  readonly format: 'global' | 'partial'
  readonly sliding: number
  readonly overturning: number | null
  readonly flotation: number
  readonly fabric: number
  readonly source: string
  readonly edition: string
  readonly tag: SourceTag
}

const manual = 'EM 1110-2-2100, Stability Analysis of Concrete Structures'

/** Data, not code: each row with its source and edition. */
export const CHECK_BASES: readonly CheckBasis[] = [
  {
    id: 'global-1.5',
    format: 'global',
    sliding: 1.5,
    overturning: 1.5,
    flotation: 1.2,
    fabric: 4,
    source:
      'after FEMA P-259, Engineering Principles and Practices, with the net overturning ratio',
    edition: '3rd edition, 2012; flotation and fabric: common practice',
    tag: 'memory',
  },
  {
    id: 'usual',
    format: 'global',
    sliding: 1.5,
    overturning: null,
    flotation: 1.3,
    fabric: 4,
    source: `after ${manual}: normal structure, ordinary site, return period to 10 years`,
    edition: '2005; fabric: common practice',
    tag: 'memory',
  },
  {
    id: 'unusual',
    format: 'global',
    sliding: 1.3,
    overturning: null,
    flotation: 1.2,
    fabric: 4,
    source: `after ${manual}: normal structure, ordinary site, return period to 300 years`,
    edition: '2005; fabric: common practice',
    tag: 'memory',
  },
  {
    id: 'extreme',
    format: 'global',
    sliding: 1.1,
    overturning: null,
    flotation: 1.1,
    fabric: 4,
    source: `after ${manual}: normal structure, ordinary site, return period above 300 years`,
    edition: '2005; fabric: common practice',
    tag: 'memory',
  },
  {
    id: 'partial-ec7',
    format: 'partial',
    sliding: 1,
    overturning: 1,
    flotation: 1,
    fabric: 1,
    source: 'after EN 1997-1, Annex A: GEO (combinations 1 and 2), EQU, UPL',
    edition: '2004+A1:2013; fabric with γ_M 3.0: common practice',
    tag: 'seen',
  },
]

const byId = new Map(CHECK_BASES.map((basis) => [basis.id, basis]))

/** The basis of that name; the names are closed, so it is always there. */
export function checkBasis(id: BasisId): CheckBasis {
  return byId.get(id)!
}
