import { FOOT, POUND, POUND_FORCE, type UnitSystem } from '../units'

/** One unit of a sheet. SI value = figure × factor. */
export interface SheetUnit {
  /** For mathjs; empty for a pure number. */
  readonly unit: string
  /** For the reader: "kN/m", "lbf/ft³". */
  readonly label: string
  readonly factor: number
}

const pure: SheetUnit = { unit: '', label: '', factor: 1 }
const radian: SheetUnit = { unit: '', label: 'rad', factor: 1 }
const second: SheetUnit = { unit: 's', label: 's', factor: 1 }
const of = (unit: string, label: string, factor = 1): SheetUnit => ({ unit, label, factor })

/** Units of every kind of figure on a sheet. */
export const SHEET_UNITS = {
  /** Lengths, depths and levels: printed to 1 mm. */
  length: { metric: of('m', 'm'), us: of('ft', 'ft', FOOT) },
  area: { metric: of('m^2', 'm²'), us: of('ft^2', 'ft²', FOOT ** 2) },
  volume: { metric: of('m^3', 'm³'), us: of('ft^3', 'ft³', FOOT ** 3) },
  perLength: { metric: of('1/m', '1/m'), us: of('1/ft', '1/ft', 1 / FOOT) },
  speed: { metric: of('m/s', 'm/s'), us: of('ft/s', 'ft/s', FOOT) },
  rate: {
    metric: of('m/hour', 'm/h', 1 / 3600),
    us: of('ft/hour', 'ft/h', FOOT / 3600),
  },
  minutes: { metric: of('minute', 'min', 60), us: of('minute', 'min', 60) },
  seconds: { metric: second, us: second },
  acceleration: { metric: of('m/s^2', 'm/s²'), us: of('ft/s^2', 'ft/s²', FOOT) },
  density: {
    metric: of('kg/m^3', 'kg/m³'),
    us: of('lbm/ft^3', 'lb/ft³', POUND / FOOT ** 3),
  },
  unitWeight: {
    metric: of('kN/m^3', 'kN/m³', 1000),
    us: of('lbf/ft^3', 'lbf/ft³', POUND_FORCE / FOOT ** 3),
  },
  pressure: {
    metric: of('kPa', 'kPa', 1000),
    us: of('lbf/ft^2', 'lbf/ft²', POUND_FORCE / FOOT ** 2),
  },
  force: { metric: of('kN', 'kN', 1000), us: of('lbf', 'lbf', POUND_FORCE) },
  forcePerLength: {
    metric: of('kN/m', 'kN/m', 1000),
    us: of('lbf/ft', 'lbf/ft', POUND_FORCE / FOOT),
  },
  /** Moment per metre run. */
  momentPerLength: {
    metric: of('kN m/m', 'kN·m/m', 1000),
    us: of('lbf ft/ft', 'lbf·ft/ft', POUND_FORCE),
  },
  mass: { metric: of('kg', 'kg'), us: of('lbm', 'lb', POUND) },
  massPerLength: { metric: of('kg/m', 'kg/m'), us: of('lbm/ft', 'lb/ft', POUND / FOOT) },
  flowPerLength: {
    metric: of('m^2/s', 'm²/s'),
    us: of('ft^2/s', 'ft²/s', FOOT ** 2),
  },
  angle: { metric: radian, us: radian },
  ratio: { metric: pure, us: pure },
} as const satisfies Record<string, Record<UnitSystem, SheetUnit>>

export type FigureKind = keyof typeof SHEET_UNITS

/** The unit in which a kind of figure is written on a sheet. */
export function sheetUnit(kind: FigureKind, system: UnitSystem): SheetUnit {
  return SHEET_UNITS[kind][system]
}
