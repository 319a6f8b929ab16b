import { vi } from 'vitest'
import { DEFAULT_ENDS } from '../../../shared/schemas/mark'
import type { Line, Project, Scenario, ScenarioListItem } from '../../../shared/schemas/project'
import { scenarioSummary } from '../../../shared/checks/scenario-summary'
import { LOW_ROAD_SURVEY, lowRoadContent } from '../../support/ferry-quay'
import { account } from './fake-api'

const person = { id: 'account-1', name: 'Engineer' }
const at = Date.UTC(2026, 2, 29, 21, 45)
const kept = {
  createdAt: at,
  createdBy: person,
  updatedAt: at,
  updatedBy: person,
  archivedAt: null,
  version: 1,
}

export function project(change: Partial<Project> = {}): Project {
  return {
    id: 'p',
    name: 'Ferry Quay',
    site: 'Quay',
    client: '',
    datum: 'QD',
    timeZone: 'UTC',
    note: '',
    myRole: 'lead',
    lines: 1,
    scenarios: 1,
    ...kept,
    ...change,
  }
}

export function line(change: Partial<Line> = {}): Line {
  const { sectionLength, stations } = LOW_ROAD_SURVEY
  return {
    id: 'l',
    name: 'Low road',
    note: '',
    sectionLength,
    stations: [...stations],
    marks: [],
    ends: DEFAULT_ENDS,
    background: null,
    scenarios: 1,
    warnings: [],
    ...kept,
    ...change,
  }
}

/** The edge of every run is weighed and the gravel counts as fit, so that a level decides. */
export function scenario(change: Partial<Scenario> = {}): Scenario {
  const start = lowRoadContent()
  const grounds = start.grounds.map((ground) => ({ ...ground, suitable: true }))
  const content = { ...start, grounds }
  return {
    id: 's',
    lineId: 'l',
    name: 'Tonight',
    note: '',
    content,
    summary: scenarioSummary(LOW_ROAD_SURVEY, change.content ?? content),
    ...kept,
    ...change,
  }
}

export function listItem(change: Partial<Scenario> = {}): ScenarioListItem {
  const { content, ...row } = scenario(change)
  const edges = content.sizes.map((run) => run.edgeFactor ?? content.uplift.edgeFactor)
  return {
    ...row,
    basis: content.basis,
    edges: { least: Math.min(...edges), most: Math.max(...edges) },
    upliftModel: content.uplift.model,
    forecast: content.forecast ?? null,
  }
}

export const pageOf = <Item>(items: readonly Item[]) => ({
  items,
  page: 1,
  pageSize: 50,
  total: items.length,
})

/** Everything that the pages of one project ask for. */
export function projectRoutes(role: Project['myRole'] = 'lead') {
  return {
    'GET /api/session': () => ({ account: account() }),
    'GET /api/projects/p': () => project({ myRole: role }),
    'GET /api/projects/p/forecasts': () => ({ forecasts: [] }),
    'GET /api/projects/p/gauges': () => ({
      gauges: [{ id: 'g', name: 'Lock', zero: 0.6, correction: -0.04, note: '', ...kept }],
    }),
    'GET /api/projects/p/store': () => ({
      organisation: { id: 'o', name: 'Firm' },
      depots: [],
    }),
    'GET /api/projects/p/lines': () => pageOf([]),
    'GET /api/projects/p/lines/l': () => line(),
    'GET /api/projects/p/lines/l/scenarios': () => pageOf([listItem()]),
    'GET /api/projects/p/lines/l/scenarios/s': () => scenario(),
  }
}

/** What jsdom lacks besides: sizes, observers and a pointer. */
export function stubDrawing(): void {
  sessionStorage.clear()
  const observer = class {
    observe = () => undefined
    disconnect = () => undefined
  }
  vi.stubGlobal('ResizeObserver', observer)
  const listening = { addEventListener: () => undefined, removeEventListener: () => undefined }
  vi.stubGlobal('matchMedia', () => ({ matches: false, ...listening }))
  vi.stubGlobal('IntersectionObserver', observer)
  vi.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue(
    DOMRect.fromRect({ width: 900, height: 260 }),
  )
  Element.prototype.setPointerCapture = () => undefined
}
