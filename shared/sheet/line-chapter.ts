import { checkLine, type SectionAnswer } from '../checks/line-check'
import { assumptionOf, caseAt, sizeAt } from '../checks/place-case'
import { evaluateSection } from '../checks/evaluate-section'
import { longSectionScene } from '../drawing/long-section'
import { measureWith } from '../drawing/text-width'
import { CHECK_IDS } from '../schemas/check-ids'
import type { SheetLine } from '../schemas/sheet'
import { usedShare } from './check-rows'
import { shownVerdict } from './cover'
import type { Block, Chapter, Table, TableCell } from './document'
import type { SheetWords } from './sheet-words'

/** The line as laid: long section, layout table, one check for each distinct stretch. */
export function lineChapter(line: SheetLine, words: SheetWords): Chapter {
  const { stations, sectionLength, marks, content } = line
  const answer = checkLine({ stations, sectionLength, marks }, content)
  const { weakest, sections } = answer
  const scene = longSectionScene({
    view: { width: 640, height: 250 },
    stations,
    sectionLength,
    waterLevel: content.waterLevel,
    runs: content.sizes.map(({ from, to, barrier }) => ({ from, to, diameter: barrier.diameter })),
    sections,
    weakest: { chainage: weakest.place, holdsToLevel: weakest.holdsToLevel },
    place: content.place,
    measure: measureWith(words.resolve),
  })
  const { say } = words
  const stretches: Block[] = [
    {
      kind: 'table',
      table: stretchTable(line, distinct(sections), words),
      caption: say('sheet.line.stretches'),
    },
  ]
  return {
    id: 'line',
    title: say('sheet.line.title', { name: line.name }),
    blocks: [
      { kind: 'drawing', drawing: { scene, caption: say('sheet.caption.longSection') } },
      { kind: 'table', table: layoutTable(sections, words), caption: say('sheet.line.layout') },
      ...stretches,
    ],
  }
}

function column(words: SheetWords, name: string, isRight: boolean) {
  return { label: words.say(`sheet.line.${name}`), isRight }
}

function chainage(value: number): string {
  return String(Number(value.toFixed(1)))
}

/** A ground of the catalogue by its name; another as it was entered. */
function surfaceName(words: SheetWords, surface: string): string {
  const key = `checks.ground.${surface}`
  const name = words.say(key)
  return name === key ? surface : name
}

function layoutTable(sections: readonly SectionAnswer[], words: SheetWords): Table {
  const none = words.say('sheet.line.none')
  return {
    columns: [
      column(words, 'from', true),
      column(words, 'to', true),
      column(words, 'tube', false),
      column(words, 'surface', false),
      column(words, 'ground', true),
      column(words, 'depth', true),
      column(words, 'used', true),
      column(words, 'holdsTo', true),
      column(words, 'verdict', false),
    ],
    rows: sections.map((section) => [
      chainage(section.from),
      chainage(section.to),
      section.barrierName ?? none,
      surfaceName(words, section.surface),
      words.show(section.groundLevel, 'length'),
      words.show(section.depth, 'length'),
      section.utilisation === null ? none : usedShare(words, section.utilisation),
      section.holdsToLevel === null ? none : words.show(section.holdsToLevel, 'length', 'down'),
      shownVerdict(words, section.verdict),
    ]),
  }
}

/** The weakest section of each combination of tube and surface. */
function distinct(sections: readonly SectionAnswer[]): readonly SectionAnswer[] {
  const worst = new Map<string, SectionAnswer>()
  for (const section of sections) {
    const key = `${section.barrierName ?? ''}|${section.surface}`
    const kept = worst.get(key)
    const isWorse = (section.holdsToLevel ?? -Infinity) < (kept?.holdsToLevel ?? -Infinity)
    if (!kept || isWorse) worst.set(key, section)
  }
  return [...worst.values()]
}

const STRETCH_CHECKS = CHECK_IDS.filter((id) => id !== 'ground')

function stretchTable(
  line: SheetLine,
  sections: readonly SectionAnswer[],
  words: SheetWords,
): Table {
  return {
    columns: [
      column(words, 'place', true),
      column(words, 'tube', false),
      column(words, 'surface', false),
      ...STRETCH_CHECKS.map((id) => ({ label: words.say(`checks.name.${id}`), isRight: true })),
      column(words, 'governs', false),
      column(words, 'verdict', false),
    ],
    rows: sections.map((section) => stretchRow(line, section, words)),
  }
}

/** Factors of one stretch at its lowest ground, freeboard as a height. */
function stretchRow(
  { content }: SheetLine,
  section: SectionAnswer,
  words: SheetWords,
): readonly TableCell[] {
  const none = words.say('sheet.line.none')
  const { barrierName, surface, groundLevel, place, verdict, governs, gap, gripShare } = section
  const run = sizeAt(content, (section.from + section.to) / 2)
  const ground = assumptionOf(content, surface)
  const lead = [chainage(place), barrierName ?? none, surfaceName(words, surface)]
  if (gap !== null || !run || !ground) {
    const reason = gap === null ? none : words.say(`sheet.line.gap.${gap}`)
    return [...lead, ...STRETCH_CHECKS.map(() => none), reason, shownVerdict(words, verdict)]
  }
  const at = caseAt(content, { chainage: place, groundLevel, surface }, run, ground)
  const answer = evaluateSection(at, gripShare)
  const figures = STRETCH_CHECKS.map((id) => {
    if (id === 'freeboard') {
      const { available } = answer.freeboard
      return available === null ? none : words.show(available, 'length')
    }
    const factor = answer[id].factor
    return factor === null
      ? none
      : words.show(factor, 'ratio', answer[id].verdict === 'fails' ? 'down' : undefined)
  })
  const name = governs === null ? none : words.say(`checks.name.${governs}`)
  return [...lead, ...figures, name, shownVerdict(words, verdict)]
}
