import type { RouteRecordRaw } from 'vue-router'

/** Administration; each tab has an address. */
export const adminRoutes: RouteRecordRaw[] = []
