/** International foot [m]. Exact: US NIST Special Publication 811, appendix B. */
export const FOOT = 0.3048
/** International pound [kg]. Exact: same. */
export const POUND = 0.453_592_37
/** Pound-force [N]. Exact: pound × standard gravity 9.80665 m/s². */
export const POUND_FORCE = POUND * 9.806_65
/** US gallon [m³]. Exact: 231 cubic inches. */
export const GALLON = 3.785_411_784e-3

export const UNIT_SYSTEMS = ['metric', 'us'] as const
export type UnitSystem = (typeof UNIT_SYSTEMS)[number]

/** A display unit: SI value = shown value × factor + offset. */
interface DisplayUnit {
  readonly label: string
  readonly factor: number
  readonly offset?: number
  /** Digits after the decimal point. */
  readonly decimals: number
}

const pure: DisplayUnit = { label: '', factor: 1, decimals: 2 }

/** Display units of each kind of quantity. Inside the program everything is SI. */
const DISPLAY_UNITS = {
  /** Lengths, depths and levels. */
  length: {
    metric: { label: 'm', factor: 1, decimals: 3 },
    us: { label: 'ft', factor: FOOT, decimals: 2 },
  },
  /** Small heights: freeboard, change of crest. */
  smallLength: {
    metric: { label: 'mm', factor: 1e-3, decimals: 0 },
    us: { label: 'in', factor: FOOT / 12, decimals: 1 },
  },
  pressure: {
    metric: { label: 'kPa', factor: 1000, decimals: 1 },
    us: { label: 'psf', factor: POUND_FORCE / FOOT ** 2, decimals: 0 },
  },
  force: {
    metric: { label: 'kN', factor: 1000, decimals: 2 },
    us: { label: 'lbf', factor: POUND_FORCE, decimals: 0 },
  },
  forcePerLength: {
    metric: { label: 'kN/m', factor: 1000, decimals: 2 },
    us: { label: 'lbf/ft', factor: POUND_FORCE / FOOT, decimals: 1 },
  },
  /** Moment per metre run. */
  momentPerLength: {
    metric: { label: 'kN·m/m', factor: 1000, decimals: 2 },
    us: { label: 'lbf·ft/ft', factor: POUND_FORCE, decimals: 0 },
  },
  /** One addend of a sum of forces, fine enough to be added up by hand. */
  forceTerm: {
    metric: { label: 'N/m', factor: 1, decimals: 1 },
    us: { label: 'lbf/ft', factor: POUND_FORCE / FOOT, decimals: 2 },
  },
  momentTerm: {
    metric: { label: 'N·m/m', factor: 1, decimals: 1 },
    us: { label: 'lbf·ft/ft', factor: POUND_FORCE, decimals: 2 },
  },
  mass: {
    metric: { label: 'kg', factor: 1, decimals: 0 },
    us: { label: 'lb', factor: POUND, decimals: 0 },
  },
  massPerLength: {
    metric: { label: 'kg/m', factor: 1, decimals: 1 },
    us: { label: 'lb/ft', factor: POUND / FOOT, decimals: 1 },
  },
  speed: {
    metric: { label: 'm/s', factor: 1, decimals: 2 },
    us: { label: 'ft/s', factor: FOOT, decimals: 2 },
  },
  density: {
    metric: { label: 'kg/m³', factor: 1, decimals: 0 },
    us: { label: 'lb/ft³', factor: POUND / FOOT ** 3, decimals: 1 },
  },
  temperature: {
    metric: { label: '°C', factor: 1, decimals: 0 },
    us: { label: '°F', factor: 5 / 9, offset: -160 / 9, decimals: 0 },
  },
  /** A water level that rises or falls. */
  rate: {
    metric: { label: 'm/h', factor: 1 / 3600, decimals: 2 },
    us: { label: 'ft/h', factor: FOOT / 3600, decimals: 2 },
  },
  minutes: {
    metric: { label: 'min', factor: 60, decimals: 0 },
    us: { label: 'min', factor: 60, decimals: 0 },
  },
  hours: {
    metric: { label: 'h', factor: 3600, decimals: 1 },
    us: { label: 'h', factor: 3600, decimals: 1 },
  },
  seconds: {
    metric: { label: 's', factor: 1, decimals: 1 },
    us: { label: 's', factor: 1, decimals: 1 },
  },
  /** Flow per metre run, shown by the hour. */
  flowPerLength: {
    metric: { label: 'l/h per m', factor: 1e-3 / 3600, decimals: 1 },
    us: { label: 'gpm per ft', factor: GALLON / 60 / FOOT, decimals: 3 },
  },
  /** Flow, shown by the minute. */
  flow: {
    metric: { label: 'l/min', factor: 1e-3 / 60, decimals: 2 },
    us: { label: 'gpm', factor: GALLON / 60, decimals: 2 },
  },
  /** Flow of pipes, wells and pumps, shown by the second. */
  flowRate: {
    metric: { label: 'l/s', factor: 1e-3, decimals: 1 },
    us: { label: 'gpm', factor: GALLON / 60, decimals: 1 },
  },
  permeability: {
    metric: { label: 'm/s', factor: 1, decimals: 7 },
    us: { label: 'ft/s', factor: FOOT, decimals: 7 },
  },
  diffusivity: {
    metric: { label: 'm²/s', factor: 1, decimals: 7 },
    us: { label: 'ft²/s', factor: FOOT ** 2, decimals: 6 },
  },
  /** Water over a crest, per metre run, shown by the second. */
  overtopping: {
    metric: { label: 'l/s per m', factor: 1e-3, decimals: 2 },
    us: { label: 'gpm per ft', factor: GALLON / 60 / FOOT, decimals: 1 },
  },
  /** A flow that does harm: through a gap, over a crest. */
  largeFlow: {
    metric: { label: 'm³/s', factor: 1, decimals: 2 },
    us: { label: 'ft³/s', factor: FOOT ** 3, decimals: 1 },
  },
  volume: {
    metric: { label: 'm³', factor: 1, decimals: 1 },
    us: { label: 'ft³', factor: FOOT ** 3, decimals: 0 },
  },
  area: {
    metric: { label: 'm²', factor: 1, decimals: 2 },
    us: { label: 'ft²', factor: FOOT ** 2, decimals: 1 },
  },
  angle: {
    metric: { label: '°', factor: Math.PI / 180, decimals: 0 },
    us: { label: '°', factor: Math.PI / 180, decimals: 0 },
  },
  count: {
    metric: { label: '', factor: 1, decimals: 0 },
    us: { label: '', factor: 1, decimals: 0 },
  },
  percent: {
    metric: { label: '%', factor: 0.01, decimals: 0 },
    us: { label: '%', factor: 0.01, decimals: 0 },
  },
  ratio: { metric: pure, us: pure },
} as const satisfies Record<string, Record<UnitSystem, DisplayUnit>>

export type QuantityKind = keyof typeof DISPLAY_UNITS

/** A value in SI together with what it measures; texts and scenes carry these, never formatted numbers. */
export interface Quantity {
  readonly value: number
  readonly kind: QuantityKind
  /** `down` for limits such as holds-to and leave level, `up` for demands; nearest if left out. */
  readonly rounding?: 'down' | 'up'
  /** Leaves the unit away, where a neighbour already names it. */
  readonly isBare?: boolean
  /** Digits after the decimal point, where the usual ones say too much, as on a scale bar. */
  readonly decimals?: number
}

function displayUnit(kind: QuantityKind, system: UnitSystem): DisplayUnit {
  return DISPLAY_UNITS[kind][system]
}

/** Label of the unit in which this kind of quantity is shown; empty for a ratio. */
export function unitLabel(kind: QuantityKind, system: UnitSystem): string {
  return displayUnit(kind, system).label
}

/** Digits after the decimal point with which this kind of quantity is shown. */
export function displayDecimals(kind: QuantityKind, system: UnitSystem): number {
  return displayUnit(kind, system).decimals
}

/** From SI to the display unit. */
export function toDisplay(value: number, kind: QuantityKind, system: UnitSystem): number {
  const { factor, offset = 0 } = displayUnit(kind, system)
  return (value - offset) / factor
}

/** From the display unit to SI. */
export function fromDisplay(shown: number, kind: QuantityKind, system: UnitSystem): number {
  const { factor, offset = 0 } = displayUnit(kind, system)
  return shown * factor + offset
}

/** The number alone, rounded to the display decimals; a minus sign, never a hyphen. */
export function formatNumber(value: number, decimals: number, rounding?: 'down' | 'up'): string {
  const scale = 10 ** decimals
  // 1e-9 of a last digit: what binary arithmetic adds, far below what is printed.
  const scaled =
    rounding === 'down'
      ? Math.floor(value * scale + 1e-9)
      : rounding === 'up'
        ? Math.ceil(value * scale - 1e-9)
        : Math.round(value * scale)
  const text = (Math.abs(scaled) / scale).toFixed(decimals)
  return scaled < 0 ? `−${text}` : text
}

/** "0.489 m", "15.0 kPa", "1.33": the value in the display unit of the chosen system. */
export function formatQuantity(quantity: Quantity, system: UnitSystem): string {
  const { label, decimals } = displayUnit(quantity.kind, system)
  const shown = toDisplay(quantity.value, quantity.kind, system)
  const number = formatNumber(shown, quantity.decimals ?? decimals, quantity.rounding)
  if (quantity.isBare || label === '') return number
  return label === '%' ? `${number}\u202f%` : `${number}\u00a0${label}`
}
