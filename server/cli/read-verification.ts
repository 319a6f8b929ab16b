import { readdirSync, readFileSync } from 'node:fs'
import { format } from 'prettier'
import { CHECK_ROWS, REFERENCE_ROWS } from '../../shared/verification'
import { recompute } from '../../shared/verification/recompute'
import type { MutationResults } from './mutation/folder-result'
import { verificationDocument } from './verification-document'

/** docs/verification.md as it must be today. */
export function currentVerification(): Promise<string> {
  const text = verificationDocument({
    rows: recompute(CHECK_ROWS),
    references: REFERENCE_ROWS,
    mutation: JSON.parse(readFileSync('docs/mutation.json', 'utf8')) as MutationResults,
    folders: engineFolders(),
  })
  return format(text, { parser: 'markdown', printWidth: 100 })
}

/** Every folder of shared/calc, and shared/checks with those below it. */
function engineFolders(): readonly string[] {
  return [...foldersIn('calc'), 'checks', ...foldersIn('checks')]
}

function foldersIn(part: string): readonly string[] {
  return readdirSync(`shared/${part}`, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map(({ name }) => `${part}/${name}`)
    .sort()
}
