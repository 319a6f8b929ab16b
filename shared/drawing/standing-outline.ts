import { loadedOutline, type LoadedOutline } from '../calc/loaded-shape/loaded-outline'
import { loadedShape, type StandingShape } from '../calc/loaded-shape/loaded-shape'
import { sectionGeometry } from '../calc/section/section-geometry'
import type { SectionCase } from '../schemas/section-case'
import type { LastStanding } from './cross-section/section-input'

/** The last standing depth is found to this width, in diameters: below a pixel. */
const PRECISION = 1e-5

/** Shallower water [m] bends nothing that could be seen, and its curves would be lost in rounding. */
const SHALLOWEST = 1e-6

function shapeAt(section: SectionCase, depth: number): StandingShape | null {
  const geometry = sectionGeometry({ ...section, water: { ...section.water, depth } })
  const { diameter, airPressure, skirtLength } = section.barrier
  const shape = loadedShape({
    diameter,
    airPressure,
    wettedSkirt: skirtLength === 0 ? 0 : geometry.wettedSkirt,
    depth,
    unitWeight: geometry.unitWeight,
  })
  return shape.solved ? shape : null
}

function outlineOf(section: SectionCase, shape: StandingShape, depth: number): LoadedOutline {
  const { water, barrier, gravity } = section
  return loadedOutline({
    shape,
    airPressure: barrier.airPressure,
    depth,
    unitWeight: water.density * gravity,
  })
}

/** Outline of the tube at the depth of the case; null where it does not stand. */
export function standingOutline(section: SectionCase): LoadedOutline | null {
  const { depth: water } = section.water
  const depth = water < SHALLOWEST && section.barrier.skirtLength > 0 ? 0 : water
  const shape = shapeAt(section, depth)
  return shape && outlineOf(section, shape, depth)
}

/**
 * The last shape that stands as the water rises from the ground. It does not depend on the depth of
 * the case: keep it while only the water moves. Null without a skirt: then nothing stands.
 */
export function lastStanding(section: SectionCase): LastStanding | null {
  const { diameter, skirtLength } = section.barrier
  if (skirtLength === 0) return null
  let standing = 0
  let fallen = diameter
  while (fallen - standing > PRECISION * diameter) {
    const depth = (standing + fallen) / 2
    if (shapeAt(section, depth)) standing = depth
    else fallen = depth
  }
  const shape = standing > 0 ? shapeAt(section, standing) : null
  if (!shape) return null
  return {
    outline: outlineOf(section, shape, standing),
    depth: standing,
    crest: shape.crest,
  }
}
