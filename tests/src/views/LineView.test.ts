// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import type { Line } from '../../../shared/schemas/project'
import { fakeApi, field, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'
import { line, listItem, pageOf, projectRoutes, scenario, stubDrawing } from '../support/projects'

beforeEach(() => {
  stubPage()
  stubDrawing()
})
afterEach(clearPage)

const PATH = '/projects/p/lines/l'
const SCENARIOS = `GET /api${PATH}/scenarios`
/** Queries by role compute the name of every cell of a survey, which takes seconds in jsdom. */
const cell = (name: string) =>
  document.querySelector<HTMLInputElement>(`input[aria-label="${name}"]`) ??
  expect.fail(`No cell is called "${name}"`)
const button = (name: string) =>
  [...document.querySelectorAll('button')].find(({ textContent }) => textContent.trim() === name) ??
  expect.fail(`No button says "${name}"`)
const press = async (name: string) => userEvent.click(await waitFor(() => button(name)))

const manyStations = (): Line['stations'] =>
  Array.from({ length: 2000 }, (_, i) => ({
    ...line().stations[0]!,
    chainage: i,
    x: null,
    y: null,
  }))

describe('all scenarios in one table', () => {
  it('says level, assumptions, verdict in words, weakest place, limit and who changed it', async () => {
    fakeApi(projectRoutes())
    await openPage(PATH)
    const row = await screen.findByRole('row', { name: /Tonight/ })
    for (const words of [
      '3.420',
      'Factor 1.5 throughout',
      '100',
      'Does not hold',
      'ch 45, Sliding',
    ])
      expect(row.textContent).toContain(words)
    expect(row.textContent).toContain('29 Mar 2026, 21:45, Engineer')
  })

  it('asks the server for search, verdict and order, which stand in the address', async () => {
    const api = fakeApi(projectRoutes())
    const { router } = await openPage(PATH)
    await userEvent.type(await screen.findByLabelText('Search'), 'tonight{Enter}')
    await userEvent.selectOptions(screen.getByLabelText('Verdict'), 'Does not hold')
    await userEvent.click(await screen.findByRole('button', { name: /^Holds to/ }))
    await waitFor(() => {
      const asked = api.calls.filter(({ path }) => path === `/api${PATH}/scenarios`).at(-1)!.query
      expect(Object.fromEntries(asked)).toMatchObject({
        search: 'tonight',
        verdict: 'fails',
        sort: 'holdsTo',
      })
    })
    expect(router.currentRoute.value.query).toMatchObject({ search: 'tonight', sort: 'holdsTo' })
  })

  it('leads on where there is none, and says so where none matches', async () => {
    fakeApi({ ...projectRoutes(), [SCENARIOS]: () => pageOf([]) })
    await openPage(PATH)
    expect(await screen.findByText('No scenario yet')).toBeTruthy()
    await userEvent.type(screen.getByLabelText('Search'), 'flood{Enter}')
    expect(await screen.findByText('No scenario matches')).toBeTruthy()
  })

  it('shows a failure with a way to try again', async () => {
    fakeApi({ ...projectRoutes(), [SCENARIOS]: () => refuse(403, 'forbidden') })
    await openPage(PATH)
    expect(await screen.findByText('This is not for your role')).toBeTruthy()
    expect(screen.getByRole('button', { name: 'Try again' })).toBeTruthy()
  })

  it('puts two side by side and marks where they differ', async () => {
    const other = { id: 's2', name: 'Upper band' }
    const content = { ...scenario().content, waterLevel: 3.54 }
    fakeApi({
      ...projectRoutes(),
      [SCENARIOS]: () => pageOf([listItem(), listItem({ ...other, content })]),
      [`GET /api${PATH}/scenarios/s2`]: () => scenario({ ...other, content }),
    })
    await openPage(PATH)
    for (const name of ['Compare Tonight', 'Compare Upper band'])
      await userEvent.click(await screen.findByRole('checkbox', { name }))
    const table = await screen.findByRole('table', { name: /Two scenarios/ })
    const row = within(table).getByRole('row', { name: /Water level/ })
    expect(row.textContent).toContain('differs')
    expect(row.textContent).toContain('3.54')
    expect(within(table).queryByRole('row', { name: /Friction/ })).toBeNull()
    expect(screen.getByText(/Everything else is the same/)).toBeTruthy()
  })

  it('copies the table as text where the browser takes no tables', async () => {
    const writeText = vi.fn(() => Promise.resolve())
    fakeApi(projectRoutes())
    await openPage(PATH)
    await screen.findByRole('row', { name: /Tonight/ })
    vi.stubGlobal('navigator', { ...navigator, onLine: true, clipboard: { writeText } })
    await press('Copy table')
    expect(await screen.findByText('The table is copied as text.')).toBeTruthy()
    expect(writeText).toHaveBeenCalledWith(
      expect.stringMatching(/^Scenario\tLevel[\s\S]*Tonight\t3\.420 m/),
    )
  })
})

describe('the survey', () => {
  it('is saved as a whole on its version, decimal commas read', async () => {
    const api = fakeApi({
      ...projectRoutes(),
      [`PATCH /api${PATH}`]: ({ body }) => line({ ...(body as Partial<Line>), version: 2 }),
    })
    await openPage(PATH)
    await press('Change the survey')
    const ground = cell('Ground, row 6')
    await userEvent.clear(ground)
    await userEvent.type(ground, '2,81')
    await press('Save the survey')
    expect(await screen.findByText(/Survey saved/)).toBeTruthy()
    const [sent] = api.sent(`PATCH /api${PATH}`) as [
      { version: number; stations: Line['stations'] },
    ]
    expect(sent.version).toBe(1)
    expect(sent.stations).toHaveLength(28)
    expect(sent.stations[5]).toMatchObject({ chainage: 45, groundLevel: 2.81 })
  })

  it('takes rows that are pasted into a cell, as a spreadsheet does', async () => {
    fakeApi(projectRoutes())
    await openPage(PATH)
    await press('Change the survey')
    await userEvent.click(cell('Ground, row 27'))
    await userEvent.paste('3,40\tturf\n3,60\tturf\n3,70\tturf')
    const read = (name: string) => cell(name).value
    expect(read('Ground, row 28')).toBe('3,60')
    expect(read('Ground, row 29')).toBe('3,70')
    expect(screen.getByText('Row 29, Chainage: nothing entered')).toBeTruthy()
  })

  it('of two thousand stations is typed into page by page, with the keys of a spreadsheet', async () => {
    fakeApi({ ...projectRoutes(), [`GET /api${PATH}`]: () => line({ stations: manyStations() }) })
    await openPage(PATH)
    expect(await screen.findByText('1 to 50 of 2000')).toBeTruthy()
    await press('Change the survey')
    expect(document.querySelectorAll('[aria-label^="Ground, row"]')).toHaveLength(50)
    await userEvent.type(cell('Ground, row 50'), '{ArrowDown}')
    expect(document.activeElement).toBe(cell('Ground, row 51'))
    expect(screen.getByText('51 to 100 of 2000')).toBeTruthy()
    await userEvent.type(cell('Ground, row 51'), 'low{ArrowUp}')
    expect(document.activeElement).toBe(cell('Ground, row 50'))
    await press('Row 51, Ground: not a number')
    expect(document.activeElement).toBe(cell('Ground, row 51'))
    await press('Add a station')
    expect(document.activeElement).toBe(cell('Chainage, row 2001'))
  })

  it('shows what the server refused and keeps what was typed', async () => {
    fakeApi({
      ...projectRoutes(),
      [`PATCH /api${PATH}`]: () =>
        refuse(422, 'out-of-range', { fields: [field('stations[0].groundLevel', '0 to 1 m')] }),
    })
    await openPage(PATH)
    await press('Change the survey')
    const note = cell('Note, row 1')
    await userEvent.type(note, ', checked')
    await press('Save the survey')
    expect(await screen.findByText('Something does not fit yet')).toBeTruthy()
    expect(note.value).toContain(', checked')
  })

  it('warns of what looks like a slip and lets it stand', async () => {
    fakeApi(projectRoutes())
    await openPage(PATH)
    await press('Change the survey')
    const x = cell('x, row 2')
    await userEvent.clear(x)
    await userEvent.type(x, '14')
    expect(screen.getByText(/^Row 2: 10 is 10\.00 m from the station before it/)).toBeTruthy()
    const save = button('Save the survey')
    expect(save.disabled).toBe(false)
  })
})
