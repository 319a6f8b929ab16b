/**
 * Where a check value comes from: the text was seen, it was recalled from memory, it was derived by
 * independent means, or it is common practice without a source.
 */
export const CHECK_TAGS = ['published', 'memory', 'derived', 'practice'] as const
export type CheckTag = (typeof CHECK_TAGS)[number]

/** Topics in the order in which they are shown. */
export const CHECK_TOPICS = [
  'hydrostatics',
  'stability',
  'movingWater',
  'loadedTube',
  'ground',
  'water',
  'pumps',
  'sandbags',
  'chance',
  'sheets',
] as const
export type CheckTopic = (typeof CHECK_TOPICS)[number]

/** One figure of a check value, as the source prints it. */
export interface CheckFigure {
  readonly label: string
  /** As printed, with its trailing zeros: they tell how far the figure may be trusted. */
  readonly printed: string
  readonly unit: string
  /** The same quantity from the product's own functions. */
  readonly compute: () => number
}

/** A check value with the source beside it. */
export interface CheckRow {
  readonly id: string
  readonly topic: CheckTopic
  readonly title: string
  readonly source: string
  readonly tag: CheckTag
  readonly figures: readonly CheckFigure[]
}

/** A value of the trade that the product does not compute: kept for reference, never counted. */
export interface ReferenceRow {
  readonly id: string
  readonly topic: CheckTopic
  readonly title: string
  readonly source: string
  readonly tag: CheckTag
  readonly printed: string
  readonly why: string
}

/** A figure of a check value. */
export function figure(
  label: string,
  printed: string,
  unit: string,
  compute: () => number,
): CheckFigure {
  return { label, printed, unit, compute }
}

/** Half of the last printed digit: by so much a computed figure may differ. */
export function printedTolerance(printed: string): number {
  const decimals = printed.split('.')[1]?.length ?? 0
  return 0.5 * 10 ** -decimals
}

/** True where the computed figure rounds to the printed one. */
export function agrees(figure: CheckFigure): boolean {
  const printed = Number(figure.printed)
  // 1e-12: a printed figure is not exact in binary.
  const allowed = printedTolerance(figure.printed) * (1 + 1e-9) + 1e-12 * Math.abs(printed)
  return Math.abs(figure.compute() - printed) <= allowed
}
