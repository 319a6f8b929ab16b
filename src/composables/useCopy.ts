import { shallowReadonly, shallowRef } from 'vue'

export type CopyState = 'idle' | 'copied' | 'barred'

/** Copies a text; where the browser does not let a page do that, keeps it to be copied by hand. */
export function useCopy() {
  const state = shallowRef<CopyState>('idle')
  const text = shallowRef('')

  async function copy(what: string): Promise<void> {
    text.value = what
    state.value = (await isCopied(what)) ? 'copied' : 'barred'
  }

  return { state: shallowReadonly(state), text: shallowReadonly(text), copy }
}

/** The clipboard exists only on secure pages, and the user may refuse it. */
async function isCopied(what: string): Promise<boolean> {
  const clipboard = navigator.clipboard as Clipboard | undefined
  if (!clipboard) return false
  return clipboard.writeText(what).then(
    () => true,
    () => false,
  )
}
