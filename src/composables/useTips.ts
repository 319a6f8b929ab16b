import { inject, provide, readonly, shallowRef, type InjectionKey } from 'vue'

/** A term and its explanation, and the button that asks for it. */
export interface Tip {
  readonly anchor: HTMLElement
  readonly text: string
}

/** One popover serves every explanation of the page. */
export function provideTips() {
  const open = shallowRef<Tip | null>(null)
  const tips = {
    open: readonly(open),
    show: (tip: Tip) => (open.value = tip),
    hide: () => (open.value = null),
  }
  provide(KEY, tips)
  return tips
}

type Tips = ReturnType<typeof provideTips>
const KEY: InjectionKey<Tips> = Symbol('tips')

/** The popover of the page; null where a component stands alone. */
export function injectTips(): Tips | null {
  return inject(KEY, null)
}
