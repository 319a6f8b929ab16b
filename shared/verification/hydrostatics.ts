import { stillWaterThrust } from '../calc/hydrostatics/still-water-thrust'
import { tubeOverhang } from '../calc/hydrostatics/tube-overhang'
import { figure, type CheckRow } from './check-row'

/** Unit weight of all cases of this table [kN/m³]. */
const GAMMA = 9.81

/** Thrust on a vertical panel between two depths, as the difference of two stills [kN per metre]. */
function panel(top: number, bottom: number): { force: number; depth: number } {
  const whole = stillWaterThrust(bottom, GAMMA)
  const above = stillWaterThrust(top, GAMMA)
  const force = whole.force - above.force
  const moment = whole.moment - (above.moment + above.force * (bottom - top))
  return { force, depth: bottom - moment / force }
}

/** Quarter of a circle, from the overhang of a tube under water to its axis. */
function quarter(radius: number): number {
  return tubeOverhang(2 * radius, 0, radius).area
}

const BANSAL = 'Bansal, A Textbook of Fluid Mechanics, ch. 3'

/** Vertical force under the quarter cylinder of Cengel & Cimbala [kN/m]. */
const gateLift = (): number => GAMMA * (0.8 * 4.2 + quarter(0.8))

function circleRow(depth: number, force: string, lift: string): CheckRow {
  return {
    id: `circle-${depth}`,
    topic: 'hydrostatics',
    title: `Circle R 0.5 m on the ground, water on one side to ${depth} m`,
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('thrust', force, 'kN/m', () => stillWaterThrust(depth, GAMMA).force),
      figure('lift', lift, 'kN/m', () => GAMMA * tubeOverhang(1, 0, depth).area),
    ],
  }
}

export const HYDROSTATICS_ROWS: readonly CheckRow[] = [
  {
    id: 'rectangle-2x3',
    topic: 'hydrostatics',
    title: 'Vertical rectangle 2 m wide, 3 m high, top 2 m deep',
    source: `${BANSAL}; worked-example archive FOSSEE, book 2132, Ex 3.16`,
    tag: 'published',
    figures: [
      figure('force', '206.01', 'kN', () => 2 * panel(2, 5).force),
      figure('centre of pressure', '3.7143', 'm deep', () => panel(2, 5).depth),
    ],
  },
  {
    id: 'square-4x4',
    topic: 'hydrostatics',
    title: 'Vertical square 4 × 4 m, centroid 8 m deep',
    source: `${BANSAL}; worked-example archive FOSSEE, book 2132, Ex 3.17`,
    tag: 'published',
    figures: [
      figure('force', '1255.68', 'kN', () => 4 * panel(6, 10).force),
      figure('centre of pressure', '8.1667', 'm deep', () => panel(6, 10).depth),
    ],
  },
  {
    id: 'quadrant-2',
    topic: 'hydrostatics',
    title: 'Quadrant r 2 m, top edge 1.5 m deep, per metre',
    source: BANSAL,
    tag: 'published',
    figures: [
      figure('horizontal', '49.050', 'kN', () => panel(1.5, 3.5).force),
      figure('centre of pressure', '2.6333', 'm deep', () => panel(1.5, 3.5).depth),
      figure('vertical', '60.249', 'kN', () => GAMMA * (2 * 1.5 + quarter(2))),
    ],
  },
  {
    id: 'quadrant-3',
    topic: 'hydrostatics',
    title: 'Quadrant r 3 m, 3 m long, top at the surface',
    source: BANSAL,
    tag: 'published',
    figures: [
      figure('horizontal', '132.44', 'kN', () => 3 * panel(0, 3).force),
      figure('vertical', '208.03', 'kN', () => 3 * GAMMA * quarter(3)),
    ],
  },
  {
    id: 'cylinder-gate',
    topic: 'hydrostatics',
    title: 'Cylinder gate R 0.8 m under 5 m of water, per metre',
    source: 'Cengel & Cimbala, Fluid Mechanics, Ex 3-9',
    tag: 'published',
    figures: [
      figure('horizontal', '36.10', 'kN', () => panel(4.2, 5).force),
      figure('vertical', '37.89', 'kN', gateLift),
      figure('resultant', '52.34', 'kN', () => Math.hypot(panel(4.2, 5).force, gateLift())),
      figure('angle', '46.39', '°', () => {
        return (Math.atan2(gateLift(), panel(4.2, 5).force) * 180) / Math.PI
      }),
    ],
  },
  {
    id: 'cylinder-on-ground',
    topic: 'hydrostatics',
    title: 'Cylinder d 3 m, 4 m long, 196.2 kN, on the ground, water on one side to its top',
    source: `${BANSAL}, Prob 3.31`,
    tag: 'published',
    figures: [
      figure('horizontal', '176.58', 'kN', () => 4 * stillWaterThrust(3, GAMMA).force),
      figure('upward', '138.69', 'kN', () => 4 * GAMMA * tubeOverhang(3, 0, 3).area),
      figure('floor reaction', '57.51', 'kN', () => 196.2 - 4 * GAMMA * tubeOverhang(3, 0, 3).area),
    ],
  },
  circleRow(0.8, '3.1392', '3.3039'),
  circleRow(1, '4.9050', '3.8524'),
  circleRow(0.5, '1.2263', '1.9262'),
]
