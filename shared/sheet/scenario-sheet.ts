import { groundLevelAt, lineSections, surfaceAt } from '../calc/line/line-sections'
import { type Bends, gripShareBeside } from '../checks/bend-loss'
import { evaluateSection } from '../checks/evaluate-section'
import { holdingProfile, holdsToAt } from '../checks/holds-to'
import { justEnough } from '../checks/just-enough'
import { assumptionOf, caseAt, sizeAt } from '../checks/place-case'
import { isTurnTooSharp } from '../catalogue/joints'
import { OutOfRangeError, showValue } from '../errors'
import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent } from '../schemas/scenario'
import type { SectionCase } from '../schemas/section-case'
import { sectionFaults } from '../schemas/section-faults'
import type { SectionResult } from '../schemas/section-result'
import type { Sheet } from '../schemas/sheet'
import { sheetWords } from './sheet-words'

/** Chainages closer than this are one place [m]. */
const SAME_PLACE = 1e-6

/** What a sheet takes from a scenario; everything in it is computed here. */
export type ScenarioPart = Pick<
  Sheet,
  | 'case'
  | 'result'
  | 'gripShare'
  | 'bends'
  | 'groundLevel'
  | 'barrier'
  | 'surface'
  | 'leave'
  | 'line'
>

/** Where a section lies and what it rests on, in words. */
export function sourceWords(
  line: string,
  chainage: number,
  scenario: { readonly name: string; readonly version: number },
): Pick<Sheet, 'place' | 'restsOn'> {
  const { say } = sheetWords('metric', '')
  const { name, version } = scenario
  return {
    place: say('sheet.source.place', { line, chainage: String(chainage) }),
    restsOn: say('sheet.source.restsOn', { name, version }),
  }
}

/**
 * The part of a sheet that a scenario gives: one cross-section at a place, and the line around it.
 *
 * @param place Chainage [m], on the line.
 * @throws OutOfRangeError where nothing can be computed at the place: off the line, nothing laid, or
 * nothing assumed of its ground.
 */
export function scenarioPart(
  line: Survey & { readonly name: string },
  content: ScenarioContent,
  place: number,
): ScenarioPart {
  const { stations, sectionLength, marks } = line
  const section = lineSections(stations, sectionLength, marks)
    .filter(({ from, to }) => from <= place + SAME_PLACE && place <= to + SAME_PLACE)
    .at(-1)
  if (!section) throw refused(place, 'a chainage on the line')
  const isEnd = place > section.to - SAME_PLACE && stations.length > 1
  const surface = surfaceAt(stations, isEnd ? place - 2 * SAME_PLACE : place)
  const groundLevel = groundLevelAt(stations, place)
  const run = sizeAt(content, (section.from + section.to) / 2)
  if (!run) throw refused(place, 'a chainage at which the scenario lays a tube')
  const { turnAtStart, turnAtEnd } = section
  if (isTurnTooSharp(turnAtStart) || isTurnTooSharp(turnAtEnd)) {
    throw refused(place, 'a chainage beside turns that closures can make')
  }
  const ground = assumptionOf(content, surface)
  if (!ground) throw refused(place, 'a chainage on ground that the scenario knows')
  const at = caseAt(content, { chainage: place, groundLevel, surface }, run, ground)
  const faults = sectionFaults(at)
  if (faults.length > 0) throw new OutOfRangeError(faults)
  const bends =
    turnAtStart === 0 && turnAtEnd === 0 ? null : { turnAtStart, turnAtEnd, sectionLength }
  const gripShare = gripShareBeside(bends)(run.barrier.skirtLength)
  return {
    case: at,
    result: resultOf({ case: at, gripShare, bends }),
    ...{ gripShare, bends, groundLevel, surface, barrier: run.barrier.name },
    leave: { rateOfRise: content.rateOfRise, timeToClear: content.timeToClear },
    line: {
      name: line.name,
      stations: [...stations],
      sectionLength,
      marks: [...(marks ?? [])],
      content,
    },
  }
}

interface Checked {
  readonly case: SectionCase
  readonly gripShare: number
  /** Bends that leave that share; null: none, or not known. */
  readonly bends: Bends | null
}

/** The whole answer for one section with the grip that bends leave, as the workbench has it. */
export function resultOf({ case: section, gripShare, bends }: Checked): SectionResult {
  const { workings: _, ...evaluation } = evaluateSection(section, gripShare)
  return {
    ...evaluation,
    justEnough: justEnough(section, bends ? gripShareBeside(bends) : () => gripShare),
    holdsTo: holdsToAt(holdingProfile(section, gripShare), section.water.depth),
  }
}

function refused(value: number, allowed: string): OutOfRangeError {
  const message = `place: ${showValue(value)} is not allowed; it must be ${allowed}`
  return new OutOfRangeError([{ path: 'place', value, allowed, unit: 'm', message }])
}
