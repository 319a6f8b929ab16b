import { upliftAtTime } from '../calc/uplift/changing-level'
import { developingMean, developingMoment, developingShare } from '../calc/uplift/developing-uplift'
import { upliftForce } from '../calc/uplift/uplift-force'
import { upliftMoments, upliftShare } from '../calc/uplift/uplift-share'
import { worked, type Formula, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { rho, g, eta, hd, B, U } = SYMBOLS
const tex = String.raw

const DEEP = { model: 'deep', edgeFactor: 1, diffusivity: null, time: null } as const
const LINEAR = { ...DEEP, model: 'linear' } as const

const r = symbol('r', 'Mean share of the excess at the edge', '–')
const m = symbol('m', 'First moment of that share about the dry toe, over B²', '–')

const STEADY: readonly Formula[] = [
  {
    id: 'uplift',
    title: 'Uplift and its moment',
    tex: [
      tex`e = \eta\,h_e - h_d`,
      tex`U = \rho g B\,(h_d + e\,r), \qquad M_U = \rho g B^2 \left(\tfrac{1}{2}h_d + e\,m\right)`,
    ],
    symbols: [
      U,
      symbol('M_U', 'Moment of the uplift about the dry toe', 'N'),
      symbol('h_e', 'Depth at the wet edge of the skirt', 'm'),
      hd,
      eta,
      B,
      r,
      m,
      rho,
      g,
    ],
    assumptions: [
      'From η ρ g h_e at the wet edge to ρ g h_d at the dry toe. Sealed: U = 0.',
      'η is one control: 0 sealed, 1 open. No published value exists for such skirts. Weighed 0.5 and sealed 0 are judgement, unverified, and editable.',
      'The adverse limit: under an open edge over a sealed seat nothing holds.',
    ],
    source: 'closed form',
    tag: 'derived',
    worked: worked(
      {
        h: ['h_e', 0.55, 'm'],
        eta: [tex`\eta`, 1, '–'],
        hd: ['h_d', 0, 'm'],
        B: ['B', 2.32, 'm'],
      },
      (x) => {
        const uplift = { ...LINEAR, edgeFactor: x.eta }
        const input = { uplift, edgeDepth: x.h, dryDepth: x.hd, base: x.B, unitWeight: 9810 }
        const { force, moment } = upliftForce(input)
        return [
          ['U', force, 'N/m'],
          ['M_U', moment, 'N'],
        ]
      },
    ),
  },
  {
    id: 'uplift-linear',
    title: 'Falls evenly: the default',
    tex: [
      tex`r = \tfrac{1}{2}, \qquad m = \tfrac{1}{3}, \qquad \text{share at } X:\; 1 - \frac{X}{B}`,
    ],
    symbols: [r, m, symbol('X', 'Distance from the wet edge', 'm'), B],
    assumptions: ['Steady flow along the line of creep.'],
    source: 'EM 1110-2-2100 (from memory)',
    tag: 'memory',
    worked: worked({ X: ['X', 0.58, 'm'], B: ['B', 2.32, 'm'] }, (x) => [
      ['r', upliftMoments(LINEAR, x.B).mean, '–'],
      ['m', upliftMoments(LINEAR, x.B).moment, '–'],
      [tex`\text{share}`, upliftShare(LINEAR, x.B, x.X), '–'],
    ]),
  },
  {
    id: 'uplift-deep',
    title: 'Deep uniform sand',
    tex: [
      tex`r = \tfrac{1}{2}, \qquad m = \tfrac{5}{16}, \qquad \text{share at } X:\; \frac{1}{\pi}\arccos\!\left(\frac{2X}{B} - 1\right)`,
    ],
    symbols: [r, m, symbol('X', 'Distance from the wet edge', 'm'), B],
    assumptions: ['Exact for an endless depth: the same force, another lever.'],
    source: 'Harr, Groundwater and Seepage (from memory); conformal map derived',
    tag: 'derived',
    worked: worked({ X: ['X', 0.58, 'm'], B: ['B', 2.32, 'm'] }, (x) => [
      ['r', upliftMoments(DEEP, x.B).mean, '–'],
      ['m', upliftMoments(DEEP, x.B).moment, '–'],
      [tex`\text{share}`, upliftShare(DEEP, x.B, x.X), '–'],
    ]),
  },
]

const GROWING: readonly Formula[] = [
  {
    id: 'uplift-developing',
    title: 'Grows with time',
    tex: [
      tex`\tau = \frac{c\,t}{B^2}, \qquad \lambda_n = n^2\pi^2`,
      tex`r = \tfrac{1}{2} - \sum_{n\,\mathrm{odd}} \frac{4}{\lambda_n}\,e^{-\lambda_n\tau}, \qquad m = \tfrac{1}{3} - \sum_{n} \frac{2}{\lambda_n}\,e^{-\lambda_n\tau}`,
      tex`\text{share at } X:\; 1 - \frac{X}{B} - \sum_{n} \frac{2}{n\pi}\sin\frac{n\pi X}{B}\,e^{-\lambda_n\tau}`,
      tex`\tau < 0.01:\quad r = 2\sqrt{\tau/\pi}, \quad m = 2\sqrt{\tau/\pi} - \tau, \quad \text{share } \operatorname{erfc}\frac{X}{2B\sqrt\tau}`,
    ],
    symbols: [
      symbol('c', 'Diffusivity of pressure under the skirt', 'm²/s', 'above 0 m²/s'),
      symbol('t', 'Time since the water came', 's', '0 s or more'),
      symbol(tex`\tau`, 'Time in units of B²/c', '–'),
      r,
      m,
      B,
    ],
    assumptions: [
      'One-dimensional diffusion: full pressure at the wet edge from t = 0 on, none at the dry toe.',
    ],
    source: 'sine series against image series; Carslaw & Jaeger for the series',
    tag: 'derived',
    worked: worked(
      {
        c: ['c', 1e-5, 'm²/s'],
        t: ['t', 86_400, 's'],
        B: ['B', 2.3, 'm'],
        X: ['X', 0.575, 'm'],
      },
      (x) => {
        const tau = (x.c * x.t) / x.B ** 2
        return [
          [tex`\tau`, tau, '–'],
          ['r', developingMean(tau), '–'],
          ['m', developingMoment(tau), '–'],
          [tex`\text{share}`, developingShare(tau, x.X / x.B), '–'],
        ]
      },
    ),
  },
  {
    id: 'uplift-changing',
    title: 'While the level changes',
    tex: [
      tex`\frac{U(t)}{\rho g B} = \eta\sum_{\text{jumps}} \Delta h\; r(t - t_i) + \eta\sum_{\text{pieces}} s_i\,[\,G(t - t_i) - G(t - t_{i+1})\,]`,
      tex`G(t) = \frac{t}{2} - \sum_{n\,\mathrm{odd}} \frac{4B^2}{n^4\pi^4 c}\left(1 - e^{-n^2\pi^2 ct/B^2}\right)`,
      tex`\text{in falling water, point by point:}\quad u(X,t) \le \rho g\,h(t)`,
    ],
    symbols: [
      symbol('s_i', 'Slope of a straight piece of the depth', 'm/s'),
      symbol(tex`\Delta h`, 'Jump of the depth', 'm'),
      symbol('u', 'Pressure under the skirt', 'Pa'),
      symbol('G', 'Mean response to a step, integrated over time', 's'),
      eta,
      B,
    ],
    assumptions: [
      'Depth linear between readings, dry before the first. Duhamel’s integral in closed form, for force, moment and every point.',
      'A limp skirt lifts and vents in falling water: the cap stands for it.',
    ],
    source: 'Duhamel’s integral, derived',
    tag: 'derived',
    worked: worked(
      {
        rise: [tex`t_\text{rise}`, 21_600, 's'],
        peak: [tex`h_\text{max}`, 0.55, 'm'],
        fall: [tex`t_\text{fall}`, 21_600, 's'],
        c: ['c', 1e-4, 'm²/s'],
        B: ['B', 2.32, 'm'],
        share: [tex`h(t)/h_\text{max}\ \text{when falling}`, 0.5, '–'],
      },
      (x) => {
        const flood = [
          { time: 0, depth: 0 },
          { time: x.rise, depth: x.peak },
          { time: x.rise + x.fall, depth: 0 },
        ]
        const base = { base: x.B, diffusivity: x.c, edgeFactor: 1 }
        const later = x.rise + (1 - x.share) * x.fall
        return [
          [tex`U\ \text{at the crest}`, 9810 * upliftAtTime(flood, base, x.rise).force, 'N/m'],
          [tex`U\ \text{in recession}`, 9810 * upliftAtTime(flood, base, later).force, 'N/m'],
        ]
      },
    ),
  },
]

/** Water under the skirt. */
export const UPLIFT: MethodSection = {
  id: 'uplift',
  title: 'Water under the skirt',
  intro: [
    'Uplift, friction and check basis decide the answer. The program shows what each would change beside the chosen one.',
  ],
  formulas: [...STEADY, ...GROWING],
}
