import type { LoadedOutline } from '../../calc/loaded-shape/loaded-outline'
import type { SectionCase } from '../../schemas/section-case'
import type { Message } from '../../texts/format-text'
import type { DrawnEvaluation } from '../cross-section/section-input'
import type { ShapeRole, TextRole, View } from '../scene'
import type { MeasureText } from '../text-width'

/** What a picture shows beside water, ground and barrier. */
export type PicturePart = 'push' | 'face' | 'onSkirt' | 'uplift' | 'stone' | 'crease' | 'bags'

/** A quantity as a bar under the ground; all bars of a picture are in one scale. */
export interface PictureBar {
  readonly id: string
  readonly role: ShapeRole
  readonly text: TextRole
  readonly value: number
  readonly message: Message
}

/** A height worth a line [m]. */
export interface PictureLevel {
  readonly id: string
  readonly depth: number
  readonly line: ShapeRole
  readonly text: TextRole
  readonly message: Message
}

/** The guess of the room, in metres of height or in the unit of the bars. */
export interface PictureGuess {
  readonly place: 'level' | 'dryLevel' | 'bar'
  readonly value: number
  readonly message: Message
}

/** A tube that no longer stands [m, rad]: how far off the ground, how far away, how far turned. */
export interface Adrift {
  readonly lift: number
  readonly drift: number
  readonly turn: number
}

/** Everything that one large picture of a section needs. */
export interface DemonstrationInput {
  readonly case: SectionCase
  readonly evaluation: DrawnEvaluation
  readonly outline: LoadedOutline | null
  /** Room that is kept while things move [m]. */
  readonly room: { readonly skirtLength: number; readonly depth: number }
  readonly parts: readonly PicturePart[]
  readonly bars: readonly PictureBar[]
  /** Value of a bar of full length; in N/m it is the scale of the arrows as well. */
  readonly reach: number
  /** N/m for an arrow of full length. */
  readonly forceReach: number
  readonly levels: readonly PictureLevel[]
  readonly guess: PictureGuess | null
  /** Wind on the tube [N/m]; 0: none. */
  readonly wind: number
  /** A tube without a skirt; null: the engine's shape. */
  readonly adrift: Adrift | null
  /** A tube that has lost its air, 0 full to 1 flat; null: it has not. */
  readonly collapse: number | null
  readonly view: View
  readonly measure: MeasureText
}
