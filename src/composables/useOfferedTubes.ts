import { computed } from 'vue'
import { BARRIERS } from '@shared/catalogue/barriers'
import type { ScenarioBarrier } from '@shared/schemas/scenario'
import { barrierOf } from '@/scenario/new-content'
import type { TubeBook } from '@/scenario/tube-book'

/** Tubes of the catalogue as a scenario keeps them. */
export function useOfferedTubes(tubes: () => TubeBook) {
  return computed<readonly ScenarioBarrier[]>(() =>
    BARRIERS.map((tube) => barrierOf(tube, tubes())),
  )
}
