// @vitest-environment jsdom
import { screen, waitFor } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { ScenarioSave } from '../../../src/api/scenarios'
import { stateOf } from '../../../src/scenario/scenario-state'
import { LOW_ROAD_SURVEY } from '../../support/ferry-quay'
import { fakeApi } from '../support/fake-api'
import { forecast, forecastRow, RESTING } from '../support/forecast'
import { clearPage, openPage, stubPage } from '../support/open-page'
import { line, projectRoutes, scenario, stubDrawing } from '../support/projects'

// A canvas is nothing that jsdom can draw on.
vi.mock('vue-chartjs', () => ({ Line: { render: () => null } }))

beforeEach(() => {
  stubPage()
  stubDrawing()
})
afterEach(clearPage)

const PATH = '/projects/p/lines/l/scenarios/s'
const ISSUE = 'GET /api/projects/p/gauges/g/forecasts/f'

/** One section of Low road, so that it is quick. */
const stations = LOW_ROAD_SURVEY.stations.filter(({ chainage }) => chainage >= 60 && chainage <= 70)
const plain = scenario()
const content = { ...plain.content, place: 60, forecast: RESTING }

const routes = (change: Record<string, () => unknown> = {}) => ({
  ...projectRoutes(),
  'GET /api/projects/p/lines/l': () => line({ stations: [...stations] }),
  [`GET /api${PATH}`]: () => scenario({ content }),
  'GET /api/projects/p/forecasts': () => ({ forecasts: [forecastRow()] }),
  [ISSUE]: () => forecast(),
  [`PUT /api${PATH}`]: ({ body }: { body: unknown }) => {
    const { version, ...state } = body as ScenarioSave
    return scenario({ ...stateOf(state as typeof plain), version: version + 1 })
  },
  ...change,
})
const verdict = () => screen.findByTestId('event-verdict', {}, { timeout: 20_000 })
const text = () => document.body.textContent.replace(/\s+/g, ' ')
vi.setConfig({ testTimeout: 30_000 })

describe('the event of a scenario', () => {
  it('says first where and when it fails, and when everybody leaves', async () => {
    fakeApi(routes())
    await openPage(`${PATH}/event`)
    expect((await verdict()).textContent).toContain('Does not hold')
    expect(text()).toMatch(/First at ch 60, Tue 05:\d\d, water at 3\.360.m\. Sliding\./)
    expect(text()).toMatch(/Leave at 3\.309.m: reached Tue 05:\d\d, at ch 60/)
    expect(text()).toContain('Rests on Lock, issued Mon 21:45.')
    expect(text()).toContain('Leave before the water reaches the leave level.')
    const rows = [...document.querySelectorAll('tbody tr')].map((row) => row.textContent)
    expect(rows.filter((row) => row.includes('ch 60–70'))).toHaveLength(1)
  })

  it('moves every drawing with one slider, by keys and by the moments that matter', async () => {
    fakeApi(routes())
    await openPage(`${PATH}/event`)
    await verdict()
    const slider = document.querySelector<HTMLInputElement>('input[aria-label="Moment"]')!
    expect(slider.getAttribute('aria-valuetext')).toMatch(/^Tue 0\d:\d\d, water at 3\.\d{3}.m$/)
    const crest = [...document.querySelectorAll('button')].find((button) =>
      button.textContent.includes('Crest'),
    )!
    await userEvent.click(crest)
    expect(slider.getAttribute('aria-valuetext')).toMatch(/^Tue 07:00, water at 3\.420.m$/)
    expect(text()).toMatch(/Section ch 60–70 at Tue 07:00/)
    expect(text()).toMatch(/Factor of sliding ?1\.33/)
  })

  it('turns grey under a newer issue, and rests on it when told to', async () => {
    const newer = { id: 'n', issuedAt: RESTING.issuedAt + 3_600_000 }
    const api = fakeApi(
      routes({
        'GET /api/projects/p/forecasts': () => ({ forecasts: [forecastRow(newer)] }),
        'GET /api/projects/p/gauges/g/forecasts/n': () => forecast(newer),
      }),
    )
    await openPage(`${PATH}/event`)
    await verdict()
    await waitFor(() => expect(text()).toContain('A newer issue is there, of Mon 22:45'))
    expect(document.querySelector('.answer.old')).not.toBeNull()
    await userEvent.click(screen.getByRole('button', { name: 'Rest on the newer issue' }))
    await waitFor(() => expect(document.querySelector('.answer.old')).toBeNull(), {
      timeout: 20_000,
    })
    await waitFor(() => expect(api.sent(`PUT /api${PATH}`)).not.toHaveLength(0))
    const [{ content: sent }] = api.sent(`PUT /api${PATH}`) as [ScenarioSave]
    expect(sent.forecast).toMatchObject({ forecastId: 'n' })
    expect(sent.waterLevel).toBeCloseTo(3.42, 6)
  })

  it('says where a forecast is entered while there is none', async () => {
    fakeApi(
      routes({
        [`GET /api${PATH}`]: () => scenario(),
        'GET /api/projects/p/forecasts': () => ({ forecasts: [] }),
      }),
    )
    await openPage(`${PATH}/event`)
    await screen.findByText('No forecast yet')
    const link = screen.getByRole('link', { name: 'Enter a forecast' })
    expect(link.getAttribute('href')).toMatch(/^\/projects\/p/)
  })
})
