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
  // A file name of a mail and the like are no deeds.
  const deeds = [...recorded].map(([, deed = '']) => deed).filter((deed) => deed !== 'mail.eml')
  expect(deeds.length).toBeGreaterThan(30)
  expect([...new Set(deeds)].filter((deed) => !known.includes(deed))).toEqual([])
})
