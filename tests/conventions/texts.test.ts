import { describe, expect, it } from 'vitest'
import { texts } from '../../shared/texts'
import { classAreaTexts } from '../../shared/texts/class-area'
import { demonstratorAreaTexts } from '../../shared/texts/demonstrator-area'
import { areaTexts } from '../../shared/texts/member-area'
import { methodAreaTexts } from '../../shared/texts/method-area'
import { orderTexts } from '../../shared/texts/order.en'
import { sectionDetails } from '../../shared/texts/section-details.en'
import { verifyAreaTexts } from '../../shared/texts/verify-area'
import { sourceFiles } from '../support/source-files'

/** Every text by its full key. */
function leaves(node: object, prefix = ''): Map<string, string> {
  const found = new Map<string, string>()
  for (const [name, value] of Object.entries(node) as [string, string | object][]) {
    const key = prefix === '' ? name : `${prefix}.${name}`
    if (typeof value === 'string') found.set(key, value)
    else for (const [inner, text] of leaves(value, key)) found.set(inner, text)
  }
  return found
}

/** What is loaded at once, and what comes with the area behind the sign-in and the Method page. */
const all = {
  ...texts.en,
  ...areaTexts.en,
  ...sectionDetails.en,
  ...methodAreaTexts.en,
  ...classAreaTexts.en,
  ...demonstratorAreaTexts.en,
  ...verifyAreaTexts.en,
  // Words of documents and pages that the server writes.
  deploymentOrder: orderTexts,
}
const keys = [...leaves(all).keys()]
const AREAS = Object.keys(all).join('|')

const sources = [...sourceFiles('src', /\.(ts|vue)$/), ...sourceFiles('shared', /\.ts$/)].filter(
  ({ path }) => !path.startsWith('shared/texts'),
)
/** Names with a dot stand in keys with a dash. The server names the deeds of the audit trail. */
const words = new Set(
  [...sources, ...sourceFiles('server', /\.ts$/)].flatMap(
    ({ text }) => text.replace(/(\d)\.(\d)/g, '$1-$2').match(/[\w-]+/g) ?? [],
  ),
)

interface UsedKey {
  readonly path: string
  readonly written: string
  /** Matches the keys that it can stand for; each group is a part that is only known at run time. */
  readonly pattern: RegExp
}

const LITERAL = new RegExp(`['"]((?:${AREAS})\\.[\\w.-]*[\\w-])['"]`, 'g')
const TEMPLATE = new RegExp('`((?:' + AREAS + ')\\.(?:[^`$]|\\$\\{[^}]*\\})*)`', 'g')

function usedKeys(): UsedKey[] {
  return sources.flatMap(({ path, text }) =>
    [...text.matchAll(LITERAL), ...text.matchAll(TEMPLATE)].map(([, written = '']) => {
      const parts = written.split(/\$\{[^}]*\}/).map((part) => part.replaceAll('.', '\\.'))
      return { path, written, pattern: new RegExp(`^${parts.join('([\\w-]+)')}$`) }
    }),
  )
}

/** The part that is filled in at run time must occur somewhere as a word of the program. */
function standsFor({ pattern }: UsedKey, key: string): boolean {
  const match = pattern.exec(key)
  return match !== null && match.slice(1).every((part) => words.has(part))
}

const allText = sources.map(({ text }) => text).join('\n')

/** A word of the program, or one with an ending such as "Short" that is put on at run time. */
function isComposed(part: string): boolean {
  if (words.has(part)) return true
  const [, stem = '', ending = ''] = /^(.+?)([A-Z][a-z]+)$/.exec(part) ?? []
  return words.has(stem) && allText.includes(`}${ending}`)
}

/** Drawings and the demonstrator name their texts without the area, through helpers of their own. */
function isNamedInScene(key: string): boolean {
  return /^(drawing|demonstrator)\./.test(key) && key.split('.').every(isComposed)
}

const templates = sourceFiles('server/typesetting/templates', /\.typ$/)
  .map(({ text }) => text)
  .join('\n')

/** The templates of documents print their labels by name. */
function isPrinted(key: string): boolean {
  return key.startsWith('sheet.word.') && templates.includes(key.replace('sheet.word', 'words'))
}

describe('texts of the interface', () => {
  const used = usedKeys()

  it('finds the keys that the program uses', () => {
    expect(used.length).toBeGreaterThan(100)
  })

  it('has every key that the program uses', () => {
    const missing = used.filter((use) => !keys.some((key) => standsFor(use, key)))
    expect(missing.map(({ path, written }) => `${path}: ${written}`)).toEqual([])
  })

  it('has no key that nothing uses', () => {
    const isUsed = (key: string) =>
      isNamedInScene(key) || isPrinted(key) || used.some((use) => standsFor(use, key))
    expect(keys.filter((key) => !isUsed(key))).toEqual([])
  })
})
