import { lineSections, type LineSection } from '../../calc/line/line-sections'
import type { Store } from '../../schemas/depot'
import type { Survey } from '../../schemas/line-faults'
import type { ScenarioBarrier, ScenarioContent } from '../../schemas/scenario'
import type { CheckId } from '../../schemas/section-result'
import { againstStore } from '../layout/against-store'
import { offeredSizes } from '../layout/best-layout'
import { layoutBill } from '../layout/layout-bill'
import type { HoldingProfiles, LineAnswer, SectionAnswer } from '../line-check'
import type { Remedy } from './remedy'
import { sectionRemedies, type StoreLeft } from './section-remedies'

/** What would limit the line after a remedy. */
export interface NextLimit {
  /** Chainage at which the line would give way then. */
  readonly place: number
  readonly holdsToLevel: number | null
  readonly check: CheckId | null
}

/** A remedy, and what would limit the whole line then. */
export interface OfferedRemedy extends Remedy {
  readonly next: NextLimit
}

/** A section in the order in which they give way, and what would help. */
export interface WeakPlace {
  readonly section: LineSection
  readonly answer: SectionAnswer
  /** The cheapest first. */
  readonly remedies: readonly OfferedRemedy[]
}

export interface WeakestFirstInput {
  readonly survey: Survey
  readonly content: ScenarioContent
  readonly answer: LineAnswer
  /** Sizes on offer, in any order. */
  readonly sizes: readonly ScenarioBarrier[]
  /** Null where no store is known. */
  readonly store: Pick<Store, 'depots'> | null
  readonly profiles?: HoldingProfiles
}

/**
 * The weakest sections of a line in the order in which they give way as the water rises, each with its
 * remedies and what would limit the line after each of them.
 *
 * @param most Sections that are looked at.
 */
export function weakestFirst(input: WeakestFirstInput, most: number): readonly WeakPlace[] {
  return weakestSections(input.answer, most).map((weak) => weakPlace(input, weak))
}

/**
 * One section with its remedies.
 *
 * @param weak One of the sections of the answer.
 */
export function weakPlace(input: WeakestFirstInput, weak: SectionAnswer): WeakPlace {
  const { survey, content, answer, profiles = new Map() } = input
  const { sectionLength } = survey
  const sections = lineSections(survey.stations, sectionLength, survey.marks)
  const sizes = offeredSizes(input.sizes, sectionLength)
  const left = input.store && storeLeft(survey, content, input.store)
  const index = answer.sections.indexOf(weak)
  const section = sections[index]!
  const work = { content, sizes, left, sectionLength, profiles }
  return {
    section,
    answer: weak,
    remedies: sectionRemedies(section, weak, work).map((remedy) => ({
      ...remedy,
      next: nextLimit(answer, index, remedy),
    })),
  }
}

/** Sections by the level to which they hold; those that hold nothing come first. */
export function weakestSections({ sections }: LineAnswer, most: number): readonly SectionAnswer[] {
  const order = ({ holdsToLevel }: SectionAnswer) => holdsToLevel ?? -Infinity
  return [...sections].sort((a, b) => order(a) - order(b) || a.from - b.from).slice(0, most)
}

function nextLimit({ sections }: LineAnswer, index: number, remedy: Remedy): NextLimit {
  const mended = {
    place: sections[index]!.place,
    holdsToLevel: remedy.holdsToLevel,
    check: remedy.limitedBy,
  }
  return sections.reduce<NextLimit>((lowest, section, i) => {
    if (i === index) return lowest
    const isLower = (section.holdsToLevel ?? -Infinity) < (lowest.holdsToLevel ?? -Infinity)
    if (!isLower) return lowest
    const { place, holdsToLevel, limitedBy, governs } = section
    return { place, holdsToLevel, check: limitedBy ?? governs }
  }, mended)
}

/** What the depots hold beyond what the scenario lays. */
function storeLeft(
  survey: Survey,
  content: ScenarioContent,
  store: Pick<Store, 'depots'>,
): StoreLeft {
  const bill = layoutBill(survey, content)
  const items = store.depots.flatMap((depot) => depot.items)
  const sumOf = (kind: string, barrierId: string | null) =>
    items
      .filter((item) => item.kind === kind && (kind !== 'tube' || item.barrierId === barrierId))
      .reduce((sum, { serviceable }) => sum + serviceable, 0)
  const used = againstStore(bill, store)
  return {
    tubes: (barrierId) => {
      if (barrierId === null) return 0
      const needed = used.find((row) => row.kind === 'tube' && row.barrierId === barrierId)?.needed
      return Math.max(0, sumOf('tube', barrierId) - (needed ?? 0))
    },
    edgeBags: Math.max(0, sumOf('edge-bag', null) - bill.edgeBags),
  }
}
