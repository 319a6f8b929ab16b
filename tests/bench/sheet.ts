import { cpus } from 'node:os'
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

/** Another level each time, so that no layout is remembered from the time before. */
const times = Array.from({ length: 9 }, (_, i) => {
  const changed = { ...sheet, number: `FQ-1${i}`, groundLevel: 2.87 + 0.001 * i }
  const started = performance.now()
  typesetSheet(typesetter, changed)
  return performance.now() - started
}).sort((a, b) => a - b)

const median = times[4]!
const scaled = (median * PAGES) / pages
process.stdout.write(
  `${cpus()[0]?.model ?? 'unknown processor'}\n` +
    `sheet of ${pages} pages: median ${median.toFixed(0)} ms, ${times[0]!.toFixed(0)} to ${times[8]!.toFixed(0)} ms\n` +
    `that is ${scaled.toFixed(0)} ms for ${PAGES} pages; ${GATE} ms allowed\n`,
)
if (scaled > GATE) process.exitCode = 1
