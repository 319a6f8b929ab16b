import type { RouteRecordRaw } from 'vue-router'

/** Desk, projects, lines and scenarios. */
export const projectRoutes: RouteRecordRaw[] = []
