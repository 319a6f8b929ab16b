import type { SectionState } from '../../checks/section-state'
import type { SectionCase } from '../../schemas/section-case'
import type { SectionResult } from '../../schemas/section-result'
import type { Book } from '../book'

/** What every group of lines writes from. */
export interface LineContext {
  readonly book: Book
  readonly section: SectionCase
  readonly state: SectionState
  readonly result: SectionResult
  /** Share of friction resistance and skirt grip that bends leave, 0 to 1. */
  readonly gripShare: number
  /** Names that the lines before have made known, where a case may do without. */
  readonly names: Names
}

/** Symbols that stand for a quantity in this case; null: the quantity is zero and left out. */
export interface Names {
  /** Depth at the wet edge: `h` on level ground. */
  edgeDepth: string | null
  /** Wetted skirt: `L` unless the edge is dry. */
  skirt: string
  isSloped: boolean
  dryDepth: string | null
  force: string
  moment: string
  lift: string | null
  dryLift: string | null
  uplift: string | null
  upliftMoment: string | null
  selfMoment: string | null
  /** Symbols of forces that vary: current, waves, debris. */
  variableForces: string[]
  variableMoments: string[]
}

/** Where nothing is written yet: level ground, still water, nothing on the dry side. */
export function firstNames(): Names {
  return {
    edgeDepth: 'h',
    skirt: 'L',
    isSloped: false,
    dryDepth: null,
    force: 'F_h',
    moment: 'M_h',
    lift: null,
    dryLift: null,
    uplift: null,
    upliftMoment: null,
    selfMoment: null,
    variableForces: [],
    variableMoments: [],
  }
}

/** "a + b - c" of what is there; "0" never occurs: the first term is always there. */
export function sum(plus: readonly (string | null)[], minus: readonly (string | null)[] = []) {
  const terms = plus.filter((term) => term !== null).join(' + ')
  return minus.reduce<string>((text, term) => (term === null ? text : `${text} - ${term}`), terms)
}
