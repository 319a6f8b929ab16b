import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { createTypesetter } from '../../../server/typesetting/typesetter'
import { TypesettingError } from '../../../server/typesetting/typesetting-error'
import { readAttachment } from '../../../server/typesetting/read-attachment'
import { typesetSheet } from '../../../server/typesetting/typeset-sheet'
import { sheetFrom } from '../../../server/batch/sheet-input'
import { writeSheet } from '../../../server/cli/calc-sheet'
import { DerivationDisagreementError } from '../../../shared/derivation/disagreement'
import { sheetSchema, type Sheet } from '../../../shared/schemas/sheet'
import { formatQuantity } from '../../../shared/units'
import goldens from '../../golden/section.json'

const typesetter = createTypesetter()
const folder = mkdtempSync(join(tmpdir(), 'toehold-sheet-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

const DEFAULTS = { name: 'Ferry Quay', date: '2031-03-04', software: 'Toehold test' }

function sheetOf(index: number, words: object = {}): Sheet {
  return sheetFrom({ case: goldens[index]!.case, ...words }, DEFAULTS)
}

/** Runs a tool of poppler; what it says on standard error is a complaint about the file. */
function poppler(tool: string, words: readonly string[]): string {
  const { stdout, stderr, status, error } = spawnSync(tool, words, { encoding: 'utf8' })
  if (error) throw error
  expect(stderr).toBe('')
  expect(status).toBe(0)
  return stdout
}

function fileOf(pdf: Buffer): string {
  const file = join(folder, `${Math.round(performance.now() * 1000)}.pdf`)
  writeFileSync(file, pdf)
  return file
}

/** Text with every kind of blank made one. */
function textOf(pdf: Buffer): string {
  return poppler('pdftotext', ['-layout', fileOf(pdf), '-']).replace(/[\s\u00a0\u202f]+/g, ' ')
}

describe('a sheet as PDF', { timeout: 60_000 }, () => {
  it.each([0, 3, 7, 12, 20])('prints the figures of calc section: golden case %i', (index) => {
    const sheet = sheetOf(index)
    const { result } = sheet
    const text = textOf(typesetSheet(typesetter, sheet))
    const shown = (value: number, kind: 'ratio' | 'length', rounding?: 'down') =>
      formatQuantity(rounding ? { value, kind, rounding } : { value, kind }, 'metric').replace(
        '\u00a0',
        ' ',
      )
    for (const id of ['sliding', 'overturning', 'flotation', 'skirt'] as const) {
      const { factor, verdict } = result[id]
      const rounding = verdict === 'fails' ? 'down' : undefined
      if (factor !== null) expect(text).toContain(shown(factor, 'ratio', rounding))
    }
    if (result.holdsTo.from !== null) {
      expect(text).toContain(shown(result.holdsTo.depth, 'length', 'down'))
    }
    const { available } = result.freeboard
    if (available !== null) expect(text).toContain(shown(available, 'length'))
    for (const force of [result.thrust.total, result.vertical.uplift, result.vertical.net]) {
      if (force !== 0) expect(text).toContain(`${Number((force / 1000).toPrecision(3))}`)
    }
  })

  it('carries itself as JSON, and the same sheet gives the same bytes', () => {
    const sheet = sheetOf(0)
    const pdf = typesetSheet(typesetter, sheet)
    const file = fileOf(pdf)
    const target = join(folder, 'out.json')
    poppler('pdfdetach', ['-save', '1', '-o', target, file])
    const inside = readFileSync(target, 'utf8')
    expect(sheetSchema.parse(JSON.parse(inside))).toEqual(sheet)
    expect(readAttachment(pdf)).toBe(inside)
    const again = typesetSheet(createTypesetter(), sheetSchema.parse(JSON.parse(inside)))
    expect(again.equals(pdf)).toBe(true)
  })

  it('is tagged, archivable, and opens without a complaint', () => {
    const pdf = typesetSheet(typesetter, sheetOf(1))
    const info = poppler('pdfinfo', [fileOf(pdf)])
    expect(info).toMatch(/Tagged:\s+yes/)
    expect(info).toMatch(/Page size:.*A4/)
    const meta = pdf.toString('latin1')
    expect(meta).toMatch(/pdfaid:part[^0-9]*3/)
    expect(meta).toMatch(/pdfaid:conformance[^A-Z]*A/)
    expect(meta).toContain('/Outlines')
  })

  it('prints a hostile name as it is written', () => {
    const name = '#read("/etc/passwd") $x^2$ *b* \\ #sys.inputs'
    const text = textOf(typesetSheet(typesetter, sheetOf(0, { project: { name } })))
    expect(text).toContain(name)
    expect(text).not.toContain('root:')
  })

  it.each([
    ['draft', 'DRAFT'],
    ['in-checking', 'NOT CHECKED'],
    ['issued-for-information', 'NOT CHECKED'],
    ['superseded', 'SUPERSEDED'],
  ] as const)('bears its band on every page while %s', (status, band) => {
    const sheet = sheetOf(0, { status })
    const file = fileOf(typesetSheet(typesetter, sheet))
    const pages = poppler('pdftotext', ['-raw', file, '-']).split('\f').slice(0, -1)
    expect(pages.length).toBeGreaterThan(5)
    expect(pages.filter((page) => !page.replace(/\s+/g, ' ').includes(band))).toEqual([])
  })

  it('bears none once approved, and sets US Letter in US units', () => {
    const sheet = sheetOf(0, { status: 'approved', paper: 'us-letter', units: 'us' })
    const pdf = typesetSheet(typesetter, sheet)
    const text = textOf(pdf)
    expect(text).not.toMatch(/DRAFT|NOT CHECKED|SUPERSEDED/)
    expect(text).toContain('lbf/ft')
    expect(poppler('pdfinfo', [fileOf(pdf)])).toMatch(/612 x 792/)
  })

  it('is not made from a result that was touched, and says which line', () => {
    const sheet = sheetOf(0)
    const { vertical } = sheet.result
    const uplift = vertical.uplift * (1 + 1e-6)
    const wrong = { ...sheet, result: { ...sheet.result, vertical: { ...vertical, uplift } } }
    const make = () => typesetSheet(typesetter, wrong)
    expect(make).toThrow(DerivationDisagreementError)
    expect(make).toThrow(/uplift/)
  })
})

describe('calc sheet', () => {
  const request = { source: 'quay.json', software: 'Toehold test' }

  it('writes JSON that is a sheet again, and a table with a line for each line', () => {
    const [json, csv] = [join(folder, 'quay.json'), join(folder, 'quay.csv')]
    writeSheet(goldens[0]!.case, { ...request, output: json })
    const sheet = sheetSchema.parse(JSON.parse(readFileSync(json, 'utf8')))
    expect(sheet.project.name).toBe('quay')
    writeSheet(sheet, { ...request, output: csv })
    const rows = readFileSync(csv, 'utf8').trim().split('\r\n')
    expect(rows.length).toBeGreaterThan(50)
    expect(rows.find((row) => row.startsWith('2.1,'))).toContain('Thrust of still water')
  })

  it('names the field at fault inside the case', () => {
    const wrong = { case: { ...goldens[0]!.case, gravity: 12 } }
    const make = () => sheetFrom(wrong, DEFAULTS)
    expect(make).toThrow('case.gravity: 12 is not allowed; it must be 9.7 to 9.9 m/s²')
    expect(() => sheetFrom([], DEFAULTS)).toThrow(/it must be a case/)
    const nameless = { case: goldens[0]!.case, project: { name: '' } }
    expect(() => sheetFrom(nameless, DEFAULTS)).toThrow(/project\.name/)
  })
})

describe('the typesetter', () => {
  it('refuses data that its template cannot set', () => {
    expect(() => typesetter.typeset('sheet', { data: {} })).toThrow(TypesettingError)
  })
})
