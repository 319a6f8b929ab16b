import { caseAt } from '@shared/checks/place-case'
import type { ScenarioContent } from '@shared/schemas/scenario'
import type { CheckedCase } from '@/quick-check/checked-case'
import type { PlaceOnLine } from './place-on-line'

/** Water deeper than this many diameters is not computed; the same bound as of a typed depth. */
export const DEEPEST = 1.5

/** What keeps a place from being checked; null where nothing does. */
export function gapAt({ run, assumption }: PlaceOnLine): 'no-size' | 'no-ground' | null {
  if (!run) return 'no-size'
  return assumption ? null : 'no-ground'
}

/** What a scenario asks at a place; null where nothing is laid or assumed. */
export function checkedPlace(content: ScenarioContent, place: PlaceOnLine): CheckedCase | null {
  const { run, assumption, groundLevel } = place
  if (!run || !assumption) return null
  const section = caseAt(content, place, run, assumption)
  const { depth } = section.water
  const most = DEEPEST * run.barrier.diameter
  return {
    section: depth > most ? { ...section, water: { ...section.water, depth: most } } : section,
    water: { depth, level: content.waterLevel, ground: groundLevel },
    depthNow: content.levelNow === null ? null : content.levelNow - groundLevel,
    rateOfRise: content.rateOfRise,
    timeToClear: content.timeToClear,
    statedHeight: run.barrier.statedHeight,
    uncertainty: 0,
    bends: place.bends,
  }
}
