import { nextTick } from 'vue'

const NAME = 'toehold:input'
const START = `${NAME}:start`
const END = `${NAME}:end`

/** Entries are kept for whoever measures, but not without bound. */
const MOST_ENTRIES = 2000

/**
 * Runs one input and measures, as `toehold:input`, the script from the event to the updated DOM:
 * calculation, rendering and patching.
 */
export async function timedInput(apply: () => void): Promise<void> {
  performance.mark(START)
  apply()
  await nextTick()
  performance.mark(END)
  performance.measure(NAME, START, END)
  performance.clearMarks(START)
  performance.clearMarks(END)
  if (performance.getEntriesByName(NAME).length > MOST_ENTRIES) performance.clearMeasures(NAME)
}
