import type { RouteRecordRaw } from 'vue-router'

/** Ways in, and what a person looks after for themselves. */
export const accountRoutes: RouteRecordRaw[] = [
  {
    path: '/sign-in',
    name: 'sign-in',
    component: () => import('@/views/SignInView.vue'),
    meta: { titleKey: 'account.signIn.title', access: 'open' },
  },
  {
    path: '/invite/:token',
    name: 'invitation',
    component: () => import('@/views/InvitationView.vue'),
    props: true,
    meta: { titleKey: 'account.invitation.title', access: 'open' },
  },
  {
    path: '/reset',
    name: 'reset',
    component: () => import('@/views/ResetRequestView.vue'),
    meta: { titleKey: 'account.reset.title', access: 'open' },
  },
  {
    path: '/reset/:token',
    name: 'reset-token',
    component: () => import('@/views/ResetView.vue'),
    props: true,
    meta: { titleKey: 'account.reset.title', access: 'open' },
  },
  {
    path: '/account',
    name: 'account',
    component: () => import('@/views/AccountView.vue'),
    meta: { titleKey: 'account.title' },
  },
]
