import type { Written } from '../derivation/notation'
import type { Scene } from '../drawing/scene'
import type { Verdict } from '../schemas/check-ids'
import type { Paper, Sheet, Signatory } from '../schemas/sheet'

/** A verdict as it is shown: a shape, a colour and a word. */
export interface ShownVerdict {
  readonly id: Verdict
  readonly word: string
}

export interface Labelled {
  readonly label: string
  readonly value: string
}

/** A row of the summary of checks. */
export interface CheckRow {
  readonly name: string
  /** What is there: factor, or freeboard. */
  readonly found: string
  readonly needed: string
  readonly used: string
  readonly verdict: ShownVerdict
  /** The line that gives it, "5.2"; empty where none does. */
  readonly line: string
  readonly governs: boolean
}

/** One line of the derivation, in words. */
export interface LineRow {
  readonly id: string
  readonly number: string
  /** Name of an anchor: `line-5-2`. */
  readonly anchor: string
  readonly name: string
  readonly note: string
  readonly source: string
  readonly symbolic: Written
  readonly numeric: Written | null
  readonly result: Written
  /** How a line that was not recomputed was verified; empty for one that was. */
  readonly proof: string
  /** To what both sides of it agree; null where there is no such figure. */
  readonly residual: Written | null
  readonly verdict: (ShownVerdict & { readonly needs: string }) | null
}

export interface LineGroup {
  readonly number: string
  readonly title: string
  readonly lines: readonly LineRow[]
}

/** A row of the table of inputs. */
export interface InputRow {
  readonly symbol: Written
  readonly name: string
  readonly value: Written
  readonly source: string
}

export interface Table {
  readonly columns: readonly { readonly label: string; readonly isRight: boolean }[]
  readonly rows: readonly (readonly TableCell[])[]
}
export type TableCell = string | ShownVerdict

/** A drawing with what it shows in words. */
export interface Drawing {
  readonly scene: Scene
  readonly caption: string
}

/** One piece of a chapter that others add: the line, an event, a deployment. */
export type Block =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'table'; readonly table: Table; readonly caption: string }
  | { readonly kind: 'drawing'; readonly drawing: Drawing }

export interface Chapter {
  readonly id: string
  readonly title: string
  readonly blocks: readonly Block[]
}

export interface Alternative {
  readonly name: string
  readonly holdsTo: string
  readonly isChosen: boolean
}

export interface AlternativeGroup {
  readonly title: string
  readonly alternatives: readonly Alternative[]
}

export interface ApprovalBox {
  readonly role: string
  readonly person: Signatory | null
}

/** A sheet in words, formulas and drawings: page and PDF both set this, and nothing else. */
export interface SheetDocument {
  readonly title: string
  readonly language: 'en'
  readonly date: string
  readonly paper: Paper
  /** Word across every page; empty: none. */
  readonly band: string
  readonly head: {
    readonly project: string
    readonly place: string
    readonly number: string
    readonly revision: string
  }
  readonly letterhead: Sheet['letterhead']
  readonly cover: {
    readonly verdict: ShownVerdict
    readonly answer: string
    readonly subject: string
    readonly leave: string
    readonly conditionsLead: string
    readonly conditions: readonly string[]
    readonly facts: readonly Labelled[]
    readonly purpose: string
  }
  readonly checks: readonly CheckRow[]
  readonly section: Drawing
  readonly pressures: Drawing
  readonly factors: Drawing
  readonly groups: readonly LineGroup[]
  /** "52 of 52 lines recomputed with units, 5 of 5 verified by substitution. …" */
  readonly proofs: string
  readonly omitted: string
  readonly decides: readonly AlternativeGroup[]
  readonly decidesNotes: readonly string[]
  readonly chapters: readonly Chapter[]
  readonly assumptions: readonly { readonly text: string; readonly tag: string }[]
  readonly inputs: readonly InputRow[]
  readonly references: readonly string[]
  readonly cautions: readonly string[]
  readonly method: readonly string[]
  readonly approvals: readonly ApprovalBox[]
  readonly verification: Sheet['verification']
  readonly photographs: Sheet['photographs']
  /** What the attached file is, in words. */
  readonly attachment: string
  readonly words: Readonly<Record<string, string>>
}
