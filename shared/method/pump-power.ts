import { affinity, cycleTime, pumpEnergy, pumpPower, sumpVolume } from '../calc/pumping/pump-power'
import { suctionHeadAvailable } from '../calc/pumping/suction-head'
import { worked, type Formula } from './formula'
import { symbol, SYMBOLS } from './symbols'

const { g, rho } = SYMBOLS
const tex = String.raw

const Q = symbol('Q', 'Flow', 'm³/s')
const H = symbol('H', 'Head', 'm')

/** Suction head, power and sump. */
export const POWER_FORMULAS: readonly Formula[] = [
  {
    id: 'suction',
    title: 'Suction head available',
    tex: [
      tex`NPSH_a = \frac{p_\mathrm{atm} - p_v}{\rho g} - \text{lift} - \text{loss}, \qquad p_\mathrm{atm} = 101\,325\,(1 - 2.255\,77\times10^{-5} z)^{5.255\,88}`,
    ],
    symbols: [
      symbol('z', 'Altitude', 'm', '−500 to 5000 m'),
      symbol('p_v', 'Vapour pressure of the water', 'Pa'),
      symbol(
        tex`\text{lift},\ \text{loss}`,
        'Pump above the water, head lost in the suction hose',
        'm',
      ),
      rho,
      g,
    ],
    assumptions: ['Fresh water of 0 to 40 °C; density after CIPM, vapour pressure after IF97.'],
    source: 'definition; standard atmosphere ISO 2533 (from memory)',
    tag: 'derived',
    worked: worked(
      {
        z: ['z', 0, 'm'],
        t: [tex`\text{water}`, 20, '°C'],
        lift: [tex`\text{lift}`, 3, 'm'],
        loss: [tex`\text{loss}`, 0.5, 'm'],
      },
      (x) => {
        const suction = { altitude: x.z, temperature: x.t, suctionLift: x.lift }
        const available = suctionHeadAvailable({ ...suction, suctionLoss: x.loss, gravity: 9.81 })
        return [['NPSH_a', available, 'm']]
      },
    ),
  },
  {
    id: 'power',
    title: 'Power, energy, and a pump at another speed',
    tex: [
      tex`P = \frac{\rho g Q H}{\eta}, \qquad E = P\,t`,
      tex`\frac{Q_2}{Q_1} = n, \qquad \frac{H_2}{H_1} = n^2, \qquad \frac{P_2}{P_1} = n^3`,
    ],
    symbols: [
      symbol(tex`\eta`, 'Efficiency of the pump', '–', 'above 0 to 1'),
      symbol('n', 'Ratio of the speeds', '–'),
      Q,
      H,
      rho,
      g,
    ],
    assumptions: ['The efficiency stays the same.'],
    source: 'closed form',
    tag: 'derived',
    worked: worked(
      {
        Q: ['Q', 0.05, 'm³/s'],
        H: ['H', 10, 'm'],
        eta: [tex`\eta`, 0.7, '–'],
        t: ['t', 8, 'h'],
        n: ['n', 0.8, '–'],
      },
      (x) => {
        const work = { flow: x.Q, head: x.H, efficiency: x.eta, density: 1000, gravity: 9.81 }
        return [
          ['P', pumpPower(work).shaft, 'W'],
          ['E', pumpEnergy(pumpPower(work), x.t * 3600) / 3.6e6, 'kWh'],
          ['P_2/P_1', affinity(x.n).power, '–'],
        ]
      },
    ),
  },
  {
    id: 'sump',
    title: 'Sump',
    tex: [
      tex`V = \frac{t\,q}{4}, \qquad t_\text{cycle} = \frac{V}{Q_\text{in}} + \frac{V}{q - Q_\text{in}}`,
    ],
    symbols: [
      symbol('V', 'Volume between start and stop level', 'm³'),
      symbol('t', 'Shortest time between two starts', 's'),
      symbol('q', 'Flow of the pump', 'm³/s'),
      symbol(tex`Q_\text{in}`, 'Inflow', 'm³/s'),
    ],
    assumptions: [
      'The worst inflow is half of q. Without inflow, or with q or more, there is no cycle.',
    ],
    source: 'MIL-HDBK-1005/9A',
    tag: 'published',
    worked: worked(
      {
        t: ['t', 600, 's'],
        q: ['q', 0.02, 'm³/s'],
        in: [tex`Q_\text{in}`, 0.01, 'm³/s'],
      },
      (x) => {
        const volume = sumpVolume(x.t, x.q)
        return [
          ['V', volume, 'm³'],
          [tex`t_\text{cycle}`, cycleTime(volume, x.q, x.in) ?? 0, 's'],
        ]
      },
    ),
  },
]
