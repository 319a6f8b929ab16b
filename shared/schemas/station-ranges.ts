/** Bounds of a survey; they catch millimetres typed as metres, not hills. */
export const STATION_RANGES = {
  chainage: { min: 0, max: 100_000, unit: 'm' },
  groundLevel: { min: -500, max: 9000, unit: 'm' },
  clearWidth: { min: 0, max: 1000, unit: 'm' },
} as const
