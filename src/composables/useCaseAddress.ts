import { onScopeDispose, shallowRef, watch } from 'vue'
import { onBeforeRouteUpdate, useRoute } from 'vue-router'
import { readAddress, writeAddress, type AddressProblem } from '@/quick-check/address'
import type { CaseDraft } from './useCaseDraft'

/** The address follows once a change has rested this long, so that no frame of a drag pays for it [ms]. */
const SETTLE = 250

/** The query of a full path of the router. */
function searchOf(fullPath: string): string {
  return /\?([^#]*)/.exec(fullPath)?.[1] ?? ''
}

/** What the address said when the page was opened. */
export function useStartAddress() {
  return readAddress(searchOf(useRoute().fullPath))
}

/**
 * Keeps the address in step with the draft, so that it survives a reload and can be sent. What could
 * not be read stays in the address until something is changed.
 */
export function useCaseAddress(draft: CaseDraft, startProblems: readonly AddressProblem[]) {
  const route = useRoute()
  const problems = shallowRef(startProblems)
  let timer: ReturnType<typeof setTimeout> | undefined
  let written = searchOf(route.fullPath)

  function write(): void {
    written = writeAddress(draft.content.value)
    const url = `${window.location.pathname}?${written}${window.location.hash}`
    window.history.replaceState({ ...window.history.state, current: url }, '', url)
  }

  function writeSoon(): void {
    clearTimeout(timer)
    timer = setTimeout(write, SETTLE)
  }

  watch(draft.content, writeSoon, { immediate: startProblems.length === 0 })

  onBeforeRouteUpdate((to) => {
    const search = searchOf(to.fullPath)
    if (to.path !== route.path || search === written) return
    const content = readAddress(search)
    problems.value = content.problems
    draft.load(content)
  })
  onScopeDispose(() => clearTimeout(timer))

  return {
    problems,
    dismiss: () => (problems.value = []),
    /** The whole address as it stands now, for sending. */
    link: () => `${window.location.origin}/?${writeAddress(draft.content.value)}`,
  }
}
