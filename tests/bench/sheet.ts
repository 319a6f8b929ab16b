import { cpus, loadavg } from 'node:os'
import { sampleSheets } from '../../server/demo/sample-sheets'
import { createTypesetter } from '../../server/typesetting/typesetter'
import { typesetSheet } from '../../server/typesetting/typeset-sheet'

/** Upper bound for a sheet of 12 pages, derivation and verification included [ms]. */
const GATE = 600
const PAGES = 12

const sheet = (await sampleSheets()).get('approved')
if (!sheet) throw new Error('the sample is missing')
const typesetter = createTypesetter()
const first = typesetSheet(typesetter, sheet)
const pages = (first.toString('latin1').match(/\/Type\s*\/Page\b/g) ?? []).length

/** Wall clock and processor time of one sheet [ms]. */
interface Taken {
  readonly wall: number
  readonly processor: number
}

/** Another level each time, so that no layout is remembered from the time before. */
const taken: readonly Taken[] = Array.from({ length: 9 }, (_, i) => {
  const changed = { ...sheet, number: `FQ-1${i}`, groundLevel: 2.87 + 0.001 * i }
  const [started, before] = [performance.now(), process.cpuUsage()]
  typesetSheet(typesetter, changed)
  const { user, system } = process.cpuUsage(before)
  return { wall: performance.now() - started, processor: (user + system) / 1000 }
})

function medianFor(pagesWanted: number, of: (one: Taken) => number): number {
  const sorted = taken.map(of).sort((a, b) => a - b)
  return (sorted[4]! * pagesWanted) / pages
}

const [wall, processor] = [medianFor(PAGES, (t) => t.wall), medianFor(PAGES, (t) => t.processor)]
process.stdout.write(
  `${cpus()[0]?.model ?? 'unknown processor'}, load ${loadavg()[0]!.toFixed(1)}\n` +
    `sheet of ${pages} pages, derived, verified, composed and set; medians for ${PAGES} pages:\n` +
    `wall clock ${wall.toFixed(0)} ms, ${GATE} ms allowed; processor ${processor.toFixed(0)} ms\n`,
)
if (wall > GATE) process.exitCode = 1
