import { sectionState } from '../checks/section-state'
import type { SectionCase } from '../schemas/section-case'
import type { SectionResult } from '../schemas/section-result'
import type { UnitSystem } from '../units'
import { openBook } from './book'
import type { Derivation } from './line'
import { firstNames, type LineContext } from './lines/context'
import { writeGeometry } from './lines/geometry'
import { writeGlobalStability } from './lines/global-stability'
import { writeGround } from './lines/ground'
import { writeLevel, type LeaveTerms } from './lines/level'
import { writeLimits } from './lines/limits'
import { writePartialStability } from './lines/partial-stability'
import { writeShape } from './lines/shape'
import { writeSkirtPull } from './lines/skirt-pull'
import { writeThrust } from './lines/thrust'
import { writeUplift } from './lines/uplift'
import { writeWeight } from './lines/weight'

/** What a derivation takes beside case and result. */
export interface DerivationOptions {
  readonly system?: UnitSystem
  /** Ground level at the weld line [m]; null: depths only. */
  readonly groundLevel?: number | null
  readonly leave?: LeaveTerms
  /** Share of friction resistance and skirt grip that bends leave, 0 to 1; 1 away from bends. */
  readonly gripShare?: number
}

const NO_RISE: LeaveTerms = { rateOfRise: null, timeToClear: 0 }

/**
 * Every figure of a section's check as an ordered list of lines. The figures are those of the
 * engine; nothing is computed here a second time. `verifyDerivation` does that.
 *
 * @param result The result of `checkSection` for this very case.
 * @remarks Expects a case inside `SECTION_RANGES`.
 */
export function deriveSection(
  section: SectionCase,
  result: SectionResult,
  options: DerivationOptions = {},
): Derivation {
  const { system = 'metric', groundLevel = null, leave = NO_RISE, gripShare = 1 } = options
  const state = sectionState(section)
  const book = openBook(section, system, gripShare)
  const context: LineContext = {
    book,
    section,
    state,
    result,
    gripShare,
    names: firstNames(),
  }
  writeGeometry(context, { groundLevel })
  // Waves reach up to the loaded crest, so that the shape comes before them.
  const hasWaves = result.thrust.wave > 0
  if (hasWaves) writeShape(context)
  writeThrust(context)
  writeWeight(context)
  writeUplift(context)
  if (state.basis.format === 'partial') writePartialStability(context)
  else writeGlobalStability(context)
  if (!hasWaves) writeShape(context)
  writeSkirtPull(context)
  writeLimits(context)
  writeGround(context)
  writeLevel(context, leave, groundLevel)
  return book.finish()
}
