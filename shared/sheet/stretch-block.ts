import { evaluateSection, type SectionEvaluation } from '../checks/evaluate-section'
import type { SectionAnswer } from '../checks/line-check'
import { assumptionOf, caseAt, sizeAt } from '../checks/place-case'
import { CHECK_IDS, type CheckId } from '../schemas/check-ids'
import type { SheetLine } from '../schemas/sheet'
import { usedShare } from './check-rows'
import { shownVerdict } from './cover'
import type { Block, TableCell } from './document'
import type { SheetWords } from './sheet-words'

/** A chainage to 0.1 m. */
export function chainage(value: number): string {
  return String(Number(value.toFixed(1)))
}

/** A ground of the catalogue by its name; another as it was entered. */
export function surfaceName(words: SheetWords, surface: string): string {
  const key = `checks.ground.${surface}`
  const name = words.say(key)
  return name === key ? surface : name
}

const COLUMNS = ['check', 'demand', 'resistance', 'factor', 'needed', 'used', 'verdict'] as const

/** Checks that compare a demand with a resistance; freeboard is a height. */
const COMPARED = ['sliding', 'overturning', 'flotation', 'skirt', 'fabric'] as const
type Compared = (typeof COMPARED)[number]

const isCompared = (id: CheckId): id is Compared => COMPARED.some((one) => one === id)

/**
 * One distinct stretch, checked at its lowest ground: demand and resistance of every check, so that a
 * reader divides one by the other. Where nothing can be checked, the reason.
 */
export function stretchBlock(line: SheetLine, section: SectionAnswer, words: SheetWords): Block {
  const { content } = line
  const { surface, groundLevel, place, gap, gripShare, barrierName, depth } = section
  const { say, show } = words
  const caption = say('sheet.line.stretch', {
    place: chainage(place),
    tube: barrierName ?? say('sheet.line.gap.no-size'),
    surface: surfaceName(words, surface),
    ground: words.level(groundLevel),
    depth: show(depth, 'length'),
  })
  const run = sizeAt(content, (section.from + section.to) / 2)
  const ground = assumptionOf(content, surface)
  if (gap !== null || !run || !ground) {
    return { kind: 'text', text: `${caption}: ${say(`sheet.line.gap.${gap ?? 'no-size'}`)}` }
  }
  const at = caseAt(content, { chainage: place, groundLevel, surface }, run, ground)
  const answer = evaluateSection(at, gripShare)
  return {
    kind: 'table',
    caption:
      gripShare === 1
        ? caption
        : say('sheet.line.besideBend', { caption, share: show(gripShare, 'percent') }),
    table: {
      columns: COLUMNS.map((name) => ({
        label: say(`sheet.line.column.${name}`),
        isRight: name !== 'check' && name !== 'verdict',
      })),
      rows: CHECK_IDS.flatMap((id) => rowOf(answer, id, words)),
    },
  }
}

function rowOf(
  answer: SectionEvaluation,
  id: CheckId,
  words: SheetWords,
): readonly (readonly TableCell[])[] {
  const check = answer[id]
  if (!check || check.verdict === 'notChecked') return []
  const { say, show } = words
  const none = say('sheet.line.none')
  const kind = id === 'freeboard' ? 'length' : 'ratio'
  const needed = check.required === null ? none : show(check.required, kind)
  const used = check.utilisation === null ? none : usedShare(words, check.utilisation)
  return [
    [
      say(`checks.name.${id}`),
      ...(isCompared(id) ? compared(answer, id, words) : [none, none, foundOf(answer, id, words)]),
      ...[needed, used, shownVerdict(words, check.verdict)],
    ],
  ]
}

function compared(answer: SectionEvaluation, id: Compared, { show, say }: SheetWords) {
  const { demand, resistance } = answer.workings[id]
  const { factor, verdict } = answer[id]
  const kind = id === 'overturning' ? 'momentPerLength' : 'forcePerLength'
  const shown =
    factor === null
      ? say('sheet.line.none')
      : show(factor, 'ratio', verdict === 'fails' ? 'down' : undefined)
  return [show(demand, kind), show(resistance, kind), shown]
}

function foundOf({ freeboard }: SectionEvaluation, id: CheckId, { show, say }: SheetWords) {
  const available = id === 'freeboard' ? freeboard.available : null
  return available === null ? say('sheet.line.none') : show(available, 'length')
}
