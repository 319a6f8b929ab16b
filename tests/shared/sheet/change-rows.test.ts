import { describe, expect, it } from 'vitest'
import { checkSection } from '../../../shared/checks/section-check'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import { sheetSchema } from '../../../shared/schemas/sheet'
import { changeRows } from '../../../shared/sheet/change-rows'
import { sheetChanges } from '../../../shared/sheet/sheet-changes'
import { sheetWords } from '../../../shared/sheet/sheet-words'
import { exampleSection } from '../../../shared/verification/example-section'
import goldens from '../../golden/section.json'

function sheetOf(section: ReturnType<typeof parseSectionCase>, words: object = {}) {
  return sheetSchema.parse({
    ...{ project: { name: 'Quay' }, number: 'S-1', date: '2031-03-04', ...words },
    ...{ case: section, result: checkSection(section) },
  })
}

describe('what changed between two sheets', () => {
  it('is told in words and units, inputs before results before words', () => {
    const before = sheetOf(parseSectionCase(exampleSection()))
    const stronger = { ...exampleSection(), basis: 'usual', water: { depth: 0.42 } }
    const purpose = { purpose: 'For the flood plan.', conditions: ['the gully is plugged'] }
    const after = sheetOf(parseSectionCase(stronger), purpose)
    const rows = changeRows(sheetChanges(before, after), sheetWords('metric', 'QD'))
    const told = rows.map(({ name, before: was, after: is }) => `${name}: ${was} → ${is}`)
    expect(told).toContain('Check basis: Factor 1.5 throughout → Usual load case, 1.5')
    expect(told).toContain('Purpose: none → For the flood plan.')
    expect(told).toContain('Conditions: as it was → changed')
    expect(told.find((row) => row.startsWith('Depth of water: '))).toMatch(/→ 0\.420\u00a0m$/)
    expect(told.find((row) => row.startsWith('Thrust of still water: '))).toMatch(/kN\/m$/)
    const parts = rows.map(({ part }) => part)
    expect([...new Set(parts)]).toEqual(['inputs', 'results', 'words'])
    expect(parts).toEqual([...parts].sort())
  })

  it('shows no path, whatever changed', () => {
    const words = sheetWords('us', '')
    const sheets = goldens.map((golden, place) =>
      sheetOf(parseSectionCase(golden.case), {
        ...{ category: place % 4, units: place % 2 ? 'us' : 'metric', purpose: `No. ${place}` },
        ...{ groundLevel: place / 10, revision: `R${place}`, software: `v${place}` },
      }),
    )
    const names = sheets.slice(1).flatMap((sheet, place) => {
      const rows = changeRows(sheetChanges(sheets[place]!, sheet), words)
      return rows.flatMap(({ name, before, after }) => [name, before, after])
    })
    expect(names.length).toBeGreaterThan(500)
    // A path or the key of a missing text has a dot between letters.
    expect(names.filter((name) => /[a-z]\.[a-zA-Z]/.test(name))).toEqual([])
  })
})
