import { onScopeDispose, readonly, ref } from 'vue'

/** True on a screen as narrow as a phone; the same bound as in the styles. */
export function useNarrow() {
  const query = window.matchMedia('(max-width: 700px)')
  const isNarrow = ref(query.matches)
  const follow = ({ matches }: MediaQueryListEvent) => (isNarrow.value = matches)
  query.addEventListener('change', follow)
  onScopeDispose(() => query.removeEventListener('change', follow))
  return readonly(isNarrow)
}
