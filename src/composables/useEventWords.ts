import { dayTime } from '@shared/forecast/project-time'
import type { CheckId } from '@shared/schemas/check-ids'
import { useWords } from './useWords'

/** Words for moments, places and levels of an event; moments in seconds. */
export function useEventWords(timeZone: () => string) {
  const { t, q } = useWords()
  const figure = (chainage: number): string => String(Number(chainage.toFixed(2)))
  /** "Tue 01:41", to the full minute before. */
  const at = (time: number): string => dayTime(time * 1000, timeZone())
  const down = (level: number): string => q(level, 'length', { rounding: 'down' })
  const level = (value: number): string => q(value, 'length')
  const check = (id: CheckId): string => t(`checks.name.${id}`)
  const factor = (value: number | null): string =>
    value === null ? t('eventPage.moment.unloaded') : q(value, 'ratio')

  return { t, q, at, figure, down, level, check, factor }
}
