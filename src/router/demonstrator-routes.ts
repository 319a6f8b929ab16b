import type { RouteMeta, RouteRecordRaw } from 'vue-router'

const meta: RouteMeta = {
  titleKey: 'shell.demonstrator',
  isBare: true,
  area: async () => {
    const { demonstratorAreaTexts } = await import('@shared/texts/demonstrator-area')
    return { texts: demonstratorAreaTexts, admit: () => Promise.resolve(true) }
  },
}

/** Open to everybody; loaded with its courses and texts when it is entered. */
export const demonstratorRoutes: readonly RouteRecordRaw[] = [
  {
    path: '/demonstrator',
    name: 'demonstrator',
    component: () => import('@/views/DemonstratorView.vue'),
    meta,
  },
  {
    path: '/demonstrator/presenter',
    name: 'presenter',
    component: () => import('@/views/PresenterView.vue'),
    meta,
  },
]
