import { debrisImpact } from '../calc/moving-water/debris-impact'
import { debrisThrust } from '../calc/moving-water/debris-thrust'
import { currentThrust, dragCoefficientOf, dynamicDepth } from '../calc/moving-water/current-thrust'
import { overflow, overtopping } from '../calc/moving-water/overtopping'
import { waveGrowth } from '../calc/moving-water/wave-growth'
import { waveNumber } from '../calc/moving-water/wave-number'
import { waveThrust } from '../calc/moving-water/wave-thrust'
import { stillWaterThrust } from '../calc/hydrostatics/still-water-thrust'
import { worked, type Formula, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { h, rho, g, V, Cd, Hs, T } = SYMBOLS
const tex = String.raw

const CURRENT: readonly Formula[] = [
  {
    id: 'current',
    title: 'Current against the line',
    tex: [
      tex`d_h = C_d \frac{V^2}{2g}`,
      tex`F_c = \rho g\, d_h\, h \qquad \text{at}\quad \frac{h}{2}`,
    ],
    symbols: [symbol('d_h', 'Depth of water that stands for the current', 'm'), Cd, V, g, rho, h],
    assumptions: [
      'The speed is the one normal to the line. A current along the line gives no thrust, but lifts the wet edge of the skirt.',
      'A line is long: the program takes 2.0 unless another coefficient is entered.',
    ],
    source: 'ASCE 7, 5.4.3; FEMA P-259 for the uniform pressure',
    tag: 'published',
    worked: worked(
      {
        V: ['V', 1.5, 'm/s'],
        Cd: ['C_d', 2, '–'],
        h: ['h', 0.55, 'm'],
        g: ['g', 9.81, 'm/s²'],
      },
      (x) => {
        const current = { speed: x.V, dragCoefficient: x.Cd, depth: x.h, gravity: x.g }
        return [
          ['d_h', dynamicDepth(x.V, x.Cd, x.g), 'm'],
          ['F_c', currentThrust({ ...current, unitWeight: 1000 * x.g }).force, 'N/m'],
        ]
      },
    ),
  },
  {
    id: 'drag',
    title: 'Drag coefficient by length over depth',
    tex: [
      tex`C_d = 1.25,\ 1.3,\ 1.4,\ 1.5,\ 1.75,\ 1.8 \quad\text{up to}\quad \frac{\text{length}}{h} = 12,\ 20,\ 32,\ 40,\ 80,\ 120`,
      tex`C_d = 2.0 \quad\text{above}`,
    ],
    symbols: [Cd, h],
    assumptions: ['A table of steps; nothing is interpolated.'],
    source: 'FEMA P-259, Engineering Principles and Practices (from memory)',
    tag: 'memory',
    worked: worked({ length: [tex`\text{length}`, 20, 'm'], h: ['h', 0.55, 'm'] }, (x) => [
      ['C_d', dragCoefficientOf(x.length / x.h), '–'],
    ]),
  },
]

const WAVES: readonly Formula[] = [
  {
    id: 'wave-number',
    title: 'Wave number',
    tex: [tex`\left(\frac{2\pi}{T}\right)^2 = g\,k\,\tanh kh`],
    symbols: [symbol('k', 'Wave number', 'rad/m'), T, g, h],
    assumptions: ['Linear waves; solved by Newton to the last digit.'],
    source: 'linear wave theory',
    tag: 'derived',
    worked: worked({ T: ['T', 2, 's'], h: ['h', 0.55, 'm'], g: ['g', 9.81, 'm/s²'] }, (x) => [
      ['k', waveNumber(x.T, x.h, x.g), 'rad/m'],
    ]),
  },
  {
    id: 'goda',
    title: 'Waves against the barrier',
    tex: [
      tex`H = \min(1.8\,H_s,\; 0.78\,h), \qquad \eta^* = 1.5\,H, \qquad h_c^* = \max(0, \min(\eta^*, z_c - h))`,
      tex`\alpha_1 = 0.6 + \tfrac{1}{2}\left(\frac{2kh}{\sinh 2kh}\right)^{2}, \qquad p_1 = \alpha_1\rho g H, \qquad p_3 = \frac{p_1}{\cosh kh}, \qquad p_4 = p_1\left(1 - \frac{h_c^*}{\eta^*}\right)`,
      tex`F_w = \tfrac{1}{2}(p_1 + p_3)\,h + \tfrac{1}{2}(p_1 + p_4)\,h_c^*`,
      tex`M_w = \tfrac{1}{6}(2p_1 + p_3)\,h^2 + \tfrac{1}{2}(p_1 + p_4)\,h\,h_c^* + \tfrac{1}{6}(p_1 + 2p_4)\,h_c^{*2}`,
    ],
    symbols: [
      symbol('H', 'Wave height that the pressures come from', 'm'),
      symbol('z_c', 'Loaded crest above the ground; the diameter where no shape stands', 'm'),
      symbol('F_w,\\ M_w', 'Thrust over still water, and its moment about the ground', 'N/m, N'),
      Hs,
      T,
      h,
    ],
    assumptions: [
      'Vertical wall, level bed, no berm, waves square to the line. The period is used as it is.',
      'Added to still water. Impulsive breaking, H_s above 0.35 h, is not covered; the Quick check says so.',
    ],
    source:
      'Goda, Random Seas and Design of Maritime Structures, 2000, as re-implemented in public; EM 1110-2-1100, VI-5 (from memory)',
    tag: 'memory',
    worked: worked(
      {
        Hs: ['H_s', 0.1, 'm'],
        T: ['T', 2, 's'],
        h: ['h', 0.55, 'm'],
        crest: ['z_c', 0.691, 'm'],
      },
      (x) => {
        const waves = waveThrust({
          height: x.Hs,
          period: x.T,
          depth: x.h,
          crest: x.crest,
          unitWeight: 9810,
          gravity: 9.81,
        })
        return [
          ['H', waves.designHeight, 'm'],
          ['F_w', waves.force, 'N/m'],
          [tex`F_w / F_h`, waves.force / stillWaterThrust(x.h, 9810).force, '–'],
        ]
      },
    ),
  },
  {
    id: 'wave-growth',
    title: 'Waves raised by wind',
    tex: [
      tex`U_A = 0.71\,U^{1.23}`,
      tex`\frac{gH_s}{U_A^2} = 0.283\,\tanh a\;\tanh\!\left[\frac{0.00565\,(gF/U_A^2)^{1/2}}{\tanh a}\right], \qquad a = 0.530\left(\frac{gd}{U_A^2}\right)^{3/4}`,
      tex`\frac{gT_s}{U_A} = 7.54\,\tanh b\;\tanh\!\left[\frac{0.0379\,(gF/U_A^2)^{1/3}}{\tanh b}\right], \qquad b = 0.833\left(\frac{gd}{U_A^2}\right)^{3/8}`,
    ],
    symbols: [
      symbol('U', 'Wind speed 10 m above the water', 'm/s', '1 to 60 m/s'),
      symbol('F', 'Fetch: open water upwind', 'm', '1 to 100 000 m'),
      symbol('d', 'Mean depth over the fetch', 'm', '0.05 to 100 m'),
      symbol('H_s,\\ T_s', 'Significant height and period', 'm, s'),
    ],
    assumptions: ['Shallow water, steady wind. Methods differ by ±25 %.'],
    source: 'Shore Protection Manual 1984, ch. 3 (from memory)',
    tag: 'memory',
    worked: worked({ U: ['U', 20, 'm/s'], F: ['F', 1000, 'm'], d: ['d', 1.5, 'm'] }, (x) => {
      const fetch = { windSpeed: x.U, fetch: x.F, depth: x.d, gravity: 9.81 }
      const { adjustedWind, height, period } = waveGrowth(fetch)
      return [
        ['U_A', adjustedWind, 'm/s'],
        ['H_s', height, 'm'],
        ['T_s', period, 's'],
      ]
    }),
  },
]

const OVER: readonly Formula[] = [
  {
    id: 'overtopping',
    title: 'Waves over the crest',
    tex: [tex`q = 0.047\,\sqrt{gH^3}\;\exp\!\left[-\left(2.35\,\frac{R_c}{H}\right)^{1.3}\right]`],
    symbols: [
      symbol('q', 'Mean discharge per metre run', 'm²/s'),
      symbol('H', 'Significant wave height at the barrier', 'm'),
      symbol('R_c', 'Loaded crest above still water', 'm'),
    ],
    assumptions: [
      'Vertical wall. Fitted for R_c/H from 0.1 to 3.5; outside it is an extrapolation.',
      'For design with a margin 0.054 and 2.12 take the place of 0.047 and 2.35.',
    ],
    source: 'EurOtop 2018, eq. 7.1 (from memory)',
    tag: 'memory',
    worked: worked({ H: ['H', 0.1, 'm'], R: ['R_c', 0.1, 'm'] }, (x) => {
      const waves = { height: x.H, crestFreeboard: x.R, gravity: 9.81 }
      return [
        ['q', overtopping(waves), 'm²/s'],
        [tex`q_\mathrm{design}`, overtopping(waves, 'design'), 'm²/s'],
      ]
    }),
  },
  {
    id: 'overflow',
    title: 'Water over the crest',
    tex: [tex`q = C\left(\tfrac{2}{3}\right)^{1.5}\sqrt{g}\;H^{1.5}, \qquad C = 1`],
    symbols: [
      symbol('q', 'Discharge per metre run', 'm²/s'),
      symbol('H', 'Still water above the crest', 'm'),
    ],
    assumptions: ['An ideal broad crest.'],
    source: 'critical depth, closed form',
    tag: 'derived',
    worked: worked({ H: ['H', 0.1, 'm'], g: ['g', 9.81, 'm/s²'] }, (x) => [
      ['q', overflow(x.H, x.g), 'm²/s'],
    ]),
  },
  {
    id: 'debris',
    title: 'Floating debris',
    tex: [
      tex`F_d = \begin{cases} P / \ell & h \ge t \\ 0 & \text{below} \end{cases} \qquad \text{at}\quad h`,
    ],
    symbols: [
      symbol('P', 'Force on one section', 'N', '0 N or more'),
      symbol(tex`\ell`, 'Length of one section', 'm', '1 to 100 m'),
      symbol('t', 'Draught: depth from which it reaches the barrier', 'm', '0 m or more'),
    ],
    assumptions: ['Spread over one section. The force is entered, or found by impulse as below.'],
    source: 'common practice, no source',
    tag: 'practice',
    worked: worked(
      {
        P: ['P', 2000, 'N'],
        l: [tex`\ell`, 10, 'm'],
        t: ['t', 0.25, 'm'],
        h: ['h', 0.55, 'm'],
      },
      (x) => {
        const debris = { force: x.P, draught: x.t, sectionLength: x.l, depth: x.h }
        return [['F_d', debrisThrust(debris).force, 'N/m']]
      },
    ),
  },
  {
    id: 'debris-impact',
    title: 'Debris that is brought to a stand',
    tex: [tex`F_\text{mean} = \frac{m v}{t}, \qquad F_\text{peak} = \frac{\pi\,m v}{2\,t}`],
    symbols: [
      symbol('m', 'Mass', 'kg', '1 to 1000000 kg'),
      symbol('v', 'Speed towards the barrier', 'm/s', '0.01 to 10 m/s'),
      symbol('t', 'Time from the first touch to standing still', 's', '0.01 to 10 s'),
    ],
    assumptions: [
      'Impulse and momentum; the peak is that of a half sine. Published methods differ 75-fold, mostly in the stopping time: name yours.',
    ],
    source: 'Newton’s second law; half sine as in ASCE 7, commentary to chapter 5 (from memory)',
    tag: 'memory',
    worked: worked({ m: ['m', 450, 'kg'], v: ['v', 1.5, 'm/s'], t: ['t', 0.5, 's'] }, (x) => {
      const impact = debrisImpact({ mass: x.m, speed: x.v, stoppingTime: x.t })
      return [
        [tex`F_\text{mean}`, impact.mean, 'N'],
        [tex`F_\text{peak}`, impact.peak, 'N'],
      ]
    }),
  },
]

/** Moving water and what floats in it. */
export const MOVING_WATER: MethodSection = {
  id: 'moving-water',
  title: 'Moving water, and what floats in it',
  intro: ['Current, waves and debris are added to still water.'],
  formulas: [...CURRENT, ...WAVES, ...OVER],
}
