import type { RouteRecordRaw } from 'vue-router'

/** Desk, projects, lines and scenarios. */
export const projectRoutes: RouteRecordRaw[] = [
  {
    path: '/desk',
    name: 'desk',
    component: () => import('@/views/DeskView.vue'),
    meta: { titleKey: 'desk.title' },
  },
  {
    path: '/projects',
    name: 'projects',
    component: () => import('@/views/ProjectsView.vue'),
    meta: { titleKey: 'projectPage.listTitle' },
  },
  {
    path: '/projects/:projectId',
    name: 'project',
    component: () => import('@/views/ProjectView.vue'),
    props: true,
    meta: { titleKey: 'projectPage.title' },
  },
  {
    path: '/projects/:projectId/gauges/:gaugeId',
    name: 'gauge',
    component: () => import('@/views/GaugeView.vue'),
    props: true,
    meta: { titleKey: 'forecast.title' },
  },
  {
    path: '/projects/:projectId/lines/:lineId',
    name: 'line',
    component: () => import('@/views/LineView.vue'),
    props: true,
    meta: { titleKey: 'linePage.title' },
  },
  {
    path: '/projects/:projectId/lines/:lineId/scenarios/:scenarioId',
    name: 'scenario',
    component: () => import('@/views/ScenarioView.vue'),
    props: true,
    meta: { titleKey: 'scenarioPage.title' },
  },
  {
    path: '/projects/:projectId/lines/:lineId/scenarios/:scenarioId/event',
    name: 'event',
    component: () => import('@/views/EventView.vue'),
    props: true,
    meta: { titleKey: 'eventPage.title' },
  },
  {
    path: '/projects/:projectId/lines/:lineId/scenarios/:scenarioId/deployment',
    name: 'deployment',
    component: () => import('@/views/DeploymentView.vue'),
    props: true,
    meta: { titleKey: 'deployment.title' },
  },
  {
    path: '/depots',
    name: 'depots',
    component: () => import('@/views/DepotsView.vue'),
    meta: { titleKey: 'depotsPage.title' },
  },
  {
    path: '/sheets/:sheetId',
    name: 'sheet',
    component: () => import('@/views/SheetView.vue'),
    props: true,
    meta: { titleKey: 'sheetPage.title' },
  },
]
