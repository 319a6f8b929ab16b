import { expect, it } from 'vitest'
import { deedsTexts } from '../../shared/texts/deeds.en'
import { sourceFiles } from '../support/source-files'

const known = Object.entries(deedsTexts.did).flatMap(([subject, deeds]) =>
  Object.keys(deeds).map((deed) => `${subject}.${deed}`),
)
const server = sourceFiles('server', /\.ts$/)
  .map(({ text }) => text)
  .join('\n')

it('every deed that the server records has words for the audit trail', () => {
  const subjects = Object.keys(deedsTexts.did).join('|')
  const recorded = server.matchAll(new RegExp(`'((?:${subjects})\\.[a-z-]+)'`, 'g'))
  // Names of files are no deeds.
  const isFile = (deed: string) => /\.(?:css|eml|js|json|pdf)$/.test(deed)
  const deeds = [...recorded].map(([, deed = '']) => deed).filter((deed) => !isFile(deed))
  expect(deeds.length).toBeGreaterThan(30)
  expect([...new Set(deeds)].filter((deed) => !known.includes(deed))).toEqual([])
})
