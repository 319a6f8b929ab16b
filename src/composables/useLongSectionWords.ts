import { GROUNDS } from '@shared/catalogue/grounds'
import type { LongSectionReading } from '@shared/drawing/long-section'
import { useWords } from './useWords'

/** Words for chainages, surfaces, and what a long section says at one place. */
export function useLongSectionWords() {
  const { t, q, given } = useWords()

  /** A surface of the catalogue by its name, any other as the survey calls it. */
  function surfaceWord(surface: string): string {
    return GROUNDS.some(({ id }) => id === surface) ? t(`checks.ground.${surface}`) : surface
  }

  /** "ch 45.5"; chainages are figures of the survey and keep its digits. */
  function chainageWord(chainage: number): string {
    return t('linePage.chainage', { chainage: String(Number(chainage.toFixed(2))) })
  }

  function readingWords(reading: LongSectionReading): string {
    const { chainage, groundLevel, surface, depth, diameter, holdsToLevel, crestLevel } = reading
    const parts = [
      chainageWord(chainage),
      t('linePage.reading.ground', { level: q(groundLevel, 'length') }),
      surfaceWord(surface),
    ]
    if (depth !== null) parts.push(t('linePage.reading.depth', { depth: q(depth, 'length') }))
    if (diameter !== null)
      parts.push(t('linePage.reading.tube', { diameter: given(diameter, 'length') }))
    if (holdsToLevel !== null) {
      const level = q(holdsToLevel, 'length', { rounding: 'down' })
      parts.push(t('linePage.reading.holdsTo', { level }))
    }
    if (crestLevel !== null) {
      parts.push(t('linePlan.section.crest', { level: q(crestLevel, 'length') }))
      if (depth !== null && depth > 0) {
        const height = q(crestLevel - groundLevel - depth, 'length')
        parts.push(t('linePlan.section.freeboard', { height }))
      }
    }
    return parts.join(' · ')
  }

  return { surfaceWord, chainageWord, readingWords }
}
