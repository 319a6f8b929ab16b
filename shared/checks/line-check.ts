import { lineSections, type LineSection, type SectionPiece } from '../calc/line/line-sections'
import type { Station } from '../schemas/line'
import type { ScenarioContent } from '../schemas/scenario'
import type { SectionCase } from '../schemas/section-case'
import type { CheckId, Verdict } from '../schemas/section-result'
import { isWorse } from './compare'
import { evaluateSection } from './evaluate-section'
import { holdingProfile, holdsToAt, type HoldingProfile } from './holds-to'
import { assumptionOf, caseAt, sizeAt } from './place-case'

/** Answer for one section of a line: its worst piece. */
export interface SectionAnswer {
  readonly from: number
  readonly to: number
  /** Chainage and ground level of the lowest ground of the worst piece. */
  readonly place: number
  readonly groundLevel: number
  readonly surface: string
  readonly barrierName: string | null
  readonly depth: number
  readonly verdict: Verdict
  readonly governs: CheckId | null
  /** Utilisation of what governs; null where nothing resists, or nothing is laid. */
  readonly utilisation: number | null
  /** Level to which the section holds; null where nothing holds. */
  readonly holdsToLevel: number | null
  /** What fails beyond that level. */
  readonly limitedBy: CheckId | null
  /** Why the section could not be checked. */
  readonly gap: 'no-size' | 'no-ground' | 'too-deep' | null
}

/** Answer for a whole line. */
export interface LineAnswer {
  readonly sections: readonly SectionAnswer[]
  /** Worst verdict of all sections. */
  readonly verdict: Verdict
  /** The section that gives way first as the water rises. */
  readonly weakest: SectionAnswer
}

/** Depth above which a case is not computed, in diameters; the same bound as of a typed depth. */
const DEEPEST = 1.5

/** Profiles by the case that they belong to, its depth left out. */
export type HoldingProfiles = Map<string, HoldingProfile>

/**
 * Checks every section of a line in one scenario. A section is its worst piece; the line is its
 * worst section. Profiles of equal sections are computed once.
 *
 * @param profiles Kept by whoever checks many scenarios: most of them share sizes and grounds.
 */
export function checkLine(
  stations: readonly Station[],
  sectionLength: number,
  content: ScenarioContent,
  profiles: HoldingProfiles = new Map(),
): LineAnswer {
  const sections = lineSections(stations, sectionLength).map((section) =>
    answerSection(section, content, profiles),
  )
  const weakest = sections.reduce((a, b) => (isWeaker(b, a) ? b : a))
  return { sections, verdict: worstVerdict(sections), weakest }
}

function worstVerdict(sections: readonly SectionAnswer[]): Verdict {
  const verdicts = sections.map(({ verdict }) => verdict)
  return (['fails', 'notChecked', 'narrow'] as const).find((v) => verdicts.includes(v)) ?? 'holds'
}

/** True if a gives way at a lower level than b; nothing holds is lowest of all. */
function isWeaker(a: SectionAnswer, b: SectionAnswer): boolean {
  if (b.holdsToLevel === null) return false
  return a.holdsToLevel === null || a.holdsToLevel < b.holdsToLevel
}

function answerSection(
  section: LineSection,
  content: ScenarioContent,
  profiles: HoldingProfiles,
): SectionAnswer {
  const pieces = section.pieces.map((piece) => answerPiece(section, piece, content, profiles))
  const worst = pieces.reduce((a, b) => (isWorsePiece(b, a) ? b : a))
  const lowest = pieces.reduce((a, b) => (isWeaker(b, a) ? b : a))
  return { ...worst, holdsToLevel: lowest.holdsToLevel, limitedBy: lowest.limitedBy }
}

function isWorsePiece(a: SectionAnswer, b: SectionAnswer): boolean {
  if ((a.gap === null) !== (b.gap === null)) return a.gap !== null
  return isWorse(a.utilisation, b.utilisation)
}

function answerPiece(
  section: LineSection,
  piece: SectionPiece,
  content: ScenarioContent,
  profiles: HoldingProfiles,
): SectionAnswer {
  const { lowestGround, lowestAt, surface } = piece
  const place = { chainage: lowestAt, groundLevel: lowestGround, surface }
  const run = sizeAt(content, (section.from + section.to) / 2)
  const ground = assumptionOf(content, surface)
  const blank = {
    from: section.from,
    to: section.to,
    place: lowestAt,
    groundLevel: lowestGround,
    surface,
    barrierName: run?.barrier.name ?? null,
    depth: Math.max(0, content.waterLevel - lowestGround),
  }
  if (!run) return { ...blank, ...uncheckedFor('no-size') }
  if (!ground) return { ...blank, ...uncheckedFor('no-ground') }
  const sectionCase = caseAt(content, place, run, ground)
  const profile = keptProfile(sectionCase, profiles)
  const holdsTo = holdsToAt(profile, blank.depth)
  const limits = {
    holdsToLevel: holdsTo.from === null ? null : lowestGround + holdsTo.depth,
    limitedBy: holdsTo.check,
  }
  if (blank.depth > DEEPEST * run.barrier.diameter) {
    return { ...blank, ...uncheckedFor('too-deep'), ...limits }
  }
  const { verdict, governs, ...checks } = evaluateSection(sectionCase)
  const utilisation = checks[governs]?.utilisation ?? null
  return { ...blank, verdict, governs, utilisation, gap: null, ...limits }
}

/** A section without size or ground cannot be relied on; nor can one under 1.5 diameters of water. */
function uncheckedFor(gap: NonNullable<SectionAnswer['gap']>) {
  const verdict: Verdict = gap === 'too-deep' ? 'fails' : 'notChecked'
  return {
    verdict,
    governs: null,
    utilisation: null,
    holdsToLevel: null,
    limitedBy: null,
    gap,
  }
}

/** The profile does not depend on the depth: sections that differ only in it share one. */
function keptProfile(section: SectionCase, profiles: HoldingProfiles): HoldingProfile {
  const key = JSON.stringify({ ...section, water: { ...section.water, depth: 0 } })
  const kept = profiles.get(key)
  if (kept) return kept
  const profile = holdingProfile(section)
  profiles.set(key, profile)
  return profile
}
