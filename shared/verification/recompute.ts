import {
  agrees,
  CHECK_TAGS,
  CHECK_TOPICS,
  type CheckFigure,
  type CheckRow,
  type CheckTag,
  type CheckTopic,
} from './check-row'

/** A figure beside its source. */
export interface RecomputedFigure {
  readonly label: string
  readonly printed: string
  readonly unit: string
  /** In the digits of the printed figure and two more; null where nothing could be computed. */
  readonly computed: string | null
  /** Computed less printed, in the same digits; null likewise. */
  readonly difference: string | null
  readonly passes: boolean
}

/** A check value, recomputed. */
export interface RecomputedRow extends Omit<CheckRow, 'figures'> {
  readonly figures: readonly RecomputedFigure[]
  readonly passes: boolean
}

/** Computes every figure of every row now; what cannot be computed fails and stops nothing. */
export function recompute(rows: readonly CheckRow[]): readonly RecomputedRow[] {
  return rows.map((row) => {
    const figures = row.figures.map(recomputeFigure)
    return { ...row, figures, passes: figures.every(({ passes }) => passes) }
  })
}

function recomputeFigure({ label, printed, unit, compute }: CheckFigure): RecomputedFigure {
  const shown = { label, printed: printed.replace('-', '−'), unit }
  const value = valueOf(compute)
  if (value === null) return { ...shown, computed: null, difference: null, passes: false }
  const digits = (printed.split('.')[1]?.length ?? 0) + 2
  const difference = signed(value - Number(printed), digits)
  const passes = agrees({ label, printed, unit, compute: () => value })
  return { ...shown, computed: signed(value, digits).replace('+', ''), difference, passes }
}

/** The value now; null where the function refuses or gives no finite number. */
function valueOf(compute: () => number): number | null {
  try {
    const value = compute()
    return Number.isFinite(value) ? value : null
  } catch (error) {
    if (error instanceof Error) return null
    throw error
  }
}

/** "+0.0012", "−0.3", "0" where nothing is left in these digits. */
function signed(value: number, digits: number): string {
  const text = Math.abs(value).toFixed(digits)
  if (Number(text) === 0) return '0'
  return value < 0 ? `−${text}` : `+${text}`
}

/** How many rows there are of each tag. */
export function countByTag(
  rows: readonly { readonly tag: CheckTag }[],
): Readonly<Record<CheckTag, number>> {
  return Object.fromEntries(
    CHECK_TAGS.map((tag) => [tag, rows.filter((row) => row.tag === tag).length]),
  ) as Record<CheckTag, number>
}

/** Rows under their topics, in the order of the topics; topics without rows are left out. */
export function groupByTopic<Row extends { readonly topic: CheckTopic }>(
  rows: readonly Row[],
): readonly { readonly topic: CheckTopic; readonly rows: readonly Row[] }[] {
  return CHECK_TOPICS.map((topic) => ({
    topic,
    rows: rows.filter((row) => row.topic === topic),
  })).filter((group) => group.rows.length > 0)
}
