import { OutOfRangeError, rangeFault } from '../../errors'

/** Area of the pond at a level. */
export interface StageArea {
  /** Level [m], in one datum. */
  readonly level: number
  /** Water surface at that level [m²]. */
  readonly area: number
}

/** Storage of the dry side: area linear between levels, constant above the last. */
export interface StageStorage {
  /** Volume below a level [m³]; 0 below the first. */
  readonly volumeAt: (level: number) => number
  /** Level of a volume [m]. */
  readonly levelAt: (volume: number) => number
  readonly lowest: number
}

interface Slice extends StageArea {
  /** Volume below this level [m³]. */
  readonly below: number
  /** Growth of the area with the level above it [m]. */
  readonly slope: number
}

/**
 * Storage from a table of areas by level. The volume is exact for the linear areas; its inverse is
 * solved in closed form.
 *
 * @param table One row or more, levels rising, areas 0 or more and the last above 0.
 * @throws OutOfRangeError for levels that do not rise, or areas that are not there.
 */
export function stageStorage(table: readonly StageArea[]): StageStorage {
  assertTable(table)
  const slices = slicesOf(table)
  const lowest = slices[0]!.level
  return {
    lowest,
    volumeAt: (level) => {
      const slice = lastAtOrBelow(slices, (candidate) => candidate.level <= level)
      if (!slice) return 0
      const rise = level - slice.level
      return slice.below + rise * (slice.area + (slice.slope * rise) / 2)
    },
    levelAt: (volume) => {
      const slice = lastAtOrBelow(slices, (candidate) => candidate.below <= volume) ?? slices[0]!
      return slice.level + riseFor(slice, Math.max(0, volume - slice.below))
    },
  }
}

function slicesOf(table: readonly StageArea[]): readonly Slice[] {
  let below = 0
  return table.map((row, i) => {
    const before = table[i - 1]
    if (before) below += ((row.level - before.level) * (row.area + before.area)) / 2
    const next = table[i + 1]
    const slope = next ? (next.area - row.area) / (next.level - row.level) : 0
    return { ...row, below, slope }
  })
}

function lastAtOrBelow(
  slices: readonly Slice[],
  isBelow: (slice: Slice) => boolean,
): Slice | undefined {
  return slices.filter(isBelow).at(-1)
}

/** Rise in which a slice takes up a volume: area · z + slope · z²/2 = volume, without cancellation. */
function riseFor({ area, slope }: Slice, volume: number): number {
  if (volume === 0) return 0
  return (2 * volume) / (area + Math.sqrt(area ** 2 + 2 * slope * volume))
}

function assertTable(table: readonly StageArea[]): void {
  const faults = table.flatMap(({ level, area }, i) => {
    const before = table[i - 1]
    const rises = !before || level > before.level
    const floor = { min: before?.level ?? -Infinity, minExcluded: true, max: Infinity, unit: 'm' }
    const areaFloor = { min: 0, minExcluded: i === table.length - 1, max: Infinity, unit: 'm²' }
    const hasArea = area > 0 || (area === 0 && i < table.length - 1)
    return [
      ...(rises && Number.isFinite(level) ? [] : [rangeFault(`storage[${i}].level`, level, floor)]),
      ...(hasArea ? [] : [rangeFault(`storage[${i}].area`, area, areaFloor)]),
    ]
  })
  if (table.length === 0) {
    faults.push(rangeFault('storage', table.length, { min: 1, max: Infinity, unit: 'rows' }))
  }
  if (faults.length > 0) throw new OutOfRangeError(faults)
}
