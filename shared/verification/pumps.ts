import { frictionFactor } from '../calc/pumping/friction-factor'
import { pumpDuty } from '../calc/pumping/pump-duty'
import { affinity, cycleTime, pumpPower, sumpVolume } from '../calc/pumping/pump-power'
import { suctionHeadAvailable } from '../calc/pumping/suction-head'
import { figure, type CheckRow } from './check-row'

/**
 * Pump 20 − 12 000 Q² on a system 6 + 6000 Q²: the loss as a smooth stand-in whose K alone gives it,
 * K/(2 g A²) = 6000 s²/m⁵.
 */
function twoCurves(pumps: number) {
  const area = (Math.PI * 0.1 ** 2) / 4
  const minorLoss = 6000 * 2 * 9.81 * area ** 2
  return pumpDuty({
    staticHead: 6,
    pumps,
    viscosity: 1.3063e-6,
    gravity: 9.81,
    hose: { diameter: 0.1, length: 0, roughness: 0, minorLoss },
    pumpCurve: [0, 0.02, 0.04].map((q) => [q, 20 - 12_000 * q ** 2] as const),
  })
}

const seaLevel = { altitude: 0, temperature: 20, suctionLift: 3, suctionLoss: 0.5 }

export const PUMP_ROWS: readonly CheckRow[] = [
  {
    id: 'colebrook',
    topic: 'pumps',
    title: 'Friction factor after Colebrook',
    source: 'solved to full accuracy',
    tag: 'derived',
    figures: [
      figure('Re 1e5, ε/D 0.001', '0.022175', '–', () => frictionFactor(1e5, 0.001)),
      figure('Re 1e4, ε/D 0.005', '0.03763', '–', () => frictionFactor(1e4, 0.005)),
      figure('Re 1e6, ε/D 1e-4', '0.01344', '–', () => frictionFactor(1e6, 1e-4)),
      figure('Re 1e5, smooth', '0.01799', '–', () => frictionFactor(1e5, 0)),
    ],
  },
  {
    id: 'suction-si',
    topic: 'pumps',
    title: 'Suction head available at sea level, 20 °C, 3 m lift, 0.5 m loss',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('g 9.80665', '6.612', 'm', () =>
        suctionHeadAvailable({ ...seaLevel, gravity: 9.806_65 }),
      ),
      figure('g 9.81', '6.608', 'm', () => suctionHeadAvailable({ ...seaLevel, gravity: 9.81 })),
    ],
  },
  {
    id: 'pump-power',
    topic: 'pumps',
    title: 'Power at 0.05 m³/s, 10 m, η 0.70',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('hydraulic', '4.905', 'kW', () => power().hydraulic / 1000),
      figure('shaft', '7.007', 'kW', () => power().shaft / 1000),
    ],
  },
  {
    id: 'duty-point',
    topic: 'pumps',
    title: 'Pump 20 − 12 000 Q² on system 6 + 6000 Q²',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('one pump', '0.0278887', 'm³/s', () => twoCurves(1).flow),
      figure('head', '10.667', 'm', () => twoCurves(1).head),
      figure('two on one main', '0.0394405', 'm³/s', () => twoCurves(2).flow),
    ],
  },
  {
    id: 'affinity',
    topic: 'pumps',
    title: 'Affinity at 0.8 of the speed',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('flow', '0.8', '–', () => affinity(0.8).flow),
      figure('head', '0.64', '–', () => affinity(0.8).head),
      figure('power', '0.512', '–', () => affinity(0.8).power),
    ],
  },
  {
    id: 'sump',
    topic: 'pumps',
    title: 'Sump V = t q/4 at 0.02 m³/s and 600 s',
    source: 'closed form',
    tag: 'derived',
    figures: [figure('V', '3.0', 'm³', () => sumpVolume(600, 0.02))],
  },
  {
    id: 'sump-cycle',
    topic: 'pumps',
    title: 'Cycle time at Q/D 0.25, 0.5 and 0.75 with V 500, D 100',
    source: 'MIL-HDBK-1005/9A',
    tag: 'published',
    figures: [
      figure('0.25', '26.667', 'min', () => cycleTime(500, 100, 25)!),
      figure('0.5', '20', 'min', () => cycleTime(500, 100, 50)!),
      figure('0.75', '26.667', 'min', () => cycleTime(500, 100, 75)!),
    ],
  },
]

function power() {
  return pumpPower({ flow: 0.05, head: 10, efficiency: 0.7, density: 1000, gravity: 9.81 })
}
