import type { ShapeRole, TextRole } from './scene'

/** Names of colours; the page has a CSS variable of the same name, a file has the value of a theme. */
export const TONES = [
  'ink',
  'muted',
  'surface',
  'line',
  'line-strong',
  'water',
  'water-fill',
  'water-deep',
  'barrier',
  'barrier-fill',
  'ground',
  'ground-text',
  'ground-fill',
  'ground-wash',
  'dry-text',
  'force',
  'uplift',
  'holds',
  'narrow',
  'fails',
] as const
export type Tone = (typeof TONES)[number]

/** How an area or a line looks, whatever the theme. */
export interface Paint {
  readonly fill?: Tone
  readonly fillOpacity?: number
  /** Tones from top to bottom, instead of one fill. */
  readonly fade?: readonly [Tone, Tone]
  readonly stroke?: Tone
  readonly width?: number
  readonly strokeOpacity?: number
  readonly dash?: string
  readonly cap?: 'round' | 'butt'
}

/** Looks of all areas and lines. */
export const SHAPE_PAINTS: Readonly<Record<ShapeRole, Paint>> = {
  water: { fade: ['water-fill', 'water-deep'] },
  waterLine: { stroke: 'water', width: 2 },
  waterDetail: { stroke: 'water', width: 1.2 },
  levelMark: { fill: 'water' },
  levelLine: { stroke: 'water', width: 1, dash: '5 4' },
  wave: { stroke: 'water', width: 1.3, dash: '7 3' },
  flow: { fill: 'surface', fillOpacity: 0.6, stroke: 'water', width: 1.2 },
  debris: { fill: 'ground-fill', stroke: 'ground', width: 1.5 },
  ground: { fade: ['ground-fill', 'ground-wash'] },
  groundLine: { stroke: 'ground', width: 1.6 },
  groundHatch: { stroke: 'ground', width: 1, strokeOpacity: 0.6 },
  barrierFill: { fill: 'barrier-fill' },
  barrier: { stroke: 'barrier', width: 3.4 },
  skirt: { stroke: 'barrier', width: 4, cap: 'round' },
  weld: { fill: 'surface', stroke: 'barrier', width: 1.8 },
  contact: { stroke: 'barrier', width: 6 },
  unloaded: { stroke: 'barrier', width: 1.2, dash: '1.5 3.5', cap: 'round' },
  ghostFill: { fill: 'barrier-fill', fillOpacity: 0.55 },
  ghost: { stroke: 'barrier', width: 2, dash: '7 5' },
  pressure: { fill: 'water' },
  envelope: { stroke: 'water', width: 1 },
  upliftArea: { fill: 'uplift', fillOpacity: 0.1 },
  upliftLine: { stroke: 'uplift', width: 1 },
  uplift: { fill: 'uplift' },
  force: { fill: 'force' },
  friction: { fill: 'ground' },
  demand: { stroke: 'ink', width: 2 },
  dimension: { stroke: 'muted', width: 1 },
  witness: { stroke: 'muted', width: 1, strokeOpacity: 0.6 },
  staff: { fill: 'muted' },
  staffFrame: { fill: 'surface', stroke: 'muted', width: 1 },
  forecast: { stroke: 'muted', width: 1 },
  holdsTo: { stroke: 'holds', width: 1.2 },
  holdsToLine: { stroke: 'holds', width: 1.2, dash: '2 4' },
  leave: { stroke: 'narrow', width: 1.2 },
  cutGap: { fill: 'surface' },
  cutLine: { stroke: 'muted', width: 1 },
  axis: { stroke: 'muted', width: 1 },
  grid: { stroke: 'line', width: 1 },
  shortfall: { fill: 'fails', fillOpacity: 0.07 },
  curve: { stroke: 'ink', width: 2.2, cap: 'round' },
  curveAlternative: { stroke: 'muted', width: 1.5, dash: '6 4' },
  required: { stroke: 'fails', width: 1.3, dash: '2 3' },
  now: { stroke: 'water', width: 1.4 },
  nowDot: { fill: 'surface', stroke: 'ink', width: 2 },
  waterOverlay: { fill: 'water', fillOpacity: 0.17 },
  tubeEdge: { stroke: 'barrier', width: 1.6 },
  joint: { stroke: 'barrier', width: 1, strokeOpacity: 0.5 },
  sectionHolds: { fill: 'holds' },
  sectionNarrow: { fill: 'narrow' },
  sectionFails: { fill: 'fails' },
  sectionUnchecked: { fill: 'muted' },
  weakest: { fill: 'holds' },
  placeLine: { stroke: 'ink', width: 1.4 },
  guess: { stroke: 'ink', width: 2, dash: '6 4' },
  workFill: { fill: 'barrier' },
}

/** Colours of texts. */
export const TEXT_TONES: Readonly<Record<TextRole, Tone>> = {
  label: 'ink',
  labelQuiet: 'muted',
  labelWater: 'water',
  labelDry: 'dry-text',
  labelGround: 'ground-text',
  labelBarrier: 'barrier',
  labelUplift: 'uplift',
  labelForce: 'force',
  labelHolds: 'holds',
  labelNarrow: 'narrow',
  labelFails: 'fails',
}

/** The edge of a text that crosses lines. */
export const HALO = { width: 3, opacity: 0.75 } as const

/** Colours of a drawing in a file. */
export type Theme = Readonly<Record<Tone, string>>

/** By day, and for control rooms at night; the same values as the tokens of the page. */
export const THEMES = {
  light: {
    ink: '#1b2a33',
    muted: '#55626b',
    surface: '#ffffff',
    line: '#dcd8ce',
    'line-strong': '#b9b3a6',
    water: '#1f6f8b',
    'water-fill': '#cfe3ea',
    'water-deep': '#a6c9d3',
    barrier: '#6b3f63',
    'barrier-fill': '#f5eef3',
    ground: '#7a6a55',
    'ground-text': '#6c5d49',
    'ground-fill': '#ece5d8',
    'ground-wash': '#f4efe7',
    'dry-text': '#4c6f49',
    force: '#1b2a33',
    uplift: '#a5493f',
    holds: '#2f6b4f',
    narrow: '#8f5b00',
    fails: '#a8322d',
  },
  dark: {
    ink: '#e8ecee',
    muted: '#a3b1ba',
    surface: '#182833',
    line: '#2b3e4a',
    'line-strong': '#435a68',
    water: '#6fb8d6',
    'water-fill': '#1f4656',
    'water-deep': '#28596c',
    barrier: '#d3a6cb',
    'barrier-fill': '#332c3a',
    ground: '#bfae95',
    'ground-text': '#bfae95',
    'ground-fill': '#37352f',
    'ground-wash': '#252c2e',
    'dry-text': '#9cc596',
    force: '#e8ecee',
    uplift: '#f0a79b',
    holds: '#6cc79b',
    narrow: '#e0ae4a',
    fails: '#f0908a',
  },
} as const satisfies Record<string, Theme>

export type ThemeName = keyof typeof THEMES
