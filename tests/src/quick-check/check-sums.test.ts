import { describe, expect, it } from 'vitest'
import type { SummedCheck } from '../../../shared/checks/check-terms'
import { textResolver } from '../../../shared/texts/format-text'
import { sectionDetails } from '../../../shared/texts/section-details.en'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { checkSums } from '../../../src/quick-check/check-sums'
import { INITIAL_CHOICES, type Choices } from '../../../src/quick-check/choices'
import { givenText } from '../../../src/quick-check/field-text'

const say = textResolver(sectionDetails.en, 'metric')

function linesOf(
  values: Partial<FieldValues>,
  choices: Partial<Choices> = {},
  check: SummedCheck = 'sliding',
) {
  const section = sectionCase({
    values: { ...INITIAL_VALUES, ...values },
    choices: { ...INITIAL_CHOICES, ...choices },
  })
  const sums = checkSums(section, check, (value, kind) => givenText(value, kind, 'metric'))
  const line = ({ name, how, adds }: (typeof sums.sides)[number]['rows'][number]) =>
    [say(name), how.map(say).join(' × '), say(adds)].join('|').replace(/\u00a0/g, ' ')
  return {
    lines: sums.sides.flatMap(({ rows, totals }) => [...rows, ...totals].map(line)),
    notes: sums.notes.map(say),
  }
}

describe('the sums behind sliding', () => {
  it('list plain figures on level ground with global factors', () => {
    // Thrust ½ ρ g h² = 865.24 N/m (hydrostatics); own weight 4.8 × 9.81 = 47.09 N/m.
    const { lines, notes } = linesOf({})
    expect(lines[0]).toBe('Still water||865.2 N/m')
    expect(lines).toContain('Own weight||47.1 N/m')
    expect(lines.at(-1)).toMatch(/^times friction 0\.45\|\|/)
    expect(notes).toEqual([])
  })

  it('end with what soft ground bears, in sliding and skirt pull alike', () => {
    // By hand: 500 Pa × 2.32 m; in combination 2 of EN 1997-1 c_u is divided by 1.4.
    const soft = { undrainedStrength: 500 }
    expect(linesOf(soft).lines.at(-1)).toMatch(/^soft ground bears no more.*\|1,?160\.0 N\/m$/)
    const factored = linesOf(soft, { basis: 'partial-ec7' }).lines.at(-1)
    expect(factored).toMatch(/^soft ground bears no more.*\|828\.6 N\/m$/)
    const skirt = linesOf(soft, {}, 'skirt').lines
    expect(skirt.some((line) => line.startsWith('Friction under the skirt'))).toBe(true)
    expect(skirt.at(-1)).toMatch(/^soft ground bears no more/)
    expect(linesOf({ undrainedStrength: 900_000, friction: 0.3 }).lines.at(-1)).toMatch(/^times/)
  })

  it('name the factors and the slope where there are any', () => {
    const { lines, notes } = linesOf({ fall: 0.03, dryDepth: 0.05 }, { basis: 'partial-ec7' })
    const of = (name: string) => lines.filter((line) => line.startsWith(name))
    expect(of('Lift of the tube by the water on the dry side')).toHaveLength(2)
    expect(of('Still water')[0]).toMatch(/865\.2 N\/m × cos β/)
    expect(lines.at(-1)).toMatch(/^times friction 0\.45 \/ 1\.25\|\|/)
    expect(notes[0]).toMatch(/^Combination 2 of EN 1997-1/)
    expect(notes[1]).toContain('tan β = 3')
  })
})
