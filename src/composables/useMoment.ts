import { computed } from 'vue'
import { useSession } from '@/stores/session'

/** Moments in the time zone of whoever reads them; without an account in that of the browser. */
export function useMoment() {
  const session = useSession()
  const format = computed(
    () =>
      new Intl.DateTimeFormat('en-GB', {
        dateStyle: 'medium',
        timeStyle: 'short',
        timeZone: session.account?.timeZone,
      }),
  )
  return (moment: number): string => format.value.format(moment)
}
