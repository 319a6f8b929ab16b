import { defineStore } from 'pinia'
import { shallowReadonly, shallowRef } from 'vue'

/** How long a notice stays [ms]; long enough to be read twice. */
const STAYS = 6000

/** One short sentence about what has just been done; the newest replaces the one before. */
export const useNotices = defineStore('notices', () => {
  const text = shallowRef('')
  let timer: ReturnType<typeof setTimeout> | undefined

  function dismiss(): void {
    clearTimeout(timer)
    text.value = ''
  }

  function say(sentence: string): void {
    dismiss()
    text.value = sentence
    timer = setTimeout(dismiss, STAYS)
  }

  return { text: shallowReadonly(text), say, dismiss }
})
