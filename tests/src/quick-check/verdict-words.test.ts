import { describe, expect, it } from 'vitest'
import { texts } from '../../../shared/texts'
import { textResolver } from '../../../shared/texts/format-text'
import {
  holdsToWords,
  leaveWords,
  shapeWords,
  waterWords,
} from '../../../src/quick-check/verdict-words'

const say = textResolver(texts.en, 'metric')
const depthOnly = { depth: 0.42, level: null, ground: null }
const withLevel = { depth: 0.55, level: 3.42, ground: 2.87 }
const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('the verdict in words', () => {
  it('tells the level first, with the depth in brackets, once a ground level is known', () => {
    expect(plain(waterWords(say, depthOnly))).toBe('0.420 m of water')
    expect(plain(waterWords(say, withLevel))).toBe('Level 3.420 m (0.550 m of water)')
  })

  it('rounds what it holds to down to a millimetre', () => {
    const holdsTo = { from: 0, depth: 0.48996, check: 'sliding' } as const
    expect(plain(holdsToWords(say, holdsTo, depthOnly, false))).toBe(
      'holds to 0.489 m, then slides',
    )
    expect(plain(holdsToWords(say, holdsTo, withLevel, false))).toBe(
      'holds only to 3.359 m (0.489 m), then slides',
    )
  })

  it('names where a holding interval starts above the ground', () => {
    const holdsTo = { from: 0.1201, depth: 0.4, check: 'freeboard' } as const
    expect(plain(holdsToWords(say, holdsTo, depthOnly, false))).toContain(
      'holds from 0.121 m to 0.400 m',
    )
  })

  it('never says that anything holds where nothing does, or without a skirt', () => {
    const none = { from: null, depth: 0, check: 'ground' } as const
    expect(holdsToWords(say, none, depthOnly, false)).not.toMatch(/\bholds\b/i)
    const some = { from: 0, depth: 0.4, check: 'sliding' } as const
    expect(holdsToWords(say, some, depthOnly, true)).not.toMatch(/\bholds\b/i)
  })

  it.each([
    ['leave-at', 'Leave before 3.309 m (0.439 m).'],
    ['leave-before-level', 'Holds, but must be left before it: leave before 3.309 m (0.439 m).'],
    ['leave-now', 'Leave now. The leave level of 3.309 m (0.439 m) is reached.'],
  ] as const)('says %s in its sentence', (state, sentence) => {
    const leave = { depth: 0.43996, margin: 0.05, state }
    expect(plain(leaveWords(say, leave, withLevel))).toBe(sentence)
  })

  it('gives no leave level where nothing holds', () => {
    const leave = { depth: null, margin: 0.05, state: 'none' } as const
    expect(leaveWords(say, leave, depthOnly)).toMatch(/^Do not rely on it/)
  })

  it('says by how much the crest is overtopped', () => {
    const over = { solved: false, reason: 'overtopped' } as const
    expect(plain(shapeWords(say, over, 0.8, 0.7)!)).toContain('0.100 m above')
    expect(shapeWords(say, over, 0.69, 0.7)).toContain('below the water')
    expect(shapeWords(say, { solved: false, reason: 'no-skirt' }, 0.4, 0.7)).toBeNull()
  })
})
