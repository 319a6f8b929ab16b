import { stillWaterThrust } from '../calc/hydrostatics/still-water-thrust'
import { debrisImpact } from '../calc/moving-water/debris-impact'
import { dragCoefficientOf, dynamicDepth } from '../calc/moving-water/current-thrust'
import { figure, type CheckRow } from './check-row'

/** Ratio of length to depth, and the printed coefficient up to it. */
const DRAG_ROWS = [
  [12, '1.25'],
  [20, '1.3'],
  [32, '1.4'],
  [40, '1.5'],
  [80, '1.75'],
  [120, '1.8'],
  [121, '2.0'],
] as const

export const MOVING_WATER_ROWS: readonly CheckRow[] = [
  {
    id: 'dynamic-depth-us',
    topic: 'movingWater',
    title: 'Dynamic depth at 10 ft/s, C_d 1.25 and 2.0, g 32.2 ft/s²',
    source: 'ASCE 7, 5.4.3',
    tag: 'published',
    figures: [
      figure('C_d 1.25', '1.941', 'ft', () => dynamicDepth(10, 1.25, 32.2)),
      figure('C_d 2.0', '3.106', 'ft', () => dynamicDepth(10, 2, 32.2)),
    ],
  },
  {
    id: 'dynamic-depth-si',
    topic: 'movingWater',
    title: 'Dynamic depth at 1.5 m/s, C_d 1.25 and 2.0',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('C_d 1.25', '0.1433', 'm', () => dynamicDepth(1.5, 1.25, 9.81)),
      figure('C_d 2.0', '0.2294', 'm', () => dynamicDepth(1.5, 2, 9.81)),
    ],
  },
  {
    id: 'still-water-us',
    topic: 'movingWater',
    title: 'Still water 5 ft deep at 64 lb/ft³',
    source: 'ASCE 7-10, worked example 6.1',
    tag: 'published',
    figures: [
      figure('thrust', '800', 'lb/ft', () => stillWaterThrust(5, 64).force),
      figure('pressure at the foot', '320', 'psf', () => (2 * stillWaterThrust(5, 64).force) / 5),
    ],
  },
  {
    id: 'drag-coefficients',
    topic: 'movingWater',
    title: 'Drag coefficient by length over depth',
    source: 'FEMA P-259, Engineering Principles and Practices (from memory)',
    tag: 'memory',
    figures: DRAG_ROWS.map(([ratio, printed]) =>
      figure(ratio > 120 ? 'more' : `up to ${ratio}`, printed, '–', () => dragCoefficientOf(ratio)),
    ),
  },
  {
    id: 'log-impulse',
    topic: 'movingWater',
    title: 'Log of 1000 lb at 10 ft/s, stopped within a second, g 32.2 ft/s²',
    source: 'impulse and momentum, a published method (from memory)',
    tag: 'memory',
    figures: [
      figure('mean force', '311', 'lb', () => {
        return debrisImpact({ mass: 1000 / 32.2, speed: 10, stoppingTime: 1 }).mean
      }),
    ],
  },
]
