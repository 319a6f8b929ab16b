// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import type { ScenarioSave } from '../../../src/api/scenarios'
import { draftStore } from '../../../src/scenario/kept-draft'
import { stateOf } from '../../../src/scenario/scenario-state'
import { fakeApi, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'
import { projectRoutes, scenario, stubDrawing } from '../support/projects'

beforeEach(() => {
  stubPage()
  stubDrawing()
})
afterEach(clearPage)

const PATH = '/projects/p/lines/l/scenarios/s'
const SAVE = `PUT /api${PATH}`
const taken = ({ body }: { body: unknown }) => {
  const { version, ...state } = body as ScenarioSave
  return scenario({ ...stateOf(state as ReturnType<typeof scenario>), version: version + 1 })
}
/** Queries of the library ask every node of the drawing for its labels: on this page they take seconds. */
function labelled(name: string): HTMLInputElement {
  const labels = [...document.querySelectorAll('label')]
  const label = labels.find(({ textContent }) => textContent.trim() === name)
  const input = label?.control ?? document.querySelector(`input[aria-label="${name}"]`)
  if (!(input instanceof HTMLInputElement)) throw new Error(`No field is labelled "${name}"`)
  return input
}
const field = (name: string) => waitFor(() => labelled(name))
const button = (name: string) =>
  [...document.querySelectorAll('button, [role=button]')].find(
    ({ textContent }) => textContent.trim() === name,
  )
const press = async (name: string) => {
  const find = () => button(name) ?? expect.fail(`No button says "${name}"`)
  await userEvent.click(await waitFor(find))
}
function openDialog(name: string): HTMLElement {
  const dialog = document.querySelector<HTMLElement>('dialog[open]')
  const title = document.getElementById(dialog?.getAttribute('aria-labelledby') ?? '')
  expect(title?.textContent.trim()).toBe(name)
  return dialog!
}
const dialogCalled = (name: string) => waitFor(() => openDialog(name))
vi.setConfig({ testTimeout: 30_000 })
const retype = async (name: string, text: string) => {
  const input = await field(name)
  await userEvent.clear(input)
  await userEvent.type(input, text)
}
/** Leaving a field saves at once, without the rest after the last key. */
async function leaveField(): Promise<void> {
  await nextTick()
  ;(document.activeElement as HTMLElement | null)?.blur()
}
async function saved(): Promise<void> {
  await leaveField()
  const standing = () => document.querySelector('[data-testid=saving]')?.textContent
  await waitFor(() => expect(standing()).toContain('Saved at'))
}

describe('the workbench of a scenario', () => {
  it('puts level first and depth in brackets, for the place and for the line', async () => {
    fakeApi(projectRoutes())
    await openPage(PATH)
    await field('Water level')
    expect(document.body.textContent).toMatch(/Level 3\.420.m \(0\.630.m of water\)/)
    expect(screen.getByTestId('line-verdict').textContent).toContain('Does not hold')
    expect(document.body.textContent).toMatch(/The line holds to 3\.\d{3}/)
  })

  it('keeps a depth that is typed at the place as level', async () => {
    const api = fakeApi({ ...projectRoutes(), [SAVE]: taken })
    await openPage(PATH)
    await retype('Depth here', '0,5')
    expect((await field('Water level')).value).toBe('3.29')
    await saved()
    expect(api.sent(SAVE).at(-1)).toMatchObject({ content: { waterLevel: 3.29 } })
  })

  it('turns a reading of a gauge into the level at the site', async () => {
    fakeApi({ ...projectRoutes(), [SAVE]: taken })
    await openPage(PATH)
    await press('From a gauge')
    await retype('Reading', '2.70')
    await press('Take over')
    expect((await field('Water level')).value).toBe('3.26')
  })

  it('changes only what a panel was asked to change, and takes it back', async () => {
    const api = fakeApi({ ...projectRoutes(), [SAVE]: taken })
    await openPage(PATH)
    await retype('Friction', '0.3')
    await saved()
    const [{ content }] = api.sent(SAVE).slice(-1) as [ScenarioSave]
    expect(content.grounds.filter(({ friction }) => friction === 0.3)).toMatchObject([
      { surface: 'concrete' },
    ])
    await press('Undo')
    await waitFor(async () => expect((await field('Friction')).value).toBe('0.4'))
  })

  it('leaves a faulty entry where it was typed and saves nothing of it', async () => {
    const api = fakeApi({ ...projectRoutes(), [SAVE]: taken })
    await openPage(PATH)
    await retype('Crossfall', '80')
    expect(screen.getByTestId('saving').textContent).toContain('1 to correct')
    expect((await field('Crossfall')).value).toBe('80')
    expect(api.sent(SAVE)).toEqual([])
  })

  it('shows somebody else’s version field by field and saves what was picked on top of it', async () => {
    const theirs = scenario({ version: 7, updatedBy: { id: 'b', name: 'Engineer B' } })
    const current = { ...theirs, content: { ...theirs.content, waterLevel: 3.6 } }
    let isFirst = true
    const api = fakeApi({
      ...projectRoutes(),
      [SAVE]: (call) => {
        if (!isFirst) return taken(call)
        isFirst = false
        return refuse(409, 'conflict', { current })
      },
    })
    await openPage(PATH)
    await retype('Water level', '3.2')
    await leaveField()
    const dialog = await dialogCalled('Somebody else saved meanwhile')
    const row = within(dialog).getByRole('row', { name: /Water level/ })
    expect(row.textContent).toContain('3.20')
    expect(row.textContent).toContain('3.60')
    expect(row.textContent).toContain('both changed it')
    const save = within(dialog).getByRole<HTMLButtonElement>('button', { name: 'Save this' })
    expect(save.disabled).toBe(true)
    await userEvent.click(within(row).getByRole('radio', { name: 'Water level: Mine' }))
    await userEvent.click(save)
    await saved()
    expect(api.sent(SAVE).at(-1)).toMatchObject({ version: 7, content: { waterLevel: 3.2 } })
  })

  it('brings back what was not saved, on the version that it was made on', async () => {
    const state = { ...stateOf(scenario()), name: 'Typed before the session ended' }
    draftStore('s').write({ version: 1, state, refused: { fall: 'steep' } })
    const api = fakeApi({ ...projectRoutes(), [SAVE]: taken })
    await openPage(PATH)
    expect((await field('Name of the scenario')).value).toBe('Typed before the session ended')
    expect((await field('Crossfall')).value).toBe('steep')
    await waitFor(() => expect(api.sent(SAVE)).toHaveLength(1))
  })

  it('asks where what was kept was made on an older version', async () => {
    const state = { ...stateOf(scenario()), name: 'Mine' }
    draftStore('s').write({ version: 1, state, refused: {} })
    const api = fakeApi({
      ...projectRoutes(),
      [`GET /api${PATH}`]: () => scenario({ name: 'Theirs', version: 3 }),
      [SAVE]: taken,
    })
    await openPage(PATH)
    const dialog = await dialogCalled('Somebody else saved meanwhile')
    expect(within(dialog).getByRole('row', { name: /Name/ }).textContent).toContain('Theirs')
    expect(api.sent(SAVE)).toEqual([])
  })

  it('shows a reader everything and lets them change nothing', async () => {
    fakeApi(projectRoutes('reader'))
    await openPage(PATH)
    expect((await field('Water level')).readOnly).toBe(true)
    expect((await field('Friction')).readOnly).toBe(true)
    expect(document.body.textContent).toContain('You read this project')
    for (const name of ['Undo', 'Lay another tube here']) expect(button(name)).toBeUndefined()
  })

  it('says that it cannot be reached, and tries again when it is asked to', async () => {
    let isUp = false
    const routes = projectRoutes()
    fakeApi({
      ...routes,
      'GET /api/projects/p/lines/l': () =>
        isUp ? routes['GET /api/projects/p/lines/l']() : refuse(403, 'forbidden'),
    })
    await openPage(PATH)
    expect(await screen.findByText('This is not for your role')).toBeTruthy()
    isUp = true
    await press('Try again')
    expect(await field('Water level')).toBeTruthy()
  })
})
