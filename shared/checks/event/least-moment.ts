import type { AtMoment } from './event-answer'
import type { EventMoment } from './event-trace'

/** Least value over all moments and when it is first there; null where no moment has one. */
export function least(
  moments: readonly EventMoment[],
  read: (moment: EventMoment) => number | null,
): AtMoment | null {
  return moments.reduce<AtMoment | null>((found, moment) => {
    const value = read(moment)
    if (value === null || (found && found.value <= value)) return found
    return { time: moment.time, value }
  }, null)
}
