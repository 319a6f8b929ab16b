import { GREATEST_DEPTH } from '@shared/drawing/cross-section/section-frame'
import type { DemoSetting, DemoValue } from '@shared/demonstrator/setting'
import type { QuantityKind } from '@shared/units'

/** One figure that can be changed while a scene is on. */
export interface LiveControl {
  readonly value: Exclude<DemoValue, 'edgeFactor' | 'filledAt' | 'clearingTime'>
  readonly kind: QuantityKind
  readonly min: number
  readonly step: number
  readonly max: (setting: DemoSetting) => number
}

/** A skirt may be tried half as long again as the tube's own. */
const LONGER = 1.5

/** Figures of the drawer, in the order in which they act; SI units. */
export const LIVE_CONTROLS: readonly LiveControl[] = [
  {
    ...{ value: 'depth', kind: 'length', min: 0, step: 0.005 },
    max: ({ tube }) => GREATEST_DEPTH * tube.diameter,
  },
  {
    ...{ value: 'dryDepth', kind: 'length', min: 0, step: 0.005 },
    max: ({ values }) => values.depth,
  },
  {
    ...{ value: 'skirtLength', kind: 'length', min: 0, step: 0.05 },
    max: ({ tube }) => LONGER * tube.skirtLength,
  },
  { value: 'airPressure', kind: 'pressure', min: 1000, step: 500, max: () => 25_000 },
  { value: 'temperature', kind: 'temperature', min: -15, step: 1, max: () => 40 },
  { value: 'gust', kind: 'speed', min: 0, step: 0.5, max: () => 30 },
  { value: 'crease', kind: 'smallLength', min: 0, step: 0.0005, max: () => 0.005 },
  { value: 'rateOfRise', kind: 'rate', min: 0, step: 0.05 / 3600, max: () => 1 / 3600 },
]
