import type { CheckId } from '../../schemas/check-ids'
import type { GroupId } from '../line'
import type { SourceId } from '../sources'
import type { LineContext } from './context'

/** What one check compares, as expressions. */
export interface ComparedAs {
  readonly check: Exclude<CheckId, 'freeboard' | 'ground'>
  readonly group: GroupId
  readonly resistance: string
  readonly demand: string
  /** Endings of the symbols `FS_…`, `n_…`, `u_…`. */
  readonly suffix: string
  readonly source?: SourceId
}

/**
 * Factor and utilisation of a check: FS = R / E, u = n E / R. Where nothing acts, or nothing
 * resists, or the basis does not ask, the line is left out and the summary says why. Beside a bend
 * part of the skirt is missing, and friction counts with the share that is left.
 */
export function writeCheck({ book, result, gripShare }: LineContext, compared: ComparedAs): void {
  const { check, group, demand, suffix, source = 'basis' } = compared
  const answer = result[check]
  const isShared =
    gripShare < 1 && (answer.factor ?? 0) > 0 && (check === 'sliding' || check === 'skirt')
  const resistance = isShared ? `(s_g * ${compared.resistance})` : compared.resistance
  if (isShared) book.given('s_g', gripShare, 'ratio')
  if (answer.factor !== null) {
    book.line(group, {
      id: `${check}Factor`,
      symbol: `FS_${suffix}`,
      formula: `${resistance} / ${demand}`,
      value: answer.factor,
      kind: 'ratio',
      source,
      check,
    })
  }
  if (answer.required === null || answer.utilisation === null || answer.factor === null) return
  book.given(`n_${suffix}`, answer.required, 'ratio')
  book.line(group, {
    id: `${check}Used`,
    symbol: `u_${suffix}`,
    formula: `n_${suffix} * ${demand} / ${resistance}`,
    value: answer.utilisation,
    kind: 'ratio',
    source,
    check,
  })
}
