import type { CheckId } from '../schemas/check-ids'
import type { SectionCase } from '../schemas/section-case'
import type { Message } from '../texts/format-text'
import type { UnitSystem } from '../units'
import type { FigureKind } from './sheet-units'
import type { SourceId } from './sources'

/** One quantity on a sheet, unrounded, in the unit in which it is written. */
export interface SheetFigure {
  /** Name in the formulas: `W_w`, `mu`. */
  readonly symbol: string
  readonly value: number
  /** Unit for mathjs; empty for a pure number. */
  readonly unit: string
  readonly kind: FigureKind
  /** An input as entered, printed as it is; else a figure of a line, printed to three figures. */
  readonly isGiven: boolean
  /** `down` for what a section holds to and is left at. */
  readonly rounding: 'nearest' | 'down'
}

/**
 * - `recomputed`: evaluated again from its inputs, with units; agrees to 1e-9 and in dimension.
 * - `substituted`: a root, an integral or a series; both sides of its governing equation agree.
 */
export type Proof = 'recomputed' | 'substituted'

/** One line of a derivation. */
export interface DerivationLine {
  readonly id: string
  /** "3.2": group and place in it. */
  readonly number: string
  readonly group: GroupId
  readonly name: Message
  readonly symbol: string
  readonly proof: Proof
  /** Left side, a mathjs expression; the symbol itself for a direct line. */
  readonly left: string
  /** Right side, a mathjs expression. */
  readonly formula: string
  readonly inputs: readonly SheetFigure[]
  readonly result: SheetFigure
  readonly source: SourceId
  readonly note: Message | null
  /** The check whose factor or utilisation this line gives. */
  readonly check: CheckId | null
}

export const GROUP_IDS = [
  'geometry',
  'thrust',
  'weight',
  'uplift',
  'shape',
  'stability',
  'skirt',
  'limits',
  'ground',
  'level',
] as const
export type GroupId = (typeof GROUP_IDS)[number]

/** A finished derivation: every figure of one check, in the order in which it can be followed. */
export interface Derivation {
  readonly section: SectionCase
  readonly system: UnitSystem
  /** Share of friction resistance and skirt grip that bends leave. */
  readonly gripShare: number
  /** What was entered, in the order in which it is first used. */
  readonly givens: readonly SheetFigure[]
  /** Roots that stand in lines before their own. */
  readonly unknowns: readonly SheetFigure[]
  readonly lines: readonly DerivationLine[]
}

/** How many lines there are of each proof. */
export interface ProofCounts {
  readonly recomputed: number
  readonly substituted: number
}

/** Counts the lines by their proof. */
export function proofCounts({ lines }: Pick<Derivation, 'lines'>): ProofCounts {
  const recomputed = lines.filter(({ proof }) => proof === 'recomputed').length
  return { recomputed, substituted: lines.length - recomputed }
}
