/** Start of a day that was chosen as `2026-03-29` in the time zone of the browser; undefined for none. */
export function dayStart(day: string): number | undefined {
  const start = new Date(`${day}T00:00`).getTime()
  return Number.isNaN(start) ? undefined : start
}

/** The last millisecond of a day, however long the day is where clocks change. */
export function dayEnd(day: string): number | undefined {
  const start = dayStart(day)
  if (start === undefined) return undefined
  const next = new Date(start)
  next.setDate(next.getDate() + 1)
  return next.getTime() - 1
}
