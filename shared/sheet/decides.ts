import { EDGE_FACTORS, whatDecides, type Alternative as Change } from '../checks/what-decides'
import type { SectionCase } from '../schemas/section-case'
import type { HoldsTo } from '../schemas/section-result'
import type { Sheet } from '../schemas/sheet'
import type { AlternativeGroup } from './document'
import type { SheetWords } from './sheet-words'

const GROUPS = ['edge', 'friction', 'basis'] as const
type GroupId = (typeof GROUPS)[number]

/** Edge, friction and basis: what is chosen, and what each other choice would change. */
export function decidesOf(sheet: Sheet, words: SheetWords): readonly AlternativeGroup[] {
  const { case: section, result } = sheet
  const changes = whatDecides(section, null, () => sheet.gripShare)
  return GROUPS.map((group) => ({
    title: words.say(`sheet.decides.${group}`),
    alternatives: [
      { ...row(sheet, words, nameOf(group, section, words), result.holdsTo), isChosen: true },
      ...changes
        .filter((change) => change.group === group)
        .map((change) => ({
          ...row(sheet, words, changeName(change, words), change.holdsTo),
          isChosen: false,
        })),
    ],
  }))
}

function row(
  { groundLevel }: Sheet,
  { say, show, level }: SheetWords,
  name: string,
  { from, depth }: HoldsTo,
) {
  if (from === null) return { name, holdsTo: say('sheet.decides.nothing') }
  const holdsTo =
    groundLevel === null ? show(depth, 'length', 'down') : level(groundLevel + depth, 'down')
  return { name, holdsTo }
}

function nameOf(group: GroupId, section: SectionCase, { say, show }: SheetWords): string {
  if (group === 'basis') return say(`checks.basis.${section.basis.replace('.', '-')}`)
  if (group === 'friction') return show(section.ground.friction, 'ratio')
  const { model, edgeFactor } = section.uplift
  if (model === 'none') return say('sheet.decides.none')
  const named = Object.entries(EDGE_FACTORS).find(([, factor]) => factor === edgeFactor)
  if (named) return say(`sheet.decides.${named[0]}`)
  return say('sheet.decides.typed', { share: show(edgeFactor, 'percent') })
}

function changeName({ group, section }: Change, words: SheetWords): string {
  if (group === 'friction') {
    const friction = words.show(section.ground.friction, 'ratio')
    return words.say('sheet.decides.slippery', { friction })
  }
  return nameOf(group as GroupId, section, words)
}
