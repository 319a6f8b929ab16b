import type { ScenarioBarrier, ScenarioContent } from '@shared/schemas/scenario'
import {
  depthNow,
  groundLevel,
  sectionCase,
  tidy,
  waterLevel,
  type CaseInput,
} from '@/quick-check/case-input'
import { assumptionFor, newContent, surfacesOf } from './new-content'
import { namedBarrier } from './place-input'
import type { SurveyedLine } from './place-on-line'
import type { TubeBook } from './tube-book'

/** A line of one station, for a case without a survey. */
export function lineOfCase(input: CaseInput, ground: number): SurveyedLine {
  const station = {
    chainage: 0,
    x: null,
    y: null,
    groundLevel: ground,
    surface: input.choices.surface,
    clearWidth: null,
    note: '',
  }
  return { stations: [station], sectionLength: input.values.sectionLength ?? 10 }
}

/** Ground level that the case itself knows [m]; null while the water is entered as a depth. */
export const groundOfCase = groundLevel

/**
 * A Quick check as a scenario of a line: its barrier from end to end, its assumptions for the surface
 * it was made for, the catalogue's for the others. A depth counts at the lowest ground of the line.
 */
export function contentOfCase(
  input: CaseInput,
  line: SurveyedLine,
  tubes: TubeBook,
): ScenarioContent {
  const start = newContent(line, tubes)
  const section = sectionCase(input)
  const lowest = Math.min(...line.stations.map((station) => station.groundLevel))
  const ground = groundLevel(input) ?? lowest
  const now = depthNow(input)
  const { dryDepth, depth, ...water } = section.water
  const { fall, ...assumed } = section.ground
  return {
    ...start,
    waterLevel: tidy(waterLevel(input) ?? lowest + depth),
    levelNow: now === null ? null : tidy(ground + now),
    dryLevel: dryDepth > 0 ? tidy(ground + dryDepth) : null,
    sizes: start.sizes.map((run) => ({ ...run, barrier: barrierOfCase(input, tubes) })),
    grounds: surfacesOf(line).map((surface) =>
      surface === input.choices.surface ? { surface, ...assumed } : assumptionFor(surface),
    ),
    fall,
    uplift: section.uplift,
    water,
    debris: section.debris,
    gravity: section.gravity,
    requiredFreeboard: section.requiredFreeboard,
    basis: section.basis,
    rateOfRise: input.values.rateOfRise,
    timeToClear: input.values.clearTime ?? start.timeToClear,
  }
}

function barrierOfCase(input: CaseInput, tubes: TubeBook): ScenarioBarrier {
  const { barrier } = sectionCase(input)
  const { statedHeight } = input.values
  const unnamed = { ...barrier, statedHeight, name: '', catalogueId: null, catalogueRevision: null }
  return namedBarrier(unnamed, tubes)
}
