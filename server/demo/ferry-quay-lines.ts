import type { Station } from '../../shared/schemas/line'

/** chainage, x, y, ground level, surface from here on, clear width on the wet side, note. */
type Row = readonly [number, number, number, number, string, number, string?]

function stations(rows: readonly Row[]): readonly Station[] {
  return rows.map(([chainage, x, y, groundLevel, surface, clearWidth, note = '']) => ({
    chainage,
    x,
    y,
    groundLevel,
    surface,
    clearWidth,
    note,
  }))
}

/** Ferry Quay is invented: a river town with the river on the right, levels in Quay datum (QD). */
export const LOW_ROAD_STATIONS: readonly Station[] = stations([
  [0, 0, 0, 3.16, 'concrete', 2.4, 'Tie-in: flood wall, crest 4.40'],
  [10, 10, 0, 3.13, 'concrete', 2.4],
  [20, 20, 0, 3.12, 'concrete', 2.8],
  [30, 30, 0, 3.07, 'concrete', 2.9],
  [40, 40, 0, 3.03, 'concrete', 6, 'Turn 20° right, slipway head'],
  [45, 44.7, -1.71, 2.79, 'concrete', 8, 'Lowest ground'],
  [50, 49.4, -3.42, 2.84, 'concrete', 8],
  [60, 58.79, -6.84, 2.87, 'turf', 5, 'Turn 90° left, two closures, Low road'],
  [70, 62.21, 2.56, 2.87, 'turf', 5],
  [80, 65.63, 11.95, 2.88, 'turf', 5],
  [90, 69.05, 21.35, 2.94, 'turf', 4.2],
  [95, 70.76, 26.05, 2.95, 'turf', 4.2, 'Gully on the dry side, 150 mm, no flap, invert 2.62'],
  [100, 72.47, 30.75, 2.95, 'turf', 4.2],
  [105, 74.18, 35.45, 2.94, 'turf', 4.2],
  [110, 75.89, 40.14, 2.96, 'turf', 4.2],
  [115, 77.6, 44.84, 2.95, 'turf', 4.2],
  [120, 79.32, 49.54, 2.98, 'asphalt', 5, 'Turn 35° left, car park'],
  [125, 78.02, 54.37, 2.97, 'asphalt', 5],
  [130, 76.73, 59.2, 2.99, 'asphalt', 5],
  [132, 76.21, 61.13, 2.99, 'asphalt', 5, 'Old well 3 m on the dry side, head 2.60'],
  [135, 75.43, 64.03, 2.98, 'asphalt', 5],
  [142, 73.62, 70.79, 2.98, 'loose-gravel', 5, 'Parking strip to 148: unsuitable'],
  [145, 72.84, 73.69, 2.97, 'loose-gravel', 5],
  [148, 72.07, 76.59, 2.99, 'turf', 5],
  [150, 71.55, 78.52, 3.04, 'turf', 5, 'Turn 25° left'],
  [160, 65.12, 86.18, 3.18, 'turf', 5],
  [170, 58.69, 93.84, 3.33, 'turf', 5],
  [180, 52.27, 101.5, 3.56, 'turf', 5, 'Tie-in: bank 3.56'],
])

/** Leaves Low road at chainage 30 and runs straight to its chainage 70, 2.9 m landward. */
export const BEHIND_THE_KERB_STATIONS: readonly Station[] = stations([
  [0, 30, 0, 3.07, 'concrete', 5, 'Leaves Low road at ch 30'],
  [10, 39.97, 0.79, 3.02, 'concrete', 5],
  [15, 44.95, 1.19, 2.98, 'concrete', 5],
  [20, 49.94, 1.58, 2.98, 'concrete', 5],
  [26.08, 56, 2.07, 2.98, 'turf', 5],
  [32.31, 62.21, 2.56, 2.87, 'turf', 5, 'Meets Low road at ch 70'],
])

/**
 * Low road as it can be laid: swung 3 m landward between ch 140 and 148, onto asphalt. Nobody has
 * surveyed the two stations there, so they have no place in the grid.
 */
export const OFF_THE_GRAVEL_STATIONS: readonly Station[] = LOW_ROAD_STATIONS.map((station) =>
  station.surface === 'loose-gravel'
    ? {
        ...station,
        x: null,
        y: null,
        groundLevel: 2.97,
        surface: 'asphalt',
        note: 'Swung 3 m landward onto asphalt',
      }
    : station,
)
