import { describe, expect, it } from 'vitest'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES } from '../../../src/quick-check/choices'
import { drawingCaption, type PictureOf } from '../../../src/quick-check/drawing-caption'

function captionOf(values: Partial<FieldValues> = {}, more: Partial<PictureOf> = {}) {
  const picture: PictureOf = {
    section: sectionCase({ values: { ...INITIAL_VALUES, ...values }, choices: INITIAL_CHOICES }),
    surface: 'turf',
    verdict: 'holds',
    answer: 'Holds: 0.420 m of water.',
    holds: true,
    datum: '',
    hours: [],
    isStale: false,
    link: 'https://example.org/?v=1&depth=0.42',
    ...more,
  }
  const now = new Date(2026, 11, 1, 13, 20)
  return drawingCaption(picture, 'metric', now).map(({ text }) => text.replace(/\u00a0/g, ' '))
}

describe('the caption of a picture', () => {
  it('says the answer first, then what it rests on, its conditions, cautions, date and version', () => {
    const [answer, rests, conditions, cautions, made, link] = captionOf()
    expect(answer).toBe('Holds: 0.420 m of water.')
    expect(rests).toMatch(/^Rests on: tube 0\.70 m, skirt 2\.20 m, .* Turf.*friction 0\.45/)
    expect(conditions).toMatch(/^Holds only if .* 15 kPa .* no water stands on the dry side\.$/)
    expect(cautions).toContain('A design check, not a guarantee.')
    expect(cautions).toContain('Leave before the water reaches the leave level.')
    expect(made).toMatch(/^Toehold \d+\.\d+\.\d+, Quick check, 1 December 2026/)
    expect(link).toBe('https://example.org/?v=1&depth=0.42')
  })

  it('names the datum, the dry-side water, the hours and what is stale', () => {
    const hours = [
      {
        key: 'quickCheck.hours.cold.limp',
        values: { temperature: { value: 0, kind: 'temperature' as const } },
      },
    ]
    const said = captionOf({ dryDepth: 0.05 }, { datum: 'Test datum', isStale: true, hours })
    expect(said[0]).toMatch(/^Not computed from .* Levels above Test datum\.$/)
    expect(said[1]).toMatch(/^In the coldest hour \(0 °C\) the tube is limp/)
    expect(said.join(' ')).toContain('no more than 0.05 m of water stands on the dry side')
  })

  it('never says that a barrier without its skirt holds', () => {
    const answer = 'Does not hold: 0.420 m of water.'
    const said = captionOf({ skirtLength: 0 }, { verdict: 'fails', holds: false, answer })
    expect(said.join(' ')).not.toMatch(/\bholds\b/i)
    expect(captionOf({}, { verdict: 'fails', holds: false })[2]).toMatch(
      /^These figures stand only/,
    )
  })
})
