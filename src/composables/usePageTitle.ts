import { watchEffect } from 'vue'
import { useWords } from './useWords'

/** Names the window after what the page shows, once that is known. */
export function usePageTitle(name: () => string | undefined) {
  const { t } = useWords()
  watchEffect(
    () => {
      const page = name()
      if (page) document.title = t('shell.windowTitle', { page })
    },
    { flush: 'post' },
  )
}
