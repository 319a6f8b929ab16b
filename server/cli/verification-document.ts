import type { ReferenceRow } from '../../shared/verification/check-row'
import { countByTag, groupByTopic, type RecomputedRow } from '../../shared/verification/recompute'
import type { FolderResult, MutationResults } from './mutation/folder-result'

const TAG_WORDS = {
  published: 'published',
  memory: 'from memory',
  derived: 'derived',
  practice: 'common practice',
} as const

const TOPIC_WORDS = {
  hydrostatics: 'Hydrostatics',
  stability: 'Stability with uplift',
  movingWater: 'Moving water',
  loadedTube: 'Loaded tube',
  ground: 'Ground',
  water: 'Water, rain, weirs',
  pumps: 'Pumps',
  sandbags: 'Sandbags',
  chance: 'Chance',
  sheets: 'Sheets and checking',
} as const

interface Verification {
  readonly rows: readonly RecomputedRow[]
  readonly references: readonly ReferenceRow[]
  readonly mutation: MutationResults
  /** All folders below shared/ that mutation tests are meant for. */
  readonly folders: readonly string[]
}

/** docs/verification.md: the check values of the Method page, and how well the tests hold the engine. */
export function verificationDocument(of: Verification): string {
  return [
    '# Verification',
    '',
    'Written by `npm run docs:verification` from `shared/verification/` and `docs/mutation.json`; a test',
    'fails when it is stale. The page `/method` recomputes the same rows while you look.',
    '',
    '## Check values',
    '',
    `${countWords(of.rows)}. ${outcomeWords(of.rows)}`,
    '',
    'A computed figure passes when it rounds to the printed one.',
    '',
    ...groupByTopic(of.rows).flatMap(({ topic, rows }) => [
      `### ${TOPIC_WORDS[topic]}`,
      '',
      ...tableOf(
        ['case', 'figure', 'printed', 'computed', 'difference', '', 'source'],
        rows.flatMap(figureRows),
      ),
    ]),
    '## Reference only',
    '',
    'Values of the trade that the product does not compute. They are not counted; tests recompute those',
    'that close.',
    '',
    ...groupByTopic(of.references).flatMap(({ topic, rows }) => [
      `### ${TOPIC_WORDS[topic]}: reference`,
      '',
      ...tableOf(
        ['value', 'printed', 'source', 'why it is not computed'],
        rows.map(({ title, printed, source, tag, why }) => [
          title,
          printed,
          `${source} (${TAG_WORDS[tag]})`,
          why,
        ]),
      ),
    ]),
    ...mutationChapter(of),
  ].join('\n')
}

function countWords(rows: readonly RecomputedRow[]): string {
  const counts = countByTag(rows)
  return (Object.keys(TAG_WORDS) as (keyof typeof TAG_WORDS)[])
    .map((tag) => `${counts[tag]} ${TAG_WORDS[tag]}`)
    .join(', ')
}

function outcomeWords(rows: readonly RecomputedRow[]): string {
  const failing = rows.filter(({ passes }) => !passes)
  if (failing.length === 0) return 'All pass.'
  return `**Not all pass: ${failing.map(({ title }) => title).join('; ')}.**`
}

function figureRows(row: RecomputedRow): readonly (readonly string[])[] {
  return row.figures.map((figure, i) => [
    i === 0 ? row.title : '',
    figure.label,
    `${figure.printed}${figure.unit === '–' ? '' : ` ${figure.unit}`}`,
    figure.computed ?? '–',
    figure.difference ?? '–',
    figure.passes ? 'pass' : '**fail**',
    i === 0 ? `${row.source} (${TAG_WORDS[row.tag]})` : '',
  ])
}

function mutationChapter({ mutation, folders }: Verification): readonly string[] {
  const measured = Object.entries(mutation.folders)
  const open = folders.filter((folder) => !(folder in mutation.folders))
  return [
    '## Mutation tests',
    '',
    `${mutation.tool} changes the engine one place at a time and runs the tests; what no test notices has`,
    'survived. By folder: `npm run mutation -- calc/uplift`. At least 85 % shall be killed. Random walks over',
    'whole sections are left out, and where tests are named only they ran: what only others would notice',
    'counts as survived, so that a share is never too high.',
    '',
    ...tableOf(
      ['folder', 'measured', 'tests', 'killed', 'survived', 'share'],
      measured.map(([folder, result]) => [
        `\`shared/${folder}\``,
        result.measured,
        result.tests === undefined ? 'all' : `\`${result.tests}\``,
        String(result.killed),
        String(result.survived),
        shareWords(result),
      ]),
    ),
    open.length === 0
      ? 'Every folder is measured.'
      : `Not measured yet: ${open.map((folder) => `\`${folder}\``).join(', ')}.`,
    '',
    '### Survivors',
    '',
    ...tableOf(
      ['place', 'from', 'to', 'why it stays'],
      measured.flatMap(([, { survivors }]) =>
        survivors.map(({ file, line, from, to, reason }) => [
          `\`${file}\`:${line}`,
          `\`${from}\``,
          `\`${to}\``,
          reason === '' ? 'not looked at yet' : reason,
        ]),
      ),
    ),
  ]
}

function shareWords({ killed, survived }: FolderResult): string {
  return `${((100 * killed) / Math.max(1, killed + survived)).toFixed(1)} %`
}

function tableOf(head: readonly string[], rows: readonly (readonly string[])[]): readonly string[] {
  const line = (cells: readonly string[]) =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`
  return [line(head), line(head.map(() => '---')), ...rows.map(line), '']
}
