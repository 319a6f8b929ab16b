import { nextTick } from 'vue'

const NAME = 'toehold:input'

/** Entries are kept for whoever measures, but not without bound. */
const MOST_ENTRIES = 2000

let entries = 0

/**
 * Runs one input and measures, as `toehold:input`, the script from the event to the updated DOM:
 * calculation, rendering and patching.
 */
export async function timedInput(apply: () => void): Promise<void> {
  const start = performance.now()
  apply()
  await nextTick()
  performance.measure(NAME, { start, end: performance.now() })
  entries += 1
  if (entries % MOST_ENTRIES === 0) performance.clearMeasures(NAME)
}
