import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { folderResult, withoutSurvivors } from '../../../server/cli/mutation/folder-result'
import { currentVerification } from '../../../server/cli/read-verification'
import { verificationDocument } from '../../../server/cli/verification-document'

it('docs/verification.md is what the data say today; npm run docs:verification writes it anew', async () => {
  expect(readFileSync('docs/verification.md', 'utf8')).toBe(await currentVerification())
})

describe('the document', () => {
  const row = {
    id: 'x',
    topic: 'ground',
    title: 'A case',
    source: 'a book',
    tag: 'published',
    passes: false,
    figures: [
      { label: 'q', printed: '1.0', unit: 'm', computed: null, difference: null, passes: false },
    ],
  } as const

  it('says so when a row fails, and which folders nobody measured', () => {
    const text = verificationDocument({
      rows: [row],
      references: [],
      mutation: { tool: 'a tool', folders: {} },
      folders: ['calc/ground'],
    })
    expect(text).toContain('1 published, 0 from memory, 0 derived, 0 common practice')
    expect(text).toContain('**Not all pass: A case.**')
    expect(text).toContain('| A case | q | 1.0 m | – | – | **fail** | a book (published) |')
    expect(text).toContain('Not measured yet: `calc/ground`.')
  })
})

describe('figures of a mutation run', () => {
  const place = { start: { line: 2, column: 3 }, end: { line: 2, column: 8 } }
  const mutant = (status: string) => ({
    mutatorName: 'EqualityOperator',
    replacement: 'a < b',
    status,
    location: place,
  })
  const report = {
    files: {
      'shared/calc/ground/a.ts': {
        source: 'const x =\n  a > b ? 1 : 2\n',
        mutants: ['Killed', 'Timeout', 'Survived', 'Ignored', 'CompileError'].map(mutant),
      },
      'shared/calc/air/b.ts': { source: '', mutants: [mutant('Killed')] },
    },
  }
  const of = { folder: 'calc/ground', measured: '2026-12-01', before: undefined }

  it('counts what the folder has, and quotes what survived', () => {
    expect(folderResult(report, of)).toEqual({
      measured: '2026-12-01',
      killed: 2,
      survived: 1,
      survivors: [{ file: 'calc/ground/a.ts', line: 2, from: 'a > b', to: 'a < b', reason: '' }],
    })
  })

  it('lets run again what survived', () => {
    const kept = withoutSurvivors(report).files['shared/calc/ground/a.ts']!
    expect(kept.mutants.map(({ status }) => status)).not.toContain('Survived')
    expect(kept.mutants).toHaveLength(4)
  })

  it('keeps the reason that somebody wrote beside the same survivor', () => {
    const before = folderResult(report, of)
    const [survivor] = before.survivors
    const known = { ...before, survivors: [{ ...survivor!, line: 9, reason: 'cannot be seen' }] }
    const again = folderResult(report, { ...of, before: known })
    expect(again.survivors[0]!.reason).toBe('cannot be seen')
  })
})
