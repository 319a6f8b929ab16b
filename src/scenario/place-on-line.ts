import {
  groundLevelAt,
  lineSections,
  surfaceAt,
  type LineSection,
} from '@shared/calc/line/line-sections'
import type { Bends } from '@shared/checks/bend-loss'
import { assumptionOf, sizeAt, type Place } from '@shared/checks/place-case'
import type { Survey } from '@shared/schemas/line-faults'
import type { GroundAssumption, ScenarioContent, SizeRun } from '@shared/schemas/scenario'

/** What a line is to a workbench: its survey and how it is cut. */
export type SurveyedLine = Survey

/** A place of a line in a scenario: its ground, its section, and what is laid on it. */
export interface PlaceOnLine extends Place {
  /** The section that it belongs to. */
  readonly section: { readonly from: number; readonly to: number }
  /** Run that lays its size, and where it stands in the list; null where nothing is laid. */
  readonly run: SizeRun | null
  readonly runIndex: number
  /** What the scenario assumes of its surface; null where it assumes nothing. */
  readonly assumption: GroundAssumption | null
  /** Bends at the ends of its section; null where the line goes straight on. */
  readonly bends: Bends | null
}

/** Chainages closer than this are one place [m]. */
const SAME_PLACE = 1e-6

/** Chainages between which a place may lie. */
export function chainageRange({ stations, sectionLength }: SurveyedLine) {
  const from = stations[0]!.chainage
  const last = stations[stations.length - 1]!.chainage
  return { from, to: last > from ? last : from + sectionLength }
}

/**
 * The place at a chainage. Where two sections meet it belongs to the one that begins there, unless
 * `towards` names the other. A section lies in the run at its middle, as the line's check has it.
 */
export function placeOnLine(
  line: SurveyedLine,
  content: ScenarioContent,
  chainage: number,
  towards?: { readonly from: number; readonly to: number },
): PlaceOnLine {
  const laid = sectionAt(line, chainage, towards)
  const section = { from: laid.from, to: laid.to }
  const middle = (section.from + section.to) / 2
  const run = sizeAt(content, middle)
  const isEnd = chainage > section.to - SAME_PLACE && line.stations.length > 1
  // The surface counts up to the next station, so the end of a section still lies on its own.
  const surface = surfaceAt(line.stations, isEnd ? chainage - 2 * SAME_PLACE : chainage)
  return {
    chainage,
    groundLevel: groundLevelAt(line.stations, chainage),
    surface,
    section,
    run,
    runIndex: run ? content.sizes.lastIndexOf(run) : -1,
    assumption: assumptionOf(content, surface),
    bends: bendsOf(laid, line.sectionLength),
  }
}

function sectionAt(
  { stations, sectionLength, marks }: SurveyedLine,
  chainage: number,
  towards?: { readonly from: number; readonly to: number },
): LineSection {
  const sections = lineSections(stations, sectionLength, marks)
  const touching = sections.filter(
    ({ from, to }) => from <= chainage + SAME_PLACE && chainage <= to + SAME_PLACE,
  )
  const wanted = towards && touching.find(({ from }) => Math.abs(from - towards.from) < SAME_PLACE)
  return wanted ?? touching.at(-1) ?? sections[0]!
}

function bendsOf({ turnAtStart, turnAtEnd }: LineSection, sectionLength: number): Bends | null {
  if (turnAtStart === 0 && turnAtEnd === 0) return null
  return { turnAtStart, turnAtEnd, sectionLength }
}
