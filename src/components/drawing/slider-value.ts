/** What a slider may be. */
export interface SliderRange {
  readonly min: number
  readonly max: number
  /** Distance of neighbouring values. */
  readonly step: number
}

/** Steps of Page Up, Page Down and an arrow with Shift. */
const PAGE = 10

/** The nearest value on the grid of steps inside the range. */
export function snapped(value: number, { min, max, step }: SliderRange): number {
  const onGrid = Number((Math.round(value / step) * step).toPrecision(12))
  return Math.min(max, Math.max(min, onGrid))
}

/** The value after a key; null where the key is not for a slider. */
export function valueAfterKey(
  value: number,
  range: SliderRange,
  { key, shiftKey }: Pick<KeyboardEvent, 'key' | 'shiftKey'>,
): number | null {
  const arrow = shiftKey ? PAGE : 1
  switch (key) {
    case 'ArrowUp':
    case 'ArrowRight':
      return snapped(value + arrow * range.step, range)
    case 'ArrowDown':
    case 'ArrowLeft':
      return snapped(value - arrow * range.step, range)
    case 'PageUp':
      return snapped(value + PAGE * range.step, range)
    case 'PageDown':
      return snapped(value - PAGE * range.step, range)
    case 'Home':
      return range.min
    case 'End':
      return range.max
    default:
      return null
  }
}
