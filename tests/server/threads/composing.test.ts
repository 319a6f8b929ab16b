import { afterAll, describe, expect, it } from 'vitest'
import { sheetFrom } from '../../../server/batch/sheet-input'
import { ConflictError } from '../../../server/errors'
import {
  assertDerives,
  documentOf,
  frozenDocument,
  linesOf,
  stopComposing,
} from '../../../server/modules/sheets/composing'
import { TypesettingError } from '../../../server/typesetting/typesetting-error'
import goldens from '../../golden/section.json'

afterAll(stopComposing)

const DEFAULTS = { name: 'Ferry Quay', date: '2031-03-04', software: 'Toehold test' }
const sheet = sheetFrom({ case: goldens[0]!.case }, DEFAULTS)

describe('sheets in a thread of their own', { timeout: 120_000 }, () => {
  it('are set while this thread goes on', async () => {
    await assertDerives(sheet)
    let turns = 0
    const turning = setInterval(() => (turns += 1), 1)
    const { pdf, pages } = await frozenDocument(sheet)
    clearInterval(turning)
    expect(pdf.subarray(0, 5).toString()).toBe('%PDF-')
    expect(pages).toBeGreaterThan(5)
    // Had it been set here, no turn would have come before the answer.
    expect(turns).toBeGreaterThan(10)
  })

  it('keep what stopped them: a line that does not agree, a picture that is none', async () => {
    const { vertical } = sheet.result
    const touched = { ...vertical, uplift: vertical.uplift * (1 + 1e-6) }
    const wrong = { ...sheet, result: { ...sheet.result, vertical: touched } }
    const refused = assertDerives(wrong)
    await expect(refused).rejects.toThrow(ConflictError)
    await expect(refused).rejects.toThrow(/There is no sheet: line \d+\.\d+ \(uplift\)/)
    const picture = { mediaType: 'image/png' as const, base64: 'AAAA' }
    const broken = { ...sheet, photographs: [{ caption: 'none', picture, fileId: 'none' }] }
    await expect(frozenDocument(broken)).rejects.toThrow(TypesettingError)
  })

  it('are asked for once, and again where it came to nothing', async () => {
    const [one, other] = [documentOf('a', sheet), documentOf('a', sheet)]
    expect(await one).toBe(await other)
    const stopped = documentOf('b', sheet)
    await stopComposing()
    await expect(stopped).rejects.toThrow('the thread ended before it answered')
    expect((await linesOf(sheet)).get('2.1')).toBeGreaterThan(0)
    expect((await documentOf('b', sheet)).length).toBeGreaterThan(1000)
  })
})
