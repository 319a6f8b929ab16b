/** A clock that moves only when it is told to [ms since 1970]. */
export function movingClock(start = Date.UTC(2031, 2, 3, 22)) {
  let moment = start
  return {
    now: () => moment,
    advance: (by: number) => {
      moment += by
    },
  }
}

export const SECOND = 1000
export const MINUTE = 60 * SECOND
export const HOUR = 60 * MINUTE
export const DAY = 24 * HOUR
