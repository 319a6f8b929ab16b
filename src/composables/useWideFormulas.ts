import { onBeforeUnmount, onMounted, type Ref } from 'vue'

/** So far beyond the screen a formula is looked at already. */
const AHEAD = '600px 0px'

/**
 * Formulas wider than the page are scrolled; this lets the keyboard reach them. Only what comes into
 * view is measured: measuring all of them would lay out the whole page.
 */
export function useWideFormulas(page: Readonly<Ref<HTMLElement | null>>): void {
  let inView = new Set<HTMLElement>()

  function mark(): void {
    const formulas = [...inView]
    const wide = formulas.map(({ scrollWidth, clientWidth }) => scrollWidth > clientWidth)
    formulas.forEach((formula, i) => setReachable(formula, wide[i]!))
  }

  const seen = new IntersectionObserver(
    (entries) => {
      for (const { target, isIntersecting } of entries) {
        if (isIntersecting) inView.add(target as HTMLElement)
        else inView.delete(target as HTMLElement)
      }
      mark()
    },
    { rootMargin: AHEAD },
  )

  onMounted(() => {
    for (const formula of page.value?.querySelectorAll('[data-label]') ?? []) seen.observe(formula)
    window.addEventListener('resize', mark)
  })
  onBeforeUnmount(() => {
    seen.disconnect()
    inView = new Set()
    window.removeEventListener('resize', mark)
  })
}

function setReachable(formula: HTMLElement, isWide: boolean): void {
  if (!isWide) {
    for (const name of ['tabindex', 'role', 'aria-label']) formula.removeAttribute(name)
    return
  }
  formula.tabIndex = 0
  formula.setAttribute('role', 'group')
  formula.setAttribute('aria-label', formula.dataset.label ?? '')
}
