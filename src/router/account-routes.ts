import type { RouteRecordRaw } from 'vue-router'

/** Ways in, and what a person looks after for themselves. */
export const accountRoutes: RouteRecordRaw[] = []
