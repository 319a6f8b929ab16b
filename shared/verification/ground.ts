import { gapFlow } from '../calc/ground/gap-flow'
import { groundSeepage } from '../calc/ground/ground-seepage'
import { criticalGradient } from '../calc/ground/piping-screen'
import { developingMean, developingMoment } from '../calc/uplift/developing-uplift'
import { upliftMoments, upliftShare } from '../calc/uplift/uplift-share'
import { figure, type CheckRow } from './check-row'

const DEEP = { model: 'deep', edgeFactor: 1, diffusivity: null, time: null } as const
const LINEAR = { ...DEEP, model: 'linear' } as const

/** q/(k h) by B/T_l. */
const seepageRatio = (ratio: number): number =>
  groundSeepage({ permeability: 1, head: 1, baseWidth: ratio, layerThickness: 1 })

const seepageCase = (): number =>
  groundSeepage({ permeability: 1e-4, head: 1, baseWidth: 4, layerThickness: 4 })

const SEEPAGE = [
  [0.25, '0.96045'],
  [0.5, '0.74280'],
  [1, '0.53318'],
  [2, '0.34695'],
  [4, '0.20481'],
  [10, '0.09189'],
] as const

const DEVELOPING = [
  [0.01, '0.112838', '0.911377'],
  [0.05, '0.252044', '0.802691'],
  [0.1, '0.348941', '0.736016'],
  [0.5, '0.497085', '0.667644'],
] as const

const GAPS = [
  [0.5, '28.16'],
  [1, '225.3'],
  [2, '1802'],
] as const

/** Flow under a gap in millimetres at a gradient of 0.1 and 10 °C, per hour and metre [l]. */
function gapPerHour(millimetres: number): number {
  const gap = { head: 0.1, path: 1, viscosity: 1.3063e-6, gravity: 9.81 }
  return gapFlow({ ...gap, width: millimetres / 1000 }).laminar * 3600 * 1000
}

export const GROUND_ROWS: readonly CheckRow[] = [
  {
    id: 'seepage-exact',
    topic: 'ground',
    title: 'Seepage under a flat base, q/(k h) by B/T',
    source: 'conformal map, 40 digits; Harr, Groundwater and Seepage (from memory)',
    tag: 'derived',
    figures: SEEPAGE.map(([ratio, printed]) =>
      figure(`B/T ${ratio}`, printed, '–', () => seepageRatio(ratio)),
    ),
  },
  {
    id: 'seepage-asymptote',
    topic: 'ground',
    title: 'Seepage under a very wide base: k h/q less B/T, from q/(k h) → 1/(B/T + 0.88254)',
    source: 'conformal map: 4 ln 2/π',
    tag: 'derived',
    figures: [figure('B/T 40', '0.88254', '–', () => 1 / seepageRatio(40) - 40)],
  },
  {
    id: 'seepage-case',
    topic: 'ground',
    title: 'k 1e-4 m/s, h 1 m, B 4 m, T 4 m',
    source: 'conformal map',
    tag: 'derived',
    figures: [
      figure('q', '5.3318', '10⁻⁵ m²/s', () => 1e5 * seepageCase()),
      figure('per metre and hour', '191.94', 'l', () => 3600 * 1000 * seepageCase()),
    ],
  },
  {
    id: 'deep-base',
    topic: 'ground',
    title: 'Head under the base at quarter points, deep uniform sand, and its centroid',
    source: 'conformal map; Harr, Groundwater and Seepage (from memory)',
    tag: 'derived',
    figures: [
      figure('at 1/4', '0.6667', '–', () => upliftShare(DEEP, 1, 0.25)),
      figure('at 1/2', '0.5', '–', () => upliftShare(DEEP, 1, 0.5)),
      figure('at 3/4', '0.3333', '–', () => upliftShare(DEEP, 1, 0.75)),
      figure('centroid from the wet edge', '0.375', 'B', () => {
        const { mean, moment } = upliftMoments(DEEP, 1)
        return 1 - moment / mean
      }),
    ],
  },
  {
    id: 'creep-line',
    topic: 'ground',
    title: 'Head under the base at quarter points, line of creep, and its centroid',
    source: 'EM 1110-2-2100 (from memory)',
    tag: 'memory',
    figures: [
      figure('at 1/4', '0.75', '–', () => upliftShare(LINEAR, 1, 0.25)),
      figure('at 1/2', '0.5', '–', () => upliftShare(LINEAR, 1, 0.5)),
      figure('at 3/4', '0.25', '–', () => upliftShare(LINEAR, 1, 0.75)),
      figure('centroid from the wet edge', '0.3333', 'B', () => {
        const { mean, moment } = upliftMoments(LINEAR, 1)
        return 1 - moment / mean
      }),
    ],
  },
  {
    id: 'developing-uplift',
    topic: 'ground',
    title: 'Developing uplift, U/(u₀B) and arm/B by c t/B²',
    source: 'sine series against image series',
    tag: 'derived',
    figures: [
      ...DEVELOPING.flatMap(([tau, ratio, arm]) => [
        figure(`U at ${tau}`, ratio, '–', () => developingMean(tau)),
        figure(`arm at ${tau}`, arm, 'B', () => developingMoment(tau) / developingMean(tau)),
      ]),
      figure('U at the end', '0.5', '–', () => developingMean(100)),
      figure('c 1e-5 m²/s, B 2.3 m, 24 h', '0.41915', '–', () =>
        developingMean((1e-5 * 86_400) / 2.3 ** 2),
      ),
    ],
  },
  {
    id: 'critical-gradient',
    topic: 'ground',
    title: 'Critical gradient, G_s 2.5 and n 0.35',
    source: 'worked example in an irrigation textbook; the void ratio is n/(1 − n)',
    tag: 'published',
    figures: [figure('i', '0.975', '–', () => criticalGradient(2.5, 0.35 / 0.65))],
  },
  {
    id: 'critical-gradient-sand',
    topic: 'ground',
    title: 'Critical gradient, G_s 2.65 and e 0.65',
    source: 'closed form',
    tag: 'derived',
    figures: [figure('i', '1.000', '–', () => criticalGradient(2.65, 0.65))],
  },
  {
    id: 'gap-flow',
    topic: 'ground',
    title: 'Flow under a gap at a gradient of 0.1, 10 °C, per metre and hour',
    source: 'laminar flow between plates',
    tag: 'derived',
    figures: GAPS.map(([width, printed]) =>
      figure(`${width} mm`, printed, 'l', () => gapPerHour(width)),
    ),
  },
]
