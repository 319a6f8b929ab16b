import { AirRun } from '../calc/air/air-through-time'
import { holeLeak, puncture } from '../calc/air/puncture'
import { sectionEvent } from '../checks/event/section-event'
import { exampleSection } from '../verification/example-section'
import { worked, type Formula, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { h } = SYMBOLS
const tex = String.raw

const C = symbol('C', 'Leak coefficient of Q = C √p, Q in free air', 'm³/(s √Pa)')
const patm = symbol(tex`p_\mathrm{atm}`, 'Atmospheric pressure, 101 325 Pa', 'Pa')

const NIGHT: Formula = {
  id: 'air-night',
  title: 'Air through a night',
  tex: [
    tex`p + p_\mathrm{atm} = a\,\frac{T}{T_0}, \qquad V\,\frac{\mathrm{d}a}{\mathrm{d}t} = -p_\mathrm{atm}\left(C\sqrt{p} - Q\right)`,
  ],
  symbols: [
    symbol('a', 'Absolute pressure of the air that is left, at the filling temperature', 'Pa'),
    symbol('T_0,\\ T', 'Temperature when filled and now, in kelvin', 'K'),
    symbol('V', 'Volume of air that is joined', 'm³'),
    symbol('Q', 'Free air from a compressor, below its starting pressure', 'm³/s'),
    C,
    patm,
  ],
  assumptions: [
    'Carried forward in steps of 60 s at most, in each of which √p falls in a straight line. Without a leak it is the law of Gay-Lussac at every moment.',
  ],
  source: 'gas laws and orifice flow, derived',
  tag: 'derived',
  worked: worked(
    {
      p: ['p', 15_000, 'Pa'],
      T0: ['T_0', 17, '°C'],
      T: ['T', 7, '°C'],
      V: ['V', 40, 'm³'],
      C: ['C', 1e-6, 'm³/(s √Pa)'],
      t: ['t', 8, 'h'],
    },
    (x) => {
      const run = new AirRun({
        airPressure: x.p,
        filledAt: x.T0,
        temperature: [
          { time: 0, value: x.T0 },
          { time: x.t * 3600, value: x.T },
        ],
        leak: { volume: x.V, coefficient: x.C },
      })
      run.advance(0, x.t * 3600)
      return [[tex`p \text{ at the end}`, run.pressureAt(x.t * 3600), 'Pa']]
    },
  ),
}

const PUNCTURE: Formula = {
  id: 'puncture',
  title: 'Puncture of one section',
  tex: [
    tex`C = 0.61\,A\,\sqrt{\frac{2\,(1 + p/p_\mathrm{atm})}{\rho_a}}`,
    tex`\text{sections down} = \begin{cases} 1 & \text{isolated} \\ \text{all} & \text{linked, no valve} \end{cases}`,
  ],
  symbols: [
    symbol('A', 'Area of the hole', 'm²'),
    symbol(tex`\rho_a`, 'Density of free air, 1.225', 'kg/m³'),
    C,
    patm,
    h,
  ],
  assumptions: [
    'What comes through the sections that are down is worked out under Air: water through a section that has gone soft.',
    'Linked sections all go soft in the end; how fast follows from the leak.',
  ],
  source: 'orifice flow; coefficient 0.61 (from memory); Ritter 1892 (from memory)',
  tag: 'memory',
  worked: worked(
    {
      A: ['A', 1e-4, 'm²'],
      p: ['p', 15_000, 'Pa'],
      h: ['h', 0.4, 'm'],
      l: [tex`\ell`, 10, 'm'],
      n: ['n', 4, '–'],
    },
    (x) => {
      const sections = Array.from({ length: x.n }, () => ({ depth: x.h, length: x.l }))
      const isolated = puncture(sections, 0, 'isolated', 9.81)
      const linked = puncture(sections, 0, 'linked', 9.81)
      return [
        ['C', holeLeak(x.A, x.p), 'm³/(s √Pa)'],
        [tex`Q_\text{isolated}`, isolated.steady, 'm³/s'],
        [tex`Q_\text{linked}`, linked.steady, 'm³/s'],
      ]
    },
  ),
}

/** A section through a flood. */
export const EVENT: MethodSection = {
  id: 'event',
  title: 'Through an event',
  intro: [
    'Levels are straight between readings. A null, or a step over 3 h, is a gap in which nothing is computed.',
  ],
  formulas: [
    {
      id: 'first-failure',
      title: 'First exceedance',
      tex: [tex`t_1 = \min\{\,t : \text{utilisation}(t) > 1\,\}`],
      symbols: [symbol('t_1', 'Moment at which the section first fails', 's'), h],
      assumptions: [
        'All checks at every step and every reading; the moments at which the section begins and ceases to fail are found by halving, to half a second.',
        'Where the uplift grows with time, water under the skirt follows the level; after a gap, and where the series begins in water, the ground counts as soaked unless dry ground is chosen. Air pressure and the pond on the dry side are fed into every check.',
      ],
      source: 'search over the checks above',
      tag: 'derived',
      worked: worked(
        {
          peak: [tex`h_\text{max}`, 0.55, 'm'],
          rise: [tex`t_\text{rise}`, 3, 'h'],
          D: ['D', 0.7, 'm'],
        },
        (x) => {
          const answer = sectionEvent({
            section: exampleSection({ barrier: { diameter: x.D } }),
            groundLevel: 0,
            water: [
              { time: 0, value: 0 },
              { time: x.rise * 3600, value: x.peak },
              { time: 2 * x.rise * 3600, value: 0 },
            ],
            step: 600,
          })
          return [
            ['t_1', (answer.firstFailure?.from ?? 0) / 3600, 'h'],
            ['h(t_1)', answer.firstFailure?.level ?? 0, 'm'],
            [tex`\text{worst utilisation}`, answer.worst.utilisation ?? 0, '–'],
          ]
        },
      ),
    },
    NIGHT,
    PUNCTURE,
  ],
}
