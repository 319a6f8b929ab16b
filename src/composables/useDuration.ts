import { useWords } from './useWords'

/** Times in words: "12 min", "1 h 04 min"; a time that is there is never "0 min". */
export function useDuration() {
  const { t } = useWords()
  return (seconds: number): string => {
    const size = Math.abs(seconds)
    const minutes = size > 0 ? Math.max(1, Math.round(size / 60)) : 0
    if (minutes < 60) return t('deployment.duration.minutes', { minutes })
    const [hours, rest] = [Math.floor(minutes / 60), minutes % 60]
    if (rest === 0) return t('deployment.duration.plainHours', { hours })
    return t('deployment.duration.hours', { hours, minutes: String(rest).padStart(2, '0') })
  }
}
