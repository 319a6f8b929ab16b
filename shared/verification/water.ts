import { rationalRunoff } from '../calc/ground/rational-runoff'
import { waveGrowth, grownHeight, grownPeriod } from '../calc/moving-water/wave-growth'
import { overflow, overtopping } from '../calc/moving-water/overtopping'
import {
  gravityAt,
  seaWaterDensity,
  vapourPressure,
  waterDensity,
  waterViscosity,
} from '../calc/water/water-properties'
import { figure, type CheckRow } from './check-row'

const TEMPERATURES = [0, 4, 10, 20, 30] as const

/** A figure for each of the five temperatures. */
function byTemperature(
  printed: readonly string[],
  unit: string,
  compute: (temperature: number) => number,
) {
  return TEMPERATURES.map((temperature, i) =>
    figure(`${temperature} °C`, printed[i]!, unit, () => compute(temperature)),
  )
}

/** Wave growth at 20 m/s: fetch and depth [m], height [m], period [s]. */
const GROWTH = [
  [2000, 2, '0.5245', '2.186'],
  [1000, 1.5, '0.3870', '1.769'],
  [500, 1, '0.2770', '1.419'],
] as const

/** An acre-inch per hour in cubic feet per second, and the units of the worked examples. */
const ACRE = 43_560
const INCH_PER_HOUR = 1 / 12 / 3600

export const WATER_ROWS: readonly CheckRow[] = [
  {
    id: 'water-density',
    topic: 'water',
    title: 'Density of fresh water',
    source: 'formula of CIPM 2001 (Tanaka et al., Metrologia 38), recomputed; figures from memory',
    tag: 'memory',
    figures: byTemperature(
      ['999.843', '999.975', '999.703', '998.207', '995.649'],
      'kg/m³',
      waterDensity,
    ),
  },
  {
    id: 'water-viscosity',
    topic: 'water',
    title: 'Viscosity of water',
    source: 'IAPWS, supplementary release on liquid water at 0.1 MPa (from memory)',
    tag: 'memory',
    figures: byTemperature(['1791.8', '1567.3', '1305.9', '1001.6', '797.2'], 'µPa·s', (t) => {
      return waterViscosity(t) * 1e6
    }),
  },
  {
    id: 'vapour-pressure',
    topic: 'water',
    title: 'Vapour pressure of water',
    source: 'IAPWS-IF97, eq. 30 (from memory)',
    tag: 'memory',
    figures: byTemperature(['0.6112', '0.8135', '1.2282', '2.3392', '4.2467'], 'kPa', (t) => {
      return vapourPressure(t) / 1000
    }),
  },
  {
    id: 'saturation-300',
    topic: 'water',
    title: 'Saturation pressure at 300 K',
    source: 'IAPWS-IF97, table 35 (from memory, reproduced exactly)',
    tag: 'memory',
    figures: [figure('p_s', '0.00353658941', 'MPa', () => vapourPressure(300 - 273.15) / 1e6)],
  },
  {
    id: 'sea-water',
    topic: 'water',
    title: 'Density of sea water, S 35, 5 °C',
    source: 'EOS-80 (from memory)',
    tag: 'memory',
    figures: [figure('ρ', '1027.67547', 'kg/m³', () => seaWaterDensity(5, 35))],
  },
  {
    id: 'gravity',
    topic: 'water',
    title: 'Gravity at 0°, 45° and 90°',
    source: 'WGS 84, formula of Somigliana (from memory)',
    tag: 'memory',
    figures: [
      figure('0°', '9.780325', 'm/s²', () => gravityAt(0)),
      figure('45°', '9.806198', 'm/s²', () => gravityAt(45)),
      figure('90°', '9.832185', 'm/s²', () => gravityAt(90)),
    ],
  },
  {
    id: 'rational-method',
    topic: 'water',
    title: 'Rational method with the exact unit factor: 128 acre and 30 acre',
    source: 'two worked examples of urban drainage',
    tag: 'published',
    // The books print C i A in acre-inches per hour, taken as cubic feet per second (1.00833).
    figures: [
      figure('0.4, 2.87 in/h, 128 acre', '146.944', 'acre·in/h', () => {
        return rationalRunoff(0.4, 2.87 * INCH_PER_HOUR, 128 * ACRE) / (ACRE * INCH_PER_HOUR)
      }),
      figure('0.11, 1.25 in/h, 30 acre', '4.125', 'acre·in/h', () => {
        return rationalRunoff(0.11, 1.25 * INCH_PER_HOUR, 30 * ACRE) / (ACRE * INCH_PER_HOUR)
      }),
    ],
  },
  {
    id: 'rational-si',
    topic: 'water',
    title: 'Rational method: 0.9, 50 mm/h, 2000 m²',
    source: 'closed form',
    tag: 'derived',
    figures: [figure('Q', '25.000', 'l/s', () => 1000 * rationalRunoff(0.9, 0.05 / 3600, 2000))],
  },
  {
    id: 'broad-crest',
    topic: 'water',
    title: 'Ideal broad crest at 0.05, 0.10 and 0.20 m',
    source: 'closed form',
    tag: 'derived',
    figures: [
      figure('0.05 m', '0.01906', 'm²/s', () => overflow(0.05, 9.81)),
      figure('0.10 m', '0.05391', 'm²/s', () => overflow(0.1, 9.81)),
      figure('0.20 m', '0.15249', 'm²/s', () => overflow(0.2, 9.81)),
    ],
  },
  {
    id: 'wave-growth-book',
    topic: 'movingWater',
    title: 'Waves on shallow water: fetch 24.4 km, U_A 22 m/s, depth 11 m (book: 1.5 m, 4.4 s)',
    source: 'Shore Protection Manual 1984, ch. 3 (from memory)',
    tag: 'memory',
    figures: [
      figure('H_s', '1.4928', 'm', () =>
        grownHeight(22, { fetch: 24_400, depth: 11, gravity: 9.81 }),
      ),
      figure('T_s', '4.411', 's', () =>
        grownPeriod(22, { fetch: 24_400, depth: 11, gravity: 9.81 }),
      ),
    ],
  },
  {
    id: 'wave-growth',
    topic: 'movingWater',
    title: 'Waves on shallow water at 20 m/s',
    source: 'closed form',
    tag: 'derived',
    figures: GROWTH.flatMap(([fetch, depth, height, period]) => {
      const waves = () => waveGrowth({ fetch, depth, windSpeed: 20, gravity: 9.81 })
      return [
        figure(`H_s, ${fetch} m × ${depth} m`, height, 'm', () => waves().height),
        figure(`T_s, ${fetch} m × ${depth} m`, period, 's', () => waves().period),
      ]
    }),
  },
  {
    id: 'overtopping',
    topic: 'movingWater',
    title: 'Overtopping of a vertical wall, H_m0 = R_c = 0.10 and 0.20 m',
    source: 'EurOtop 2018, eq. 7.1 (from memory); figures derived',
    tag: 'derived',
    figures: [
      figure('0.10 m', '0.2234', 'l/s', () => {
        return 1000 * overtopping({ height: 0.1, crestFreeboard: 0.1, gravity: 9.81 })
      }),
      figure('0.20 m', '0.6320', 'l/s', () => {
        return 1000 * overtopping({ height: 0.2, crestFreeboard: 0.2, gravity: 9.81 })
      }),
    ],
  },
]
