import type { SectionCase } from '../../schemas/section-case'
import { stillWaterThrust, type HorizontalLoad } from '../hydrostatics/still-water-thrust'
import { currentThrust } from '../moving-water/current-thrust'
import { debrisThrust } from '../moving-water/debris-thrust'
import { waveThrust } from '../moving-water/wave-thrust'

/** Everything that pushes the barrier to the dry side, and the dry water that pushes back. */
export interface HorizontalLoads {
  readonly still: HorizontalLoad
  readonly current: HorizontalLoad
  readonly wave: HorizontalLoad
  readonly debris: HorizontalLoad
  /** Water on the dry side; positive, and subtracted from the total. */
  readonly dry: HorizontalLoad
  readonly total: HorizontalLoad
}

/**
 * Horizontal loads per metre run, with their moments about the ground.
 *
 * @param crest Loaded crest, up to which waves press [m]; the diameter where no shape stands.
 */
export function horizontalLoads(section: SectionCase, crest: number): HorizontalLoads {
  const { barrier, water, debris, gravity } = section
  const { depth } = water
  const unitWeight = water.density * gravity
  const still = stillWaterThrust(depth, unitWeight)
  const dry = stillWaterThrust(water.dryDepth, unitWeight)
  const current = currentThrust({
    speed: water.currentSpeed,
    dragCoefficient: water.dragCoefficient,
    depth,
    unitWeight,
    gravity,
  })
  const wave = waveThrust({
    height: water.waveHeight,
    period: water.wavePeriod ?? 1,
    depth,
    crest,
    unitWeight,
    gravity,
  })
  const driven = debrisThrust({
    force: debris.force,
    draught: debris.draught,
    sectionLength: barrier.sectionLength,
    depth,
  })
  const total = {
    force: still.force + current.force + wave.force + driven.force - dry.force,
    moment: still.moment + current.moment + wave.moment + driven.moment - dry.moment,
  }
  return { still, current, wave, debris: driven, dry, total }
}
