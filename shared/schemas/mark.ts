import { z } from 'zod'
import { chainageBounds, type ChainageRange } from './chainage-range'
import { isInRange, rangeFault, showValue, type AllowedRange, type Fault } from '../errors'
import type { Station } from './line'
import { STATION_RANGES } from './station-ranges'

/** What stands, lies or opens beside a line. A turn is a mark only where no x and y tell of it. */
export const MARK_KINDS = [
  'turn',
  'well',
  'gully',
  'outfall',
  'pipe',
  'gate',
  'kerb',
  'pump',
  'obstacle',
] as const
export type MarkKind = (typeof MARK_KINDS)[number]

/** What was done about a way for water: nothing, a flap that shuts by itself, or plugged and shut. */
export const MARK_STATES = ['open', 'flap', 'closed'] as const
export type MarkState = (typeof MARK_STATES)[number]

const metres = (meaning: string) =>
  z.number().nullable().default(null).meta({ unit: 'm', description: meaning })

/** A mark on a line. Fields that its kind does not use stay null. */
export const lineMarkSchema = z.strictObject({
  kind: z.enum(MARK_KINDS),
  chainage: z.number().meta({ unit: 'm', description: 'Where it lies along the line' }),
  offset: metres('Distance from the line, positive to the dry side'),
  angle: z.number().nullable().default(null).meta({
    unit: 'rad',
    description: 'Turn, positive to the left when walking up the chainage',
  }),
  diameter: metres('Inner diameter of a pipe, gully or outfall'),
  width: metres('Width of a gate, or of a gap in a kerb'),
  level: metres('Invert of a pipe, sill of a gate, top of a kerb, in the datum of the line'),
  fromLevel: metres('Water level above which a well runs over'),
  flow: z.number().nullable().default(null).meta({
    unit: 'm³/s',
    description: 'What a well gives once the water stands above that level',
  }),
  state: z.enum(MARK_STATES).default('open'),
  note: z.string().trim().max(200).default(''),
})
export type LineMark = z.output<typeof lineMarkSchema>

/** Most marks on one line. */
export const MOST_MARKS = 500
export const marksSchema = z.array(lineMarkSchema).max(MOST_MARKS)

/** How a line ends: into rising ground, a wall or building, an end closure, or not at all. */
export const END_KINDS = ['ground', 'wall', 'closure', 'open'] as const
export type EndKind = (typeof END_KINDS)[number]

export const lineEndSchema = z.strictObject({
  kind: z.enum(END_KINDS),
  level: metres('Top of the wall or building that it ties into'),
  width: metres('Width of the gap beside an open end'),
  note: z.string().trim().max(200).default(''),
})
export type LineEnd = z.output<typeof lineEndSchema>

/** Both ends of a line; until somebody says otherwise they tie into the ground. */
export const lineEndsSchema = z.strictObject({ start: lineEndSchema, end: lineEndSchema })
export type LineEnds = z.output<typeof lineEndsSchema>

const GROUND_END: LineEnd = { kind: 'ground', level: null, width: null, note: '' }

/** Ends of a line of which nobody said anything. */
export const DEFAULT_ENDS: LineEnds = { start: GROUND_END, end: GROUND_END }

const controlPointSchema = z.strictObject({
  u: z.number().min(0).max(1).meta({ description: 'Across the picture, 0 left to 1 right' }),
  v: z.number().min(0).max(1).meta({ description: 'Down the picture, 0 top to 1 bottom' }),
  x: z.number().meta({ unit: 'm', description: 'Easting in the local grid' }),
  y: z.number().meta({ unit: 'm', description: 'Northing in the local grid' }),
})

/** A picture under the plan, placed by two points that are known in both. */
export const backgroundSchema = z.strictObject({
  fileId: z.string().min(1).max(80),
  first: controlPointSchema,
  second: controlPointSchema,
})
export type Background = z.output<typeof backgroundSchema>

/** Ranges of what a mark says. */
export const MARK_RANGES = {
  offset: { min: -1000, max: 1000, unit: 'm' },
  angle: { min: -Math.PI, max: Math.PI, unit: 'rad' },
  diameter: { min: 0, minExcluded: true, max: 5, unit: 'm' },
  width: { min: 0, minExcluded: true, max: 1000, unit: 'm' },
  level: STATION_RANGES.groundLevel,
  fromLevel: STATION_RANGES.groundLevel,
  flow: { min: 0, max: 100, unit: 'm³/s' },
} as const satisfies Record<string, AllowedRange>
type MarkField = keyof typeof MARK_RANGES

/** What a kind cannot do without. */
export const MARK_NEEDS: Readonly<Record<MarkKind, readonly MarkField[]>> = {
  turn: ['angle'],
  well: ['fromLevel', 'flow'],
  gully: ['diameter', 'level'],
  outfall: ['diameter', 'level'],
  pipe: ['diameter', 'level'],
  gate: ['width', 'level'],
  kerb: ['level'],
  pump: [],
  obstacle: [],
}

/** Everything about marks, ends and background that cannot be. */
export function markFaults(line: {
  readonly stations: readonly Station[]
  readonly sectionLength: number
  readonly marks: readonly LineMark[]
  readonly ends: LineEnds
  readonly background: Background | null
}): readonly Fault[] {
  const range = chainageBounds(line)
  return [
    ...line.marks.flatMap((mark, index) => faultsOfMark(mark, index, range)),
    ...(['start', 'end'] as const).flatMap((side) => faultsOfEnd(line.ends[side], side)),
    ...(line.background ? faultsOfBackground(line.background) : []),
  ]
}

function faultsOfMark(mark: LineMark, index: number, range: ChainageRange): Fault[] {
  const path = `marks[${index}]`
  const outside = Object.entries(MARK_RANGES).flatMap(([field, allowed]) => {
    const value = mark[field as MarkField]
    const isNeeded = MARK_NEEDS[mark.kind].includes(field as MarkField)
    if (value === null && !isNeeded) return []
    if (value !== null && isInRange(value, allowed)) return []
    return [rangeFault(`${path}.${field}`, value, allowed)]
  })
  if (isInRange(mark.chainage, range)) return outside
  return [rangeFault(`${path}.chainage`, mark.chainage, range), ...outside]
}

function faultsOfEnd(end: LineEnd, side: 'start' | 'end'): Fault[] {
  const { level, width, kind } = end
  const isWanted = kind === 'wall'
  const isBadLevel = level === null ? isWanted : !isInRange(level, MARK_RANGES.level)
  return [
    ...(isBadLevel ? [rangeFault(`ends.${side}.level`, level, MARK_RANGES.level)] : []),
    ...(width === null || isInRange(width, MARK_RANGES.width)
      ? []
      : [rangeFault(`ends.${side}.width`, width, MARK_RANGES.width)]),
  ]
}

/** Two points that lie on each other give neither scale nor direction. */
function faultsOfBackground({ first, second }: Background): Fault[] {
  const isOneInPicture = Math.hypot(second.u - first.u, second.v - first.v) < 0.01
  const isOneInGrid = Math.hypot(second.x - first.x, second.y - first.y) < 0.1
  if (!isOneInPicture && !isOneInGrid) return []
  const path = 'background.second'
  const allowed = isOneInPicture
    ? 'a point of the picture away from the first'
    : '0.1 m or more away from the first point'
  const message = `${path}: ${showValue(second)} is not allowed; it must be ${allowed}`
  return [{ path, value: second, allowed, unit: '–', message }]
}
