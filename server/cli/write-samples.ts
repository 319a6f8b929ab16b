import { mkdirSync, writeFileSync } from 'node:fs'
import { sampleSheets } from '../demo/sample-sheets'
import { createTypesetter } from '../typesetting/typesetter'
import { typesetSheet } from '../typesetting/typeset-sheet'

const FOLDER = 'docs/samples'

mkdirSync(FOLDER, { recursive: true })
const typesetter = createTypesetter()
for (const [name, sheet] of await sampleSheets()) {
  writeFileSync(`${FOLDER}/sheet-${name}.pdf`, typesetSheet(typesetter, sheet))
  process.stdout.write(`${FOLDER}/sheet-${name}.pdf\n`)
}
