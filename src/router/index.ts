import { createRouter, createWebHistory, type RouteRecordRaw } from 'vue-router'
import QuickCheckView from '@/views/QuickCheckView.vue'
import { classRoute } from './class-route'
import { demonstratorRoutes } from './demonstrator-routes'
import { memberRoutes } from './member-routes'
import { methodRoute } from './method-route'
import { verifyRoute } from './verify-route'

declare module 'vue-router' {
  interface RouteMeta {
    /** Text key of the page's name in the title of the window. */
    readonly titleKey: string
    /** The page takes the whole window: no header, no footer. */
    readonly isBare?: boolean
  }
}

export const routes: RouteRecordRaw[] = [
  {
    path: '/',
    name: 'quick-check',
    component: QuickCheckView,
    meta: { titleKey: 'quickCheck.title' },
  },
  methodRoute,
  verifyRoute,
  classRoute,
  ...demonstratorRoutes,
  ...memberRoutes,
  {
    path: '/:path(.*)*',
    name: 'not-found',
    component: () => import('@/views/NotFoundView.vue'),
    meta: { titleKey: 'shell.notFound.title' },
  },
]

export function createAppRouter(history = createWebHistory()) {
  return createRouter({
    history,
    routes,
    scrollBehavior: (to, from, saved) => {
      if (to.path === from.path) return false
      return saved ?? (to.hash ? { el: to.hash } : { top: 0 })
    },
  })
}
