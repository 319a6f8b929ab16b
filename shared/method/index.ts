import { AIR } from './air'
import { BASES_SECTION, LEVELS_SECTION } from './answers'
import { DRY_SIDE } from './dry-side'
import { EDGE_AND_WIND } from './edge-and-wind'
import { EVENT } from './event'
import type { MethodSection } from './formula'
import { LINE } from './line'
import { LOADED_SHAPE } from './loaded-shape'
import { MOVING_WATER } from './moving-water'
import { PUMPING } from './pumping'
import { STABILITY } from './stability'
import { STILL_WATER } from './still-water'
import { UPLIFT } from './uplift'
import { WATER } from './water'

/** The whole method, in the order in which a section is worked out. */
export const METHOD_SECTIONS: readonly MethodSection[] = [
  STILL_WATER,
  MOVING_WATER,
  UPLIFT,
  STABILITY,
  LOADED_SHAPE,
  LEVELS_SECTION,
  BASES_SECTION,
  AIR,
  EDGE_AND_WIND,
  LINE,
  DRY_SIDE,
  PUMPING,
  EVENT,
  WATER,
]
