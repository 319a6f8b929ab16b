import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = fileURLToPath(new URL('../../', import.meta.url))

export interface SourceFile {
  readonly path: string
  readonly text: string
}

/** Source files under a folder of the project, with their text. */
export function sourceFiles(folder: string, extension: RegExp): SourceFile[] {
  return readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
    .filter((name) => extension.test(name))
    .map((name) => join(folder, name))
    .map((path) => ({ path, text: readFileSync(join(root, path), 'utf8') }))
}
