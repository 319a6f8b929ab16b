import { assertInRange } from '../../errors'

/** Range in which all three formulas hold for fresh water. */
const FRESH = { min: 0, max: 40, unit: '°C' }

/**
 * Density of fresh water at atmospheric pressure [kg/m³].
 *
 *     ρ = a₅ [1 − (t + a₁)² (t + a₂) / (a₃ (t + a₄))]
 *
 * @param temperature 0 to 40 °C.
 * @throws OutOfRangeError outside.
 * @see Tanaka et al., Metrologia 38 (2001) 301, the formula recommended by the CIPM.
 */
export function waterDensity(temperature: number): number {
  assertInRange('water.temperature', temperature, FRESH)
  const t = temperature
  const share = ((t - 3.983_035) ** 2 * (t + 301.797)) / (522_528.9 * (t + 69.348_81))
  return 999.974_95 * (1 - share)
}

/**
 * Dynamic viscosity of liquid water at 0.1 MPa [Pa·s]: four powers of T/300 K.
 *
 * @param temperature 0 to 40 °C.
 * @throws OutOfRangeError outside.
 * @see IAPWS, Revised supplementary release on liquid water at 0.1 MPa, 2011, eq. 7.
 */
export function waterViscosity(temperature: number): number {
  assertInRange('water.temperature', temperature, FRESH)
  const t = (temperature + 273.15) / 300
  const microPascalSeconds =
    280.68 * t ** -1.9 + 511.45 * t ** -7.7 + 61.131 * t ** -19.6 + 0.459_03 * t ** -40
  return microPascalSeconds * 1e-6
}

/** Coefficients n₁…n₁₀ of the saturation line, region 4. IAPWS-IF97, table 34. */
const SATURATION = [
  0.116_705_214_527_67e4, -0.724_213_167_032_06e6, -0.170_738_469_400_92e2, 0.120_208_247_024_7e5,
  -0.323_255_503_223_33e7, 0.149_151_086_135_3e2, -0.482_326_573_615_91e4, 0.405_113_405_420_57e6,
  -0.238_555_575_678_49, 0.650_175_348_447_98e3,
] as const

/**
 * Vapour pressure of water [Pa].
 *
 * @param temperature 0 to 100 °C.
 * @throws OutOfRangeError outside.
 * @see IAPWS-IF97, eq. 30.
 */
export function vapourPressure(temperature: number): number {
  assertInRange('water.temperature', temperature, { min: 0, max: 100, unit: '°C' })
  const kelvin = temperature + 273.15
  const [n1, n2, n3, n4, n5, n6, n7, n8, n9, n10] = SATURATION
  const theta = kelvin + n9 / (kelvin - n10)
  const a = theta ** 2 + n1 * theta + n2
  const b = n3 * theta ** 2 + n4 * theta + n5
  const c = n6 * theta ** 2 + n7 * theta + n8
  return 1e6 * ((2 * c) / (-b + Math.sqrt(b ** 2 - 4 * a * c))) ** 4
}

/**
 * Density of sea water at the surface [kg/m³]: the one-atmosphere equation of state.
 *
 * @param temperature −2 to 40 °C.
 * @param salinity Practical salinity, 0 to 42.
 * @throws OutOfRangeError outside.
 * @see UNESCO Technical Papers in Marine Science 36 (1981), EOS-80 (from memory).
 */
export function seaWaterDensity(temperature: number, salinity: number): number {
  assertInRange('water.temperature', temperature, { min: -2, max: 40, unit: '°C' })
  assertInRange('water.salinity', salinity, { min: 0, max: 42, unit: '–' })
  const [t, s] = [temperature, salinity]
  const pure =
    999.842_594 +
    t *
      (6.793_952e-2 +
        t * (-9.095_29e-3 + t * (1.001_685e-4 + t * (-1.120_083e-6 + t * 6.536_332e-9))))
  const linear = 0.824_493 + t * (-4.0899e-3 + t * (7.6438e-5 + t * (-8.2467e-7 + t * 5.3875e-9)))
  const root = -5.724_66e-3 + t * (1.0227e-4 - t * 1.6546e-6)
  return pure + linear * s + root * s ** 1.5 + 4.8314e-4 * s ** 2
}

/** Gravity at sea level by latitude [m/s²]. WGS 84 ellipsoidal gravity formula (Somigliana). */
export function gravityAt(latitude: number): number {
  assertInRange('latitude', latitude, { min: -90, max: 90, unit: '°' })
  const sine2 = Math.sin((latitude * Math.PI) / 180) ** 2
  return (
    (9.780_325_335_9 * (1 + 0.001_931_852_652_41 * sine2)) /
    Math.sqrt(1 - 0.006_694_379_990_14 * sine2)
  )
}

/** Atmospheric pressure by altitude [Pa], 0 to 5000 m. ICAO standard atmosphere. */
export function atmosphereAt(altitude: number): number {
  assertInRange('altitude', altitude, { min: -500, max: 5000, unit: 'm' })
  return 101_325 * (1 - 2.255_77e-5 * altitude) ** 5.255_88
}
