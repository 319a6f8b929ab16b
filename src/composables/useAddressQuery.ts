import { computed, type WritableComputedRef } from 'vue'
import { useRoute, useRouter } from 'vue-router'

/**
 * Search, order and page of a list, kept in the address: it can be reloaded, sent and gone back to.
 * What equals its default is left out. Anything but a turn of the page leads back to page 1.
 */
export function useAddressQuery() {
  const route = useRoute()
  const router = useRouter()

  function read(name: string): string {
    const given = route.query[name]
    return typeof given === 'string' ? given : ''
  }

  function write(changes: Readonly<Record<string, string>>): void {
    const query = { ...route.query, page: undefined, ...changes }
    const kept = Object.entries(query).filter(([, value]) => value !== '' && value !== undefined)
    void router.replace({ query: Object.fromEntries(kept), hash: route.hash })
  }

  /** One text of the address; `fallback` where it is left out. */
  function text(name: string, fallback = ''): WritableComputedRef<string> {
    return computed({
      get: () => read(name) || fallback,
      set: (next) => write({ [name]: next === fallback ? '' : next }),
    })
  }

  const page = computed({
    get: () => Math.max(1, Math.floor(Number(read('page'))) || 1),
    set: (next) => write({ page: next === 1 ? '' : String(next) }),
  })

  return { text, page, write }
}
