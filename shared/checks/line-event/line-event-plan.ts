import { lineSections, type LineSection } from '../../calc/line/line-sections'
import { isTurnTooSharp } from '../../catalogue/joints'
import type { ForecastBand } from '../../schemas/forecast'
import type { ScenarioBarrier, ScenarioContent, SizeRun } from '../../schemas/scenario'
import type { SectionCase } from '../../schemas/section-case'
import { gripShareOf } from '../bend-loss'
import { assumptionOf, caseAt, sizeAt } from '../place-case'
import { DEPTH_TICK } from '../event/kept-checks'
import { differingBands, type LineEventInput } from './line-event-input'

/** One section that is computed through one band: what a worker gets. */
export interface EventJob {
  readonly section: SectionCase
  readonly gripShare: number
  /** Lowest ground, rounded down to 0.1 mm [m]. */
  readonly groundLevel: number
  readonly band: ForecastBand
}

/** A part of a section with one ground. */
export interface PlannedPiece {
  readonly place: number
  readonly groundLevel: number
  readonly surface: string
  /** Its first job; those of the other bands follow it. */
  readonly firstJob: number
}

/** Why nothing is computed in a section. */
export type EventGap = 'no-size' | 'no-ground' | 'sharp-turn'

export interface PlannedSection {
  readonly from: number
  readonly to: number
  readonly barrier: ScenarioBarrier | null
  readonly gripShare: number
  readonly gap: EventGap | null
  /** Empty where there is a gap. */
  readonly pieces: readonly PlannedPiece[]
  /** Chainage, level and surface of its lowest ground. */
  readonly lowest: Omit<PlannedPiece, 'firstJob'>
}

/** What has to be computed for a line, each thing once. */
export interface LineEventPlan {
  readonly sections: readonly PlannedSection[]
  readonly jobs: readonly EventJob[]
  /** Bands that are computed; the others are as expected. */
  readonly bands: readonly ForecastBand[]
}

/**
 * Every section of the laid line in every band. Pieces of equal size, ground, grip and depth to 0.1 mm
 * are one job; gaps have none.
 */
export function planLineEvent({ survey, content, water }: LineEventInput): LineEventPlan {
  const { stations, sectionLength, marks } = survey
  const bands = differingBands(water)
  const book = new JobBook(bands)
  const sections = lineSections(stations, sectionLength, marks).map((section) =>
    planSection(section, content, { book, sectionLength }),
  )
  return { sections, jobs: book.jobs, bands }
}

interface Planning {
  readonly book: JobBook
  readonly sectionLength: number
}

function planSection(
  section: LineSection,
  content: ScenarioContent,
  { book, sectionLength }: Planning,
): PlannedSection {
  const { from, to } = section
  const run = sizeAt(content, (from + to) / 2)
  const pieces = section.pieces.map(({ lowestAt, lowestGround, surface }) => ({
    place: lowestAt,
    groundLevel: lowestGround,
    surface,
  }))
  const lowest = pieces.reduce((a, b) => (b.groundLevel < a.groundLevel ? b : a))
  const gap = gapOf(section, content, run)
  const gripShare = run ? gripShareOf(section, run.barrier.skirtLength, sectionLength) : 1
  const planned = { from, to, barrier: run?.barrier ?? null, gripShare, gap, lowest }
  if (gap !== null || !run) return { ...planned, pieces: [] }
  return {
    ...planned,
    pieces: pieces.map((piece) => {
      const ground = assumptionOf(content, piece.surface)!
      const place = { chainage: piece.place, groundLevel: 0, surface: piece.surface }
      // Depths follow from the levels: the case itself is dry.
      const dry = { ...content, waterLevel: 0, dryLevel: null }
      const sectionCase = caseAt(dry, place, run, ground)
      return { ...piece, firstJob: book.place(sectionCase, gripShare, piece.groundLevel) }
    }),
  }
}

function gapOf(
  section: LineSection,
  content: ScenarioContent,
  run: SizeRun | null,
): EventGap | null {
  if (!run) return 'no-size'
  if (isTurnTooSharp(section.turnAtStart) || isTurnTooSharp(section.turnAtEnd)) return 'sharp-turn'
  return section.pieces.some(({ surface }) => !assumptionOf(content, surface)) ? 'no-ground' : null
}

/** Jobs in the order in which they are first needed; equal ones stand once. */
class JobBook {
  readonly jobs: EventJob[] = []
  private readonly places = new Map<string, number>()
  private readonly cases = new Map<string, SectionCase>()

  constructor(private readonly bands: readonly ForecastBand[]) {}

  place(section: SectionCase, gripShare: number, groundLevel: number): number {
    // 1e-6 ticks: what binary arithmetic takes off a level that is a whole number of ticks.
    const ticks = Math.floor(groundLevel / DEPTH_TICK + 1e-6)
    const text = JSON.stringify([gripShare, section])
    const key = `${ticks}|${text}`
    const known = this.places.get(key)
    if (known !== undefined) return known
    const place = this.jobs.length
    this.places.set(key, place)
    const shared = this.cases.get(text) ?? section
    this.cases.set(text, shared)
    const ground = Number((ticks * DEPTH_TICK).toFixed(4))
    for (const band of this.bands) {
      this.jobs.push({ section: shared, gripShare, groundLevel: ground, band })
    }
    return place
  }
}
