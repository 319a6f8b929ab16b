import type { FieldId } from '@/quick-check/fields'
import type { PartId } from './part'

/** Inputs that stand in a part and nowhere else: where one is wrong, its part is open. */
export const PART_FIELDS: Readonly<Record<PartId, readonly FieldId[]>> = {
  waves: ['windSpeed', 'fetch', 'fetchDepth'],
  current: [],
  debris: ['debrisMass', 'debrisSpeed', 'debrisStop'],
  air: [
    'linkedSections',
    'dropFrom',
    'dropTo',
    'dropTime',
    'nightTime',
    'compressorFlow',
    'startPressure',
    'stopPressure',
  ],
  dry: [],
  edge: ['edgeCurrent', 'ballastDensity'],
  bends: ['turn'],
}
