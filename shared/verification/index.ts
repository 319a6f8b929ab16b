import type { CheckRow, ReferenceRow } from './check-row'
import { GROUND_ROWS } from './ground'
import { HYDROSTATICS_ROWS } from './hydrostatics'
import { LOADED_TUBE_ROWS } from './loaded-tube'
import { MOVING_WATER_ROWS } from './moving-water'
import { PLANNING_REFERENCES } from './planning-references'
import { PUMP_ROWS } from './pumps'
import { ENGINEERING_REFERENCES } from './references'
import { STABILITY_ROWS } from './stability'
import { WATER_ROWS } from './water'

/** Every check value that the product computes; tests and the Method page read this one list. */
export const CHECK_ROWS: readonly CheckRow[] = [
  ...HYDROSTATICS_ROWS,
  ...STABILITY_ROWS,
  ...MOVING_WATER_ROWS,
  ...LOADED_TUBE_ROWS,
  ...GROUND_ROWS,
  ...WATER_ROWS,
  ...PUMP_ROWS,
]

/** Values that stand for reference only and are not counted. */
export const REFERENCE_ROWS: readonly ReferenceRow[] = [
  ...ENGINEERING_REFERENCES,
  ...PLANNING_REFERENCES,
]
