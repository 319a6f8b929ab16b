import { LOW_ROAD_STATIONS } from '../../server/demo/ferry-quay-lines'
import { BARRIERS } from '../../shared/catalogue/barriers'
import { GROUNDS } from '../../shared/catalogue/grounds'
import {
  scenarioContentSchema,
  type ScenarioContent,
  type SizeRun,
} from '../../shared/schemas/scenario'

/** A tube of the catalogue from chainage to chainage. */
export function sizeRun(from: number, to: number, index = 1): SizeRun {
  const { id, isExample: _, ...barrier } = BARRIERS[index]!
  return {
    from,
    to,
    barrier: { ...barrier, name: id, catalogueId: id, catalogueRevision: 1 },
    edgeFactor: null,
  }
}

/** Tube 0.70 m on all of Low road against 3.42, with changes. */
export function lowRoadContent(changes: Partial<ScenarioContent> = {}): ScenarioContent {
  return {
    ...scenarioContentSchema.parse({
      waterLevel: 3.42,
      place: 45,
      sizes: [sizeRun(0, 180)],
      grounds: GROUNDS.map(({ id, friction, isSuitable }) => ({
        surface: id,
        friction,
        suitable: isSuitable,
      })),
    }),
    ...changes,
  }
}

/** Three stations on turf, as somebody types them on the telephone. */
export const SHORT_STATIONS = [
  { chainage: 0, groundLevel: 2.9, surface: 'turf' },
  { chainage: 10, groundLevel: 2.8, surface: 'turf' },
  { chainage: 20, groundLevel: 2.95, surface: 'turf' },
]

export const LOW_ROAD_SURVEY = { stations: LOW_ROAD_STATIONS, sectionLength: 10 }
