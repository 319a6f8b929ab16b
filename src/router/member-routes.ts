import type { RouteRecordRaw } from 'vue-router'
import type { RuleId } from '@shared/access/rules'
import { accountRoutes } from './account-routes'
import { adminRoutes } from './admin-routes'
import { projectRoutes } from './project-routes'

declare module 'vue-router' {
  interface RouteMeta {
    /** Rule of shared/access that the page asks for; left out: any account. */
    readonly access?: RuleId
  }
}

/**
 * Everything behind the sign-in, and the sign-in itself. The layout with its queries and texts is
 * loaded on entry, so that the Quick check does not carry it. Children have addresses of their own.
 */
export const memberRoutes: RouteRecordRaw[] = [
  {
    path: '/desk',
    component: () => import('@/area/MemberArea.vue'),
    meta: {
      titleKey: 'shell.name',
      area: async () => (await import('@/area/member-area')).memberArea,
    },
    children: [...accountRoutes, ...adminRoutes, ...projectRoutes],
  },
]
