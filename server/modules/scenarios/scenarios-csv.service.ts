import type { ScenarioListItem } from '../../../shared/schemas/project'
import { checksTexts } from '../../../shared/texts/checks.en'
import { scenarioFileTexts } from '../../../shared/texts/scenario-table.en'
import type { Db } from '../../db/client'
import { type CsvCell, toCsv } from '../../http/csv'
import { type LinePlace, lineAt } from '../lines/open-line'
import { listAllScenarios, type ScenariosQuery } from './scenarios.queries'

type Column = keyof typeof scenarioFileTexts

/** Levels as they are printed everywhere: to 1 mm. */
const toMillimetre = (level: number): number => Math.round(level * 1000) / 1000

/** A level that holds is rounded down: 1e-9 m is what binary arithmetic adds. */
const downToMillimetre = (level: number): number => Math.floor(level * 1000 + 1e-6) / 1000

const CELLS: Readonly<Record<Column, (row: ScenarioListItem) => CsvCell>> = {
  name: ({ name }) => name,
  waterLevel: ({ summary }) => toMillimetre(summary.waterLevel),
  basis: ({ basis }) => wordOf(checksTexts.basis, basis.replace('.', '-')),
  upliftModel: ({ upliftModel }) => wordOf(checksTexts.upliftModel, upliftModel),
  leastEdge: ({ edges }) => edges.least,
  mostEdge: ({ edges }) => edges.most,
  verdict: ({ summary }) => checksTexts.verdict[summary.verdict],
  weakestFrom: ({ summary }) => toMillimetre(summary.weakest.from),
  weakestTo: ({ summary }) => toMillimetre(summary.weakest.to),
  weakestPlace: ({ summary }) => toMillimetre(summary.weakest.place),
  weakestCheck: ({ summary }) => summary.weakest.check && checksTexts.name[summary.weakest.check],
  holdsToLevel: ({ summary }) =>
    summary.holdsToLevel === null ? null : downToMillimetre(summary.holdsToLevel),
  sections: ({ summary }) => summary.sections,
  failing: ({ summary }) => summary.failing,
  version: ({ version }) => version,
  updatedAt: ({ updatedAt }) => new Date(updatedAt).toISOString(),
  updatedBy: ({ updatedBy }) => updatedBy.name,
  note: ({ note }) => note,
}

function wordOf(words: Readonly<Record<string, string>>, id: string): string {
  return words[id] ?? id
}

/** The whole table as the query has it, every page of it, as a file for a spreadsheet. */
export function scenariosAsCsv(db: Db, place: LinePlace, query: ScenariosQuery): string {
  lineAt(db, place)
  const columns = Object.keys(scenarioFileTexts) as Column[]
  const rows = listAllScenarios(db, place.lineId, query)
  return toCsv([
    columns.map((column) => scenarioFileTexts[column]),
    ...rows.map((row) => columns.map((column) => CELLS[column](row))),
  ])
}
