import { lineEndsSchema, marksSchema } from '../../shared/schemas/mark'

/** Ways for water beside Low road; until somebody deals with them they are open. */
export const LOW_ROAD_MARKS = marksSchema.parse([
  {
    kind: 'gully',
    chainage: 95,
    offset: 4,
    diameter: 0.15,
    level: 2.62,
    note: 'Drains to the river under the line, no flap',
  },
  {
    kind: 'well',
    chainage: 132,
    offset: 3,
    level: 2.6,
    fromLevel: 2.7,
    flow: 0.0006,
    note: 'Old well, head 2.60',
  },
])

/** The flood wall at chainage 0, and the bank at chainage 180. */
export const LOW_ROAD_ENDS = lineEndsSchema.parse({
  start: { kind: 'wall', level: 4.4, note: 'Flood wall' },
  end: { kind: 'ground', note: 'Bank' },
})

/** A line that leaves another one and meets it again. */
export const JOINED_ENDS = lineEndsSchema.parse({
  start: { kind: 'closure', note: 'Joined to Low road at its ch 30' },
  end: { kind: 'closure', note: 'Joined to Low road at its ch 70' },
})
