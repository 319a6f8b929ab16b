import { spawnSync } from 'node:child_process'
import { mkdirSync, writeFileSync } from 'node:fs'
import { sampleSheets } from '../demo/sample-sheets'
import { createTypesetter } from '../typesetting/typesetter'
import { typesetSheet } from '../typesetting/typeset-sheet'

const FOLDER = 'docs/samples'
const PICTURES = 'docs/pictures'

/** Pictures of all pages, where poppler is there to make them. */
function paint(file: string, name: string): void {
  spawnSync('pdftoppm', ['-r', '72', '-png', file, `${PICTURES}/${name}`], { stdio: 'inherit' })
}

mkdirSync(FOLDER, { recursive: true })
mkdirSync(PICTURES, { recursive: true })
const typesetter = createTypesetter()
for (const [name, sheet] of await sampleSheets()) {
  const file = `${FOLDER}/sheet-${name}.pdf`
  writeFileSync(file, typesetSheet(typesetter, sheet))
  paint(file, `sheet-${name}`)
  process.stdout.write(`${file}\n`)
}
