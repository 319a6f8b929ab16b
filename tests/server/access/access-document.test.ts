import { readFileSync } from 'node:fs'
import { format } from 'prettier'
import { expect, it } from 'vitest'
import { operationsOf } from '../../../server/app'
import { accessDocument } from '../../../server/http/access-document'
import { freshApp } from '../../support/server-app'

it(
  'docs/access.md says who may what today; npm run docs:access writes it anew',
  { timeout: 30_000 },
  async () => {
    const written = readFileSync('docs/access.md', 'utf8')
    const current = accessDocument(operationsOf(freshApp().app))
    expect(written).toBe(await format(current, { parser: 'markdown' }))
  },
)
