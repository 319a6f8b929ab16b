import { BARRIERS } from '../../shared/catalogue/barriers'
import type { ScenarioBarrier } from '../../shared/schemas/scenario'

/** The example tubes as a scenario keeps them, smallest first. */
export const TUBES: readonly ScenarioBarrier[] = BARRIERS.map(
  ({ id, isExample: _, ...barrier }) => ({
    ...barrier,
    name: id,
    catalogueId: id,
    catalogueRevision: 1,
  }),
)
