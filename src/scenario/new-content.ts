import { BARRIERS, type CatalogueBarrier } from '@shared/catalogue/barriers'
import { GROUNDS } from '@shared/catalogue/grounds'
import type { ScenarioBarrier, ScenarioContent } from '@shared/schemas/scenario'
import { SECTION_RANGES } from '@shared/schemas/section-ranges'
import { INITIAL_VALUES } from '@/quick-check/address'
import { chainageRange, type SurveyedLine } from './place-on-line'
import type { TubeBook } from './tube-book'

/** A tube of the catalogue as a scenario keeps it. */
export function barrierOf(tube: CatalogueBarrier, tubes: TubeBook): ScenarioBarrier {
  const { id, isExample: _, ...figures } = tube
  const name = tubes.nameOf(tube.diameter)
  return { ...figures, name, catalogueId: id, catalogueRevision: tubes.revisionOf(tube) }
}

/** What is assumed of a surface until somebody says otherwise. */
export function assumptionFor(surface: string): ScenarioContent['grounds'][number] {
  const ground = GROUNDS.find(({ id }) => id === surface)
  return {
    surface,
    friction: ground?.friction ?? INITIAL_VALUES.friction!,
    suitable: ground?.isSuitable ?? true,
    permeability: ground?.permeability ?? null,
    layerThickness: ground?.layerThickness ?? null,
  }
}

/** Surfaces of a line, each once. */
export function surfacesOf({ stations }: SurveyedLine): readonly string[] {
  return [...new Set(stations.map(({ surface }) => surface))]
}

/** Depth at the lowest ground with which a new scenario begins; the default case [m]. */
export const FIRST_DEPTH = INITIAL_VALUES.depth!

/** A first scenario of a line: one size from end to end, the water just over its lowest ground. */
export function newContent(line: SurveyedLine, tubes: TubeBook): ScenarioContent {
  const { from, to } = chainageRange(line)
  const lowest = line.stations.reduce((a, b) => (b.groundLevel < a.groundLevel ? b : a))
  const tube = BARRIERS.find(({ diameter }) => diameter > FIRST_DEPTH * 1.5) ?? BARRIERS.at(-1)!
  return {
    waterLevel: Number((lowest.groundLevel + FIRST_DEPTH).toFixed(3)),
    forecast: null,
    event: null,
    levelNow: null,
    levelLow: null,
    levelHigh: null,
    dryLevel: null,
    place: lowest.chainage,
    sizes: [{ from, to, barrier: barrierOf(tube, tubes), edgeFactor: null }],
    grounds: surfacesOf(line).map(assumptionFor),
    fall: SECTION_RANGES['ground.fall'].default,
    uplift: { model: 'linear', edgeFactor: 1, diffusivity: null, time: null },
    water: {
      density: SECTION_RANGES['water.density'].default,
      currentSpeed: 0,
      dragCoefficient: SECTION_RANGES['water.dragCoefficient'].default,
      waveHeight: 0,
      wavePeriod: null,
    },
    debris: { force: 0, draught: SECTION_RANGES['debris.draught'].default },
    gravity: SECTION_RANGES.gravity.default,
    requiredFreeboard: SECTION_RANGES.requiredFreeboard.default,
    basis: 'global-1.5',
    rateOfRise: null,
    timeToClear: INITIAL_VALUES.clearTime!,
    deployment: null,
  }
}
