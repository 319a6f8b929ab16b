import type { RouteRecordRaw } from 'vue-router'

/** The Method page: open to everybody, loaded with its formulas and texts when it is entered. */
export const methodRoute: RouteRecordRaw = {
  path: '/method',
  name: 'method',
  component: () => import('@/views/MethodView.vue'),
  meta: {
    titleKey: 'shell.method',
    area: async () => {
      const { methodAreaTexts } = await import('@shared/texts/method-area')
      return { texts: methodAreaTexts, admit: () => Promise.resolve(true) }
    },
  },
  // The Quick check keeps its case in the address without telling the router: bring it along.
  beforeEnter: (to, from) => {
    const { search } = window.location
    const isFromCheck = from.name === 'quick-check' && search !== '' && !to.fullPath.includes('?')
    return isFromCheck ? { path: to.path, query: queryOf(search), hash: to.hash } : true
  },
}

function queryOf(search: string): Record<string, string> {
  return Object.fromEntries(new URLSearchParams(search))
}
