import type { RouteLocationNormalized, RouteLocationRaw, Router } from 'vue-router'
import { addTexts, type AreaTexts, type createTexts } from '@/i18n'

/** A part of the program that is loaded when somebody enters it. */
export interface Area {
  readonly texts: AreaTexts
  /** True to let in, or where to go instead. */
  readonly admit: (to: RouteLocationNormalized) => Promise<true | RouteLocationRaw>
}

declare module 'vue-router' {
  interface RouteMeta {
    readonly area?: () => Promise<Area>
  }
}

/** Loads the area that a route belongs to, adds its texts and lets it decide who may enter. */
export function admitToAreas(router: Router, texts: ReturnType<typeof createTexts>): void {
  router.beforeEach(async (to) => {
    if (!to.meta.area) return true
    const area = await to.meta.area()
    addTexts(texts, area.texts)
    return area.admit(to)
  })
}
