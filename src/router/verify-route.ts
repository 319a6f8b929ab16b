import type { RouteRecordRaw } from 'vue-router'

/** Open to whoever holds a sheet; loaded with its texts when it is entered. */
export const verifyRoute: RouteRecordRaw = {
  path: '/verify/:code?',
  name: 'verify',
  component: () => import('@/views/VerifyView.vue'),
  props: true,
  meta: {
    titleKey: 'shell.name',
    area: async () => {
      const { verifyAreaTexts } = await import('@shared/texts/verify-area')
      return { texts: verifyAreaTexts, admit: () => Promise.resolve(true) }
    },
  },
}
