import { describe, expect, it } from 'vitest'
import { checkLine } from '../../../shared/checks/line-check'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { holdingProfile, holdsToAt } from '../../../shared/checks/holds-to'
import { OutOfRangeError } from '../../../shared/errors'
import { sheetSchema } from '../../../shared/schemas/sheet'
import { composeSheet } from '../../../shared/sheet/compose-sheet'
import { scenarioPart } from '../../../shared/sheet/scenario-sheet'
import { LOW_ROAD_SURVEY, lowRoadContent } from '../../support/ferry-quay'

const line = { ...LOW_ROAD_SURVEY, name: 'Low road', marks: [] }
const content = lowRoadContent({ waterLevel: 3.3 })

describe('a sheet of a place on a line', () => {
  const sections = checkLine(line, content).sections.filter(({ gap }) => gap === null)
  const beside = sections.filter(({ gripShare }) => gripShare < 1)

  it('holds to the level of the check of the line, also beside bends', () => {
    expect(beside.length).toBeGreaterThan(2)
    for (const section of sections) {
      // The middle of a section is its own; its lowest ground may be where two of them meet.
      const middle = (section.from + section.to) / 2
      const { gripShare, case: at, result } = scenarioPart(line, content, middle)
      expect(gripShare).toBe(section.gripShare)
      expect(result.sliding).toEqual(evaluateSection(at, section.gripShare).sliding)
    }
  })

  it('prints the share that bends leave, and derives with it', () => {
    const { from, to } = beside[0]!
    const part = scenarioPart(line, content, (from + to) / 2)
    const words = { project: { name: 'Quay' }, number: 'S-1', date: '2031-03-04' }
    const sheet = sheetSchema.parse({ ...words, ...part, line: null })
    const { inputs, groups } = composeSheet(sheet)
    expect(inputs.map(({ symbol }) => symbol.plain)).toContain('s_g')
    const sliding = groups.flatMap(({ lines }) => lines).find(({ id }) => id === 'slidingFactor')
    expect(sliding?.symbolic.plain).toContain('s_g')
    expect(sliding?.result.plain).toBe(part.result.sliding.factor!.toPrecision(3))
    expect(part.result.holdsTo.depth).toBeLessThan(
      holdsToAt(holdingProfile(part.case), part.case.water.depth).depth,
    )
  })

  it('is not made where nothing is laid, off the line, or beside a turn too sharp', () => {
    const refuses = (place: number, of = content, on = line) =>
      expect(() => scenarioPart(on, of, place)).toThrow(OutOfRangeError)
    refuses(-1)
    refuses(181)
    refuses(5, { ...content, sizes: [] })
    const back = [
      [0, 0, 0],
      [10, 10, 0],
      [20, 1, 2],
    ].map(([chainage, x, y]) => ({
      ...{ chainage: chainage!, x: x!, y: y!, groundLevel: 2.9, surface: 'turf' },
    }))
    refuses(5, content, { ...line, stations: back as unknown as typeof line.stations })
  })
})
