import { cleanup, render } from '@testing-library/vue'
import { createPinia } from 'pinia'
import { vi } from 'vitest'
import { h } from 'vue'
import { createMemoryHistory, RouterView } from 'vue-router'
import HeaderAccount from '../../../src/components/shell/HeaderAccount.vue'
import { createTexts } from '../../../src/i18n'
import { createAppRouter } from '../../../src/router'
import { admitToAreas } from '../../../src/router/admit-to-areas'

/** What jsdom lacks and the pages use. */
export function stubPage(): void {
  localStorage.clear()
  vi.stubGlobal('matchMedia', () => ({ matches: false, addEventListener: () => undefined }))
  vi.stubGlobal('scrollTo', () => undefined)
  HTMLDialogElement.prototype.showModal = function () {
    this.open = true
  }
  HTMLDialogElement.prototype.close = function () {
    this.open = false
  }
}

export function clearPage(): void {
  cleanup()
  vi.useRealTimers()
  vi.unstubAllGlobals()
  vi.restoreAllMocks()
}

/** Opens an address with the real router, guard, texts and queries; only `fetch` is faked. */
export async function openPage(path: string) {
  const texts = createTexts()
  const router = createAppRouter(createMemoryHistory())
  admitToAreas(router, texts)
  const pinia = createPinia()
  const page = render(
    { render: () => [h('header', h(HeaderAccount)), h('main', h(RouterView))] },
    { global: { plugins: [pinia, texts, router] } },
  )
  await router.push(path)
  await router.isReady()
  return { ...page, router, pinia }
}
