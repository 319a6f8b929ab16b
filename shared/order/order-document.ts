import type { Scene } from '../drawing/scene'
import type { Verdict } from '../schemas/check-ids'
import type { Order } from '../schemas/order'

/** Words of an order as its PDF and its page print them: each text is final. */
export interface OrderDocument {
  readonly title: string
  readonly windowTitle: string
  readonly place: string
  readonly site: string
  /** Who issued it, when, and until when it is good. */
  readonly issue: readonly string[]
  /** What it was made from, in which datum and time zone. */
  readonly source: string
  readonly note: string
  /** What everybody must know, in the order in which it is needed. */
  readonly keys: readonly KeyFact[]
  readonly verdict: { readonly id: Verdict; readonly word: string; readonly answers: Lines }
  readonly forecast: TextBlock
  readonly times: TextBlock
  readonly load: LoadBlock
  readonly plugs: PlugBlock
  readonly skirt: { readonly title: string; readonly text: string; readonly scene: Scene }
  readonly lay: LayBlock
  readonly air: AirBlock
  readonly ballast: TextBlock
  readonly leave: TextBlock
  readonly rounds: RoundBlock
  readonly retrieve: { readonly title: string; readonly steps: Lines }
  readonly cautions: { readonly title: string; readonly lines: Lines }
}

export type Lines = readonly string[]

export interface TextBlock {
  readonly title: string
  readonly lines: Lines
}

/** One of the few facts that stand large at the head. */
export interface KeyFact {
  readonly id: 'meet' | 'call' | 'start' | 'leave' | 'water'
  readonly label: string
  readonly value: string
  readonly more: string
}

/** What is put on the lorry. */
export interface LoadBlock {
  readonly title: string
  /** Where; empty without a plan. */
  readonly depot: string
  readonly rows: readonly { readonly label: string; readonly value: string }[]
  readonly also: string
}

/** Something to tick off. */
export interface TickRow {
  /** Name of the tick: `plug-1`, `section-3`. */
  readonly id: string
  readonly text: string
  readonly more: string
  /** What the box that is ticked is called. */
  readonly label: string
}

export interface PlugBlock {
  readonly title: string
  readonly lead: string
  readonly none: string
  readonly rows: readonly TickRow[]
}

/** One section in the order of laying. */
export interface LayRow {
  readonly id: string
  readonly position: number
  readonly place: string
  readonly tube: string
  /** Number of the pair; empty without a plan. */
  readonly pair: string
  readonly edgeBags: string
  readonly ballast: string
  readonly bend: string
  /** "23:41 – 23:55", with the day where it is another one; empty without a plan. */
  readonly times: string
  readonly water: string
  /** Pair, times and water in one line. */
  readonly hours: string
  /** What is to be done besides, in sentences. */
  readonly extras: Lines
  readonly isLate: boolean
  readonly fails: string
  readonly label: string
}

export type LayColumn =
  'position' | 'place' | 'tube' | 'pair' | 'times' | 'water' | 'edgeBags' | 'ballast' | 'bend'

export interface LayBlock {
  readonly title: string
  readonly lead: string
  readonly columns: Readonly<Record<LayColumn, string>>
  readonly rows: readonly LayRow[]
  readonly unlaid: Lines
}

export interface AirBlock {
  readonly title: string
  readonly columns: Readonly<Record<'tube' | 'fill' | 'least' | 'most', string>>
  readonly rows: readonly {
    readonly tube: string
    readonly fill: string
    readonly least: string
    readonly most: string
    /** All of it in one sentence. */
    readonly sentence: string
  }[]
  readonly notes: Lines
}

export interface RoundBlock {
  readonly title: string
  readonly lead: string
  readonly when: string
  readonly do: string
  readonly rows: readonly { readonly when: string; readonly do: string }[]
  readonly hoursTitle: string
  readonly hours: readonly { readonly time: string; readonly shown: string }[]
}

/** What the parts of a document share. */
export interface OrderWork {
  readonly order: Order
  readonly words: OrderWords
}

/** Words, quantities and times of one order. */
export interface OrderWords {
  /** A text by its key. */
  readonly say: (key: string, values?: Readonly<Record<string, string | number>>) => string
  /** A level with its datum; limits are rounded down. */
  readonly level: (value: number, rounding?: 'down') => string
  /** What a gauge reads: a board is read to the centimetre, or to the hundredth of a foot. */
  readonly stage: (value: number, rounding?: 'down') => string
  readonly size: (value: number) => string
  readonly height: (value: number) => string
  readonly pressure: (value: number, rounding?: 'down' | 'up') => string
  readonly mass: (value: number) => string
  readonly speed: (value: number) => string
  readonly diameter: (value: number) => string
  readonly chainage: (value: number) => string
  /** A moment with its day: "Tue 01:41". */
  readonly time: (moment: number) => string
  readonly minutes: (seconds: number) => string
}
