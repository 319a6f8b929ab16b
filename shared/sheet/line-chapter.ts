import { checkLine, type SectionAnswer } from '../checks/line-check'
import { longSectionScene } from '../drawing/long-section'
import { measureWith } from '../drawing/text-width'
import type { SheetLine } from '../schemas/sheet'
import { usedShare } from './check-rows'
import { shownVerdict } from './cover'
import type { Chapter, Table } from './document'
import type { SheetWords } from './sheet-words'
import { chainage, stretchBlock, surfaceName } from './stretch-block'

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
  return {
    id: 'line',
    title: say('sheet.line.title', { name: line.name }),
    blocks: [
      { kind: 'drawing', drawing: { scene, caption: say('sheet.caption.longSection') } },
      { kind: 'table', table: layoutTable(sections, words), caption: say('sheet.line.layout') },
      { kind: 'text', text: say('sheet.line.stretches') },
      ...distinct(sections).map((section) => stretchBlock(line, section, words)),
    ],
  }
}

function column(words: SheetWords, name: string, isRight: boolean) {
  return { label: words.say(`sheet.line.${name}`), isRight }
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
