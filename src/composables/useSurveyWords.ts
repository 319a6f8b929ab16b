import type { Fault } from '@shared/errors'
import { cellOfPath, type CellProblem, type StationColumn } from '@/line/station-rows'
import { useWords } from './useWords'

/** What is wrong with one cell of a survey, and in one sentence. */
export interface CellWords {
  readonly key: string
  readonly row: number | null
  readonly column: StationColumn | null
  /** Under the cell. */
  readonly short: string
  /** By row and column, in the list. */
  readonly sentence: string
}

/** Words for the cells of a survey. */
export function useSurveyWords() {
  const { t } = useWords()
  const columnWord = (column: StationColumn) => t(`linePage.survey.column.${column}`)

  function faultWords(fault: CellProblem | Fault): CellWords {
    if ('reason' in fault) return wordsAt(fault, t(`linePage.survey.fault.${fault.reason}`))
    const cell = cellOfPath(fault.path)
    const allowed = t('states.allowed', { allowed: fault.allowed })
    if (cell) return wordsAt(cell, allowed)
    return { key: fault.path, row: null, column: null, short: allowed, sentence: fault.message }
  }

  function wordsAt(
    { row, column }: { row: number; column: StationColumn },
    short: string,
  ): CellWords {
    const values = { row: row + 1, column: columnWord(column), fault: short }
    const sentence = t('linePage.survey.faultAt', values)
    return { key: `${row}.${column}`, row, column, short, sentence }
  }

  /** A warning names its path; people count rows from one. */
  function warningWords({ path, message }: { path: string; message: string }): string {
    const cell = cellOfPath(path)
    const text = message.startsWith(`${path}: `) ? message.slice(path.length + 2) : message
    return cell ? t('linePage.survey.warningAt', { row: cell.row + 1, message: text }) : text
  }

  return { columnWord, faultWords, warningWords }
}
