import type { LineSection, SectionPiece } from '../../calc/line/line-sections'
import { isTurnTooSharp, SKIRT_ROOM } from '../../catalogue/joints'
import type { ScenarioBarrier, ScenarioContent } from '../../schemas/scenario'
import type { SectionCase } from '../../schemas/section-case'
import { gripShareOf } from '../bend-loss'
import { evaluateSection } from '../evaluate-section'
import { holdingProfile, holdsToAt, type HoldingProfile } from '../holds-to'
import { assumptionOf, caseAt, sizeAt } from '../place-case'

/** What one size would do in one section. */
export interface SizeOption {
  /** Place in the list of sizes. */
  readonly size: number
  /** Every piece of the section holds at the level that is checked. */
  readonly holds: boolean
  /** Room that is missing on the wet side [m]; 0 where it fits, or where the room is not known. */
  readonly missingRoom: number
  /**
   * Level to which the section would hold [m]; null where nothing holds. Worked out when it is asked
   * for; with water on the dry side it may be low by a few millimetres.
   */
  readonly holdsToLevel: () => number | null
}

/** Depth above which a case is not computed, in diameters. */
const DEEPEST = 1.5

/** Depths on the dry side this close share a profile, the higher one counting for both [m]. */
const DRY_STEP = 0.02

/** Answers what sizes would do in the sections of one line. */
export type SizeOptions = (section: LineSection) => readonly SizeOption[]

/** What the options of one line rest on. */
export interface OptionsInput {
  readonly content: ScenarioContent
  readonly sizes: readonly ScenarioBarrier[]
  readonly sectionLength: number
}

/**
 * Options of every section of a line. The edge of the skirt stays as the scenario has it in each
 * section. Profiles are shared by pieces of one surface, edge and bend, so that 2000 sections cost
 * little more than one.
 */
export function sizeOptions(input: OptionsInput): SizeOptions {
  const profiles = new Map<string, HoldingProfile>()
  return (section) => {
    const edgeFactor = sizeAt(input.content, (section.from + section.to) / 2)?.edgeFactor ?? null
    return input.sizes.map((barrier, size) => {
      const share = gripShareOf(section, barrier.skirtLength, input.sectionLength)
      const work = { content: input.content, barrier, edgeFactor, share, size, profiles }
      const isJoined = !isTurnTooSharp(section.turnAtStart) && !isTurnTooSharp(section.turnAtEnd)
      return {
        size,
        holds: isJoined && section.pieces.every((piece) => holdsOn(piece, work)),
        missingRoom: missingRoom(section, barrier),
        holdsToLevel: () => (isJoined ? lowestLimit(section.pieces, work) : null),
      }
    })
  }
}

/** Room that a size lacks beside a section [m]. */
export function missingRoom(
  { clearWidth }: Pick<LineSection, 'clearWidth'>,
  { skirtLength }: Pick<ScenarioBarrier, 'skirtLength'>,
): number {
  if (clearWidth === null) return 0
  // 1e-9 m: what binary arithmetic adds to skirt and room.
  const missing = skirtLength + SKIRT_ROOM - clearWidth
  return missing > 1e-9 ? missing : 0
}

interface PieceWork {
  readonly content: ScenarioContent
  readonly barrier: ScenarioBarrier
  readonly edgeFactor: number | null
  readonly share: number
  readonly size: number
  readonly profiles: Map<string, HoldingProfile>
}

function holdsOn(piece: SectionPiece, work: PieceWork): boolean {
  const { content, barrier, share } = work
  const depth = Math.max(0, content.waterLevel - piece.lowestGround)
  if (depth > DEEPEST * barrier.diameter) return false
  const dry = dryDepth(piece, work)
  if (dry > 0) {
    const section = sectionOn(piece, work, { depth, dryDepth: dry })
    return section !== null && evaluateSection(section, share).verdict !== 'fails'
  }
  const profile = profileOn(piece, work)
  if (!profile) return false
  const place = Math.max(depth, profile.firstStep)
  return profile.intervals.some(({ from, to }) => from <= place && place <= to)
}

function lowestLimit(pieces: readonly SectionPiece[], work: PieceWork): number | null {
  let lowest = Infinity
  for (const piece of pieces) {
    const profile = profileOn(piece, work)
    if (!profile) return null
    const depth = Math.max(0, work.content.waterLevel - piece.lowestGround)
    const { from, depth: limit } = holdsToAt(profile, depth)
    if (from === null) return null
    lowest = Math.min(lowest, piece.lowestGround + limit)
  }
  return lowest
}

/** Null where the scenario assumes nothing of the surface. */
function profileOn(piece: SectionPiece, work: PieceWork): HoldingProfile | null {
  const { size, edgeFactor, share, profiles } = work
  const dry = Math.ceil(dryDepth(piece, work) / DRY_STEP - 1e-9) * DRY_STEP
  const key = `${size}|${piece.surface}|${edgeFactor}|${share}|${dry}`
  const kept = profiles.get(key)
  if (kept) return kept
  const section = sectionOn(piece, work, { depth: 0, dryDepth: dry })
  if (!section) return null
  const profile = holdingProfile(section, share)
  profiles.set(key, profile)
  return profile
}

function dryDepth({ lowestGround }: SectionPiece, { content }: PieceWork): number {
  return content.dryLevel === null ? 0 : Math.max(0, content.dryLevel - lowestGround)
}

function sectionOn(
  piece: SectionPiece,
  { content, barrier, edgeFactor }: PieceWork,
  depths: Pick<SectionCase['water'], 'depth' | 'dryDepth'>,
): SectionCase | null {
  const ground = assumptionOf(content, piece.surface)
  if (!ground) return null
  const run = { from: piece.from, to: piece.to, barrier, edgeFactor }
  const place = { chainage: piece.lowestAt, groundLevel: 0, surface: piece.surface }
  const section = caseAt(content, place, run, ground)
  return { ...section, water: { ...section.water, ...depths } }
}
