import { lineSections, type LineSection, type SectionPiece } from '../calc/line/line-sections'
import { isTurnTooSharp } from '../catalogue/joints'
import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent } from '../schemas/scenario'
import type { SectionCase } from '../schemas/section-case'
import type { CheckId, Verdict } from '../schemas/section-result'
import { isWorse } from './compare'
import { evaluateSection } from './evaluate-section'
import { holdingProfile, holdsToAt, type HoldingProfile } from './holds-to'
import { gripShareOf } from './bend-loss'
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
  /** Loaded crest in the datum of the line [m]; null where no shape stands, or nothing is laid. */
  readonly crestLevel: number | null
  /** Freeboard that is there [m]; null where no shape stands. */
  readonly freeboard: number | null
  /** Share of friction resistance and skirt grip that missing skirt at bends leaves, 0 to 1. */
  readonly gripShare: number
  /** Why the section could not be checked. */
  readonly gap: 'no-size' | 'no-ground' | 'too-deep' | 'sharp-turn' | null
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
 * worst section. Profiles of equal sections are computed once. Skirt that is missing at a bend takes its
 * share of friction resistance and skirt grip from both sections beside it.
 *
 * @param profiles Kept by whoever checks many scenarios: most of them share sizes and grounds.
 */
export function checkLine(
  { stations, sectionLength, marks }: Survey,
  content: ScenarioContent,
  profiles: HoldingProfiles = new Map(),
): LineAnswer {
  const sections = lineSections(stations, sectionLength, marks).map((section) =>
    answerSection(section, content, { sectionLength, profiles }),
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

/** What all sections of one answer share. */
export interface LineWork {
  readonly sectionLength: number
  readonly profiles: HoldingProfiles
}

/** The answer for one section in a scenario: its worst piece, and the lowest level of all pieces. */
export function answerSection(
  section: LineSection,
  content: ScenarioContent,
  work: LineWork,
): SectionAnswer {
  const pieces = section.pieces.map((piece) => answerPiece(section, piece, content, work))
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
  { sectionLength, profiles }: LineWork,
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
  if (isTurnTooSharp(section.turnAtStart) || isTurnTooSharp(section.turnAtEnd)) {
    return { ...blank, ...uncheckedFor('sharp-turn') }
  }
  if (!ground) return { ...blank, ...uncheckedFor('no-ground') }
  const sectionCase = caseAt(content, place, run, ground)
  const gripShare = gripShareOf(section, run.barrier.skirtLength, sectionLength)
  const profile = keptProfile(sectionCase, gripShare, profiles)
  const holdsTo = holdsToAt(profile, blank.depth)
  const limits = {
    holdsToLevel: holdsTo.from === null ? null : lowestGround + holdsTo.depth,
    limitedBy: holdsTo.check,
  }
  if (blank.depth > DEEPEST * run.barrier.diameter) {
    return { ...blank, ...uncheckedFor('too-deep'), ...limits }
  }
  const { verdict, governs, ...checks } = evaluateSection(sectionCase, gripShare)
  const { loadedShape: shape, freeboard } = checks
  return {
    ...blank,
    verdict,
    governs,
    utilisation: checks[governs]?.utilisation ?? null,
    crestLevel: shape.solved ? lowestGround + shape.crest : null,
    freeboard: freeboard.available ?? null,
    gripShare,
    gap: null,
    ...limits,
  }
}

/** A section without size or ground cannot be relied on; nor can one under 1.5 diameters of water. */
function uncheckedFor(gap: NonNullable<SectionAnswer['gap']>) {
  const isFailing = gap === 'too-deep' || gap === 'sharp-turn'
  const verdict: Verdict = isFailing ? 'fails' : 'notChecked'
  return {
    verdict,
    governs: null,
    utilisation: null,
    holdsToLevel: null,
    limitedBy: null,
    crestLevel: null,
    freeboard: null,
    gripShare: 1,
    gap,
  }
}

/** The profile does not depend on the depth: sections that differ only in it share one. */
export function keptProfile(
  section: SectionCase,
  gripShare: number,
  profiles: HoldingProfiles,
): HoldingProfile {
  const key = JSON.stringify([gripShare, { ...section, water: { ...section.water, depth: 0 } }])
  const kept = profiles.get(key)
  if (kept) return kept
  const profile = holdingProfile(section, gripShare)
  profiles.set(key, profile)
  return profile
}
