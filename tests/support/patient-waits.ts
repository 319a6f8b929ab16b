/**
 * How long a test of a page waits for what it looks for. The second that is usual is short for a
 * machine that runs other tests at the same time; a test that passes does not wait longer.
 */
const PATIENCE = 10_000

if (typeof document !== 'undefined') {
  const { configure } = await import('@testing-library/vue')
  configure({ asyncUtilTimeout: PATIENCE })
}

export {}
