import { filling } from '../calc/air/filling'
import {
  compressorDuty,
  leakCoefficient,
  leakedPressure,
  timeToPressure,
} from '../calc/air/linked-air'
import { minimumAirPressure } from '../calc/air/minimum-air-pressure'
import { pressureAtTemperature } from '../calc/air/pressure-at-temperature'
import { breachFlow } from '../calc/moving-water/breach-flow'
import { evaluateSection } from '../checks/evaluate-section'
import { exampleSection } from '../verification/example-section'
import { worked, type Formula, type MethodSection } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { p, D, h, F, strength, rho, g } = SYMBOLS
const tex = String.raw

const patm = symbol(tex`p_\mathrm{atm}`, 'Atmospheric pressure, 101 325 Pa', 'Pa')
const C = symbol('C', 'Leak coefficient', 'm³/(s √Pa)')
const volume = symbol('V', 'Volume of air that is joined', 'm³')

const PRESSURE: readonly Formula[] = [
  {
    id: 'air-minimum',
    title: 'Least air pressure',
    tex: [
      tex`p_\mathrm{min} = \max\left(\,p : z_c(p) = h + \text{freeboard},\;\; \rho g h\,\right)`,
    ],
    symbols: [
      symbol('z_c', 'Loaded crest, 2T/p', 'm'),
      symbol(tex`\text{freeboard}`, 'Required freeboard, waves and velocity head', 'm'),
      h,
      rho,
      g,
    ],
    assumptions: [
      'The crest rises with the pressure; one root between 1 Pa and 100 kPa. ρ g h keeps the seat closed. Where 100 kPa does not give the crest, no pressure is enough.',
    ],
    source: 'loaded shape, derived',
    tag: 'derived',
    worked: worked(
      {
        D: ['D', 0.7, 'm'],
        h: ['h', 0.55, 'm'],
        f: [tex`\text{freeboard}`, 0.1, 'm'],
      },
      (x) => {
        const tube = { diameter: x.D, wettedSkirt: 2.2, depth: x.h, unitWeight: 9810 }
        const { forCrest, forSeal, least } = minimumAirPressure({ ...tube, freeboard: x.f })
        return [
          [tex`p \text{ for the crest}`, forCrest ?? 0, 'Pa'],
          [tex`\rho g h`, forSeal, 'Pa'],
          [tex`p_\mathrm{min}`, least ?? 0, 'Pa'],
        ]
      },
    ),
  },
  {
    id: 'air-temperature',
    title: 'Air pressure after a change of temperature',
    tex: [tex`p_2 = (p_1 + p_\mathrm{atm})\,\frac{T_2}{T_1} - p_\mathrm{atm}`],
    symbols: [
      symbol('p_1,\\ p_2', 'Pressure over atmosphere when filled and now', 'Pa'),
      symbol('T_1,\\ T_2', 'Air temperature when filled and now, in kelvin', 'K', '−40 to 60 °C'),
      patm,
    ],
    assumptions: ['Constant volume: no leak, no stretch.'],
    source: 'law of Gay-Lussac',
    tag: 'derived',
    worked: worked(
      {
        p: ['p_1', 15_000, 'Pa'],
        filled: ['T_1', 17, '°C'],
        now: ['T_2', 5, '°C'],
      },
      (x) => [
        ['p_2', pressureAtTemperature({ airPressure: x.p, filledAt: x.filled, now: x.now }), 'Pa'],
      ],
    ),
  },
  {
    id: 'fabric',
    title: 'Fabric',
    tex: [tex`FS = \frac{f}{\max(T, F)}`],
    symbols: [strength, symbol('T', 'Tension of the skin; p D/2 where no shape stands', 'N/m'), F],
    assumptions: [
      'Not checked unless the strength is entered. Seams and age reduce it: enter the reduced one.',
    ],
    source: 'required 4.0, with partial factors 3.0: common practice, no source',
    tag: 'practice',
    worked: worked(
      {
        f: ['f', 60_000, 'N/m'],
        p: ['p', 15_000, 'Pa'],
        D: ['D', 0.7, 'm'],
        h: ['h', 0.55, 'm'],
      },
      (x) => {
        const { fabric, workings } = evaluateSection(
          exampleSection({
            barrier: { diameter: x.D, airPressure: x.p, fabricStrength: x.f },
            water: { depth: x.h },
          }),
        )
        return [
          [tex`\max(T, F)`, workings.fabric.demand, 'N/m'],
          ['FS', fabric.factor ?? 0, '–'],
        ]
      },
    ),
  },
  {
    id: 'filling',
    title: 'Time to fill',
    tex: [tex`t = \frac{\pi D^2 \ell}{4}\left(1 + \frac{p}{p_\mathrm{atm}}\right) \Big/ Q`],
    symbols: [
      D,
      symbol(tex`\ell`, 'Length of one section', 'm', '1 to 100 m'),
      symbol('Q', 'Free air that the blower delivers', 'm³/s'),
      p,
      patm,
    ],
    assumptions: ['The blower delivers the same at every pressure.'],
    source: 'law of Boyle',
    tag: 'derived',
    worked: worked(
      {
        D: ['D', 0.7, 'm'],
        l: [tex`\ell`, 10, 'm'],
        p: ['p', 15_000, 'Pa'],
        Q: ['Q', 0.05, 'm³/s'],
      },
      (x) => {
        const fill = { diameter: x.D, sectionLength: x.l, airPressure: x.p, blowerFlow: x.Q }
        const { volume: room, freeAir, time } = filling(fill)
        return [
          [tex`\text{volume}`, room, 'm³'],
          [tex`\text{free air}`, freeAir, 'm³'],
          ['t', time, 's'],
        ]
      },
    ),
  },
]

const LEAKS: readonly Formula[] = [
  {
    id: 'leak',
    title: 'Joined sections that leak',
    tex: [
      tex`Q = C\sqrt{p}, \qquad C = \frac{2V\left(\sqrt{p_1} - \sqrt{p_2}\right)}{p_\mathrm{atm}\,t}`,
      tex`\sqrt{p(t)} = \sqrt{p_0} - \frac{p_\mathrm{atm}\,C}{2V}\,t`,
    ],
    symbols: [
      C,
      volume,
      symbol('p_1,\\ p_2', 'Pressures read at the start and the end of a test', 'Pa'),
      symbol('t', 'Time between them', 's'),
      patm,
    ],
    assumptions: ['Constant temperature; flow in free air.'],
    source: 'orifice flow and law of Boyle, derived',
    tag: 'derived',
    worked: worked(
      {
        V: ['V', 40, 'm³'],
        p1: ['p_1', 15_000, 'Pa'],
        p2: ['p_2', 13_500, 'Pa'],
        t: ['t', 3600, 's'],
        least: [tex`p_\mathrm{min}`, 8000, 'Pa'],
      },
      (x) => {
        const leak = leakCoefficient({ volume: x.V, from: x.p1, to: x.p2, duration: x.t })
        const air = { volume: x.V, leak }
        return [
          ['C', leak, 'm³/(s √Pa)'],
          [tex`p \text{ after 2 h}`, leakedPressure(air, x.p1, 7200), 'Pa'],
          [tex`t \text{ to } p_\mathrm{min}`, timeToPressure(air, x.p1, x.least), 's'],
        ]
      },
    ),
  },
  {
    id: 'compressor',
    title: 'Compressor that tops up',
    tex: [
      tex`t_\mathrm{on} = \frac{2V}{p_\mathrm{atm}}\left[\frac{Q}{C^2}\ln\frac{Q - C\sqrt{p_s}}{Q - C\sqrt{p_e}} - \frac{\sqrt{p_e} - \sqrt{p_s}}{C}\right]`,
      tex`\text{duty} = \frac{t_\mathrm{on}}{t_\mathrm{on} + t_\mathrm{off}}, \qquad Q_\mathrm{least} = C\sqrt{p_e}`,
    ],
    symbols: [
      symbol('p_s,\\ p_e', 'Pressures at which it starts and stops', 'Pa'),
      symbol('Q', 'Free air that it delivers', 'm³/s'),
      C,
      volume,
      patm,
    ],
    assumptions: ['It never reaches its stop where it delivers no more than the least flow.'],
    source: 'law of Boyle, derived',
    tag: 'derived',
    worked: worked(
      {
        V: ['V', 40, 'm³'],
        C: ['C', 2e-5, 'm³/(s √Pa)'],
        Q: ['Q', 0.02, 'm³/s'],
        start: ['p_s', 12_000, 'Pa'],
        stop: ['p_e', 15_000, 'Pa'],
      },
      (x) => {
        const compressor = { flow: x.Q, startPressure: x.start, stopPressure: x.stop }
        const duty = compressorDuty({ volume: x.V, leak: x.C }, compressor)
        return [
          [tex`t_\mathrm{on}`, duty.onTime ?? 0, 's'],
          [tex`t_\mathrm{off}`, duty.offTime, 's'],
          [tex`\text{duty}`, duty.share ?? 0, '–'],
          [tex`Q_\mathrm{least}`, duty.leastFlow, 'm³/s'],
        ]
      },
    ),
  },
  {
    id: 'breach',
    title: 'Water through a section that has gone soft',
    tex: [
      tex`Q \le \ell\left(\tfrac{2}{3}\right)^{1.5}\sqrt{g}\,h^{1.5}, \qquad Q_\text{first rush} = \ell\,\tfrac{8}{27}\sqrt{g}\,h^{1.5}`,
    ],
    symbols: [symbol(tex`\ell`, 'Length of one section', 'm', '1 to 100 m'), h, g],
    assumptions: [
      'The whole section is gone at once, and the ground behind it is dry. The first rush is the smaller of both: still water must first be set in motion.',
    ],
    source: 'critical depth; Ritter 1892 for the first rush (from memory)',
    tag: 'memory',
    worked: worked(
      { l: [tex`\ell`, 10, 'm'], h: ['h', 0.55, 'm'], g: ['g', 9.81, 'm/s²'] },
      (x) => {
        const { steady, firstRush } = breachFlow(x.h, x.l, x.g)
        return [
          [tex`Q_\mathrm{most}`, steady, 'm³/s'],
          [tex`Q_\text{first rush}`, firstRush, 'm³/s'],
        ]
      },
    ),
  },
]

/** Air in the tube. */
export const AIR: MethodSection = {
  id: 'air',
  title: 'Air',
  intro: [
    'The crest is lowest at the coldest hour, the skin tension highest at the hottest: look at both.',
  ],
  formulas: [...PRESSURE, ...LEAKS],
}
