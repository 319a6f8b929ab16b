import type { RouteRecordRaw } from 'vue-router'

/** Open to whoever has a code; loaded with its texts when it is entered. */
export const classRoute: RouteRecordRaw = {
  path: '/class/:code?',
  name: 'class',
  component: () => import('@/views/ClassView.vue'),
  props: true,
  meta: {
    titleKey: 'shell.name',
    isBare: true,
    area: async () => {
      const { classAreaTexts } = await import('@shared/texts/class-area')
      return { texts: classAreaTexts, admit: () => Promise.resolve(true) }
    },
  },
}
