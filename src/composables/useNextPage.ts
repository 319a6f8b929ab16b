import { useRoute, useRouter } from 'vue-router'

const FALLBACK = '/desk'

/** A path of this program and nothing else: "//elsewhere" would leave it. */
export function safeNext(next: unknown): string {
  return typeof next === 'string' && /^\/(?![/\\])/.test(next) ? next : FALLBACK
}

/** Where somebody wanted to go before they had to sign in. */
export function useNextPage() {
  const route = useRoute()
  const router = useRouter()
  return () => router.replace(safeNext(route.query.next))
}
