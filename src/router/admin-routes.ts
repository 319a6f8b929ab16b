import type { RouteRecordRaw } from 'vue-router'

/** Administration; each tab has an address. */
export const adminRoutes: RouteRecordRaw[] = [
  {
    path: '/admin',
    component: () => import('@/views/AdminView.vue'),
    meta: { titleKey: 'admin.title', access: 'administer' },
    children: [
      { path: '', redirect: { name: 'admin-people' } },
      {
        path: 'people',
        name: 'admin-people',
        component: () => import('@/views/admin/PeopleView.vue'),
        meta: { titleKey: 'admin.people.title' },
      },
      {
        path: 'invitations',
        name: 'admin-invitations',
        component: () => import('@/views/admin/InvitationsView.vue'),
        meta: { titleKey: 'admin.invitations.title' },
      },
      {
        path: 'organisations',
        name: 'admin-organisations',
        component: () => import('@/views/admin/OrganisationsView.vue'),
        meta: { titleKey: 'admin.organisations.title' },
      },
      {
        path: 'letterhead',
        name: 'admin-letterhead',
        component: () => import('@/views/admin/LetterheadView.vue'),
        meta: { titleKey: 'admin.letterhead.title' },
      },
      {
        path: 'audit',
        name: 'admin-audit',
        component: () => import('@/views/admin/AuditView.vue'),
        meta: { titleKey: 'admin.audit.title' },
      },
      {
        path: 'mail',
        name: 'admin-mail',
        component: () => import('@/views/admin/MailView.vue'),
        meta: { titleKey: 'admin.mail.title' },
      },
    ],
  },
]
