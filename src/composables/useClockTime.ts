import { computed } from 'vue'
import { useSession } from '@/stores/session'

/** The time of day of a moment, "21:45", in the time zone of whoever reads it. */
export function useClockTime() {
  const session = useSession()
  const format = computed(
    () =>
      new Intl.DateTimeFormat('en-GB', {
        hour: '2-digit',
        minute: '2-digit',
        timeZone: session.account?.timeZone,
      }),
  )
  return (moment: number): string => format.value.format(moment)
}
