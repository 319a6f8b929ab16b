import { pondThroughTime } from '../calc/ponding/pond'
import { stageStorage } from '../calc/ponding/stage-storage'
import { frictionFactor } from '../calc/pumping/friction-factor'
import { hoseLoss } from '../calc/pumping/hose'
import { pumpDuty } from '../calc/pumping/pump-duty'
import { worked, type Formula, type Given, type MethodSection } from './formula'
import { POWER_FORMULAS } from './pump-power'
import { symbol, SYMBOLS } from './symbols'

const { g } = SYMBOLS
const tex = String.raw

const Q = symbol('Q', 'Flow', 'm³/s')
const H = symbol('H', 'Head', 'm')

const HOSE = {
  d: ['d', 0.1, 'm'],
  length: [tex`\ell`, 30, 'm'],
  roughness: [tex`\varepsilon`, 0.0001, 'm'],
  K: ['K', 2.5, '–'],
  nu: [tex`\nu`, 1.3063e-6, 'm²/s'],
} as const satisfies Record<string, Given>

const hoseOf = (x: Readonly<Record<keyof typeof HOSE, number>>) => ({
  hose: { diameter: x.d, length: x.length, roughness: x.roughness, minorLoss: x.K },
  viscosity: x.nu,
  gravity: 9.81,
})

const PONDING: Formula = {
  id: 'ponding',
  title: 'Water that stands on the dry side',
  tex: [
    tex`\frac{\mathrm{d}V}{\mathrm{d}t} = Q_\text{in}(t, z) - \sum Q_\text{pump}(z), \qquad V(z) = \int A(z)\,\mathrm{d}z`,
  ],
  symbols: [
    symbol('V', 'Stored volume', 'm³'),
    symbol('z', 'Level of the pond', 'm'),
    symbol('A', 'Area at a level, linear between the levels of the table', 'm²'),
    symbol(
      tex`Q_\text{in},\ Q_\text{pump}`,
      'All that comes in, and what each pump delivers',
      'm³/s',
    ),
  ],
  assumptions: [
    'Fourth-order steps on stored, come-in and pumped volume together, so that the balance closes to rounding. A start, a stop or a failure of a pump ends the step at its own moment.',
    'An empty pond gives no more than what runs into it. The area stays constant above the last level of the table.',
  ],
  source: 'balance of water',
  tag: 'derived',
  worked: worked(
    {
      A: ['A', 2000, 'm²'],
      in: [tex`Q_\text{in}`, 0.02, 'm³/s'],
      pump: [tex`Q_\text{pump}`, 0.03, 'm³/s'],
      start: [tex`z_\text{start}`, 0.1, 'm'],
      stop: [tex`z_\text{stop}`, 0.05, 'm'],
      hours: ['t', 6, 'h'],
    },
    (x) => {
      const history = pondThroughTime({
        storage: stageStorage([{ level: 0, area: x.A }]),
        inflowAt: () => [x.in],
        pumps: [{ name: 'pump', startLevel: x.start, stopLevel: x.stop, flowAt: () => x.pump }],
        initialLevel: 0,
        duration: x.hours * 3600,
        step: 300,
      })
      const balance = history.inflowVolume - history.pumpedVolume - history.stored
      return [
        [tex`z_\text{max}`, history.highest.level, 'm'],
        [tex`V_\text{in}`, history.inflowVolume, 'm³'],
        [tex`V_\text{pumped}`, history.pumpedVolume, 'm³'],
        [tex`\text{balance}`, balance, 'm³'],
      ]
    },
  ),
}

const DUTY: readonly Formula[] = [
  {
    id: 'friction-factor',
    title: 'Friction factor of a hose',
    tex: [
      tex`Re < 2000:\quad f = \frac{64}{Re}`,
      tex`\text{above:}\quad \frac{1}{\sqrt f} = -2\log_{10}\left(\frac{\varepsilon/d}{3.7} + \frac{2.51}{Re\sqrt f}\right)`,
    ],
    symbols: [
      symbol('Re', 'Reynolds number, V d/ν', '–'),
      symbol(tex`\varepsilon/d`, 'Relative roughness', '–', '0 to 0.05'),
    ],
    assumptions: [
      'Solved to the last digit. There is no transition: Colebrook counts from 2000 on.',
    ],
    source: 'Colebrook 1939; figures solved here',
    tag: 'derived',
    worked: worked({ Re: ['Re', 1e5, '–'], e: [tex`\varepsilon/d`, 0.001, '–'] }, (x) => [
      ['f', frictionFactor(x.Re, x.e), '–'],
    ]),
  },
  {
    id: 'hose',
    title: 'Head lost in a hose',
    tex: [
      tex`h_f = \left(\frac{f\,\ell}{d} + K\right)\frac{V^2}{2g}, \qquad V = \frac{4Q}{\pi d^2}`,
    ],
    symbols: [
      symbol(tex`d,\ \ell`, 'Inner diameter and length of the hose', 'm'),
      symbol('K', 'Sum of the losses of all fittings, exit included', '–'),
      symbol(tex`\varepsilon`, 'Roughness', 'm'),
      symbol(tex`\nu`, 'Kinematic viscosity', 'm²/s'),
      Q,
      g,
    ],
    assumptions: ['Steady flow, hose full.'],
    source: 'Darcy and Weisbach',
    tag: 'derived',
    worked: worked({ ...HOSE, Q: ['Q', 0.02, 'm³/s'] }, (x) => [
      ['h_f', hoseLoss(hoseOf(x), x.Q), 'm'],
    ]),
  },
  {
    id: 'duty',
    title: 'Duty point',
    tex: [tex`H_\text{pump}(Q/n) = H_\text{static} + h_f(Q)`, tex`H_\text{pump} = a + bQ + cQ^2`],
    symbols: [
      symbol('n', 'Equal pumps side by side on one hose', '–'),
      symbol(tex`H_\text{static}`, 'Outlet above the water in the sump', 'm'),
      H,
      Q,
    ],
    assumptions: [
      'The curve is a line through two points, the parabola through three, the parabola of least squares through more. It is known to its last point and used no further.',
      'Three states: the curves cross; the pump runs out of its curve, and the head that is left is told; it does not pump, where the head at no flow does not exceed the static head.',
    ],
    source: 'closed form; White, Fluid Mechanics, ch. 11 (from memory)',
    tag: 'derived',
    worked: worked(
      {
        ...HOSE,
        static: [tex`H_\text{static}`, 6, 'm'],
        h0: ['H(0)', 20, 'm'],
        h1: ['H(0.02)', 15.2, 'm'],
        h2: ['H(0.04)', 0.8, 'm'],
        n: ['n', 2, '–'],
      },
      (x) => {
        const { flow, head } = pumpDuty({
          ...hoseOf(x),
          staticHead: x.static,
          pumps: x.n,
          pumpCurve: [
            [0, x.h0],
            [0.02, x.h1],
            [0.04, x.h2],
          ],
        })
        return [
          ['Q', flow, 'm³/s'],
          ['H', head, 'm'],
        ]
      },
    ),
  },
]

/** Ponding, pumps, hoses, sump. */
export const PUMPING: MethodSection = {
  id: 'pumping',
  title: 'Ponding and pumping',
  intro: ['Water that ponds on the dry side takes friction resistance away: see above.'],
  formulas: [PONDING, ...DUTY, ...POWER_FORMULAS],
}
