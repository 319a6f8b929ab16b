// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import type { Desk } from '../../../src/api/projects'
import { account, fakeApi, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'
import { pageOf, project, projectRoutes } from '../support/projects'

beforeEach(stubPage)
afterEach(clearPage)

const at = Date.UTC(2026, 2, 29, 21, 45)
const member = (id: string, name: string, role: string) => ({
  accountId: id,
  name,
  organisation: 'Firm',
  role,
  accountRole: 'engineer',
  mayCheck: false,
  mayApprove: false,
  isActive: true,
  addedAt: at,
})
const routes = (role: 'lead' | 'editor' | 'reader' = 'lead') => ({
  ...projectRoutes(role),
  'GET /api/projects/p/lines': () => pageOf([]),
  'GET /api/projects/p/files': () => ({ files: [] }),
  'GET /api/projects/p/members': () => ({
    members: [member('account-1', 'Engineer', 'lead'), member('b', 'Engineer B', 'editor')],
  }),
})
const press = async (name: string) => userEvent.click(await screen.findByRole('button', { name }))
const dialog = (name: string) => screen.findByRole('dialog', { name })

describe('a project', () => {
  it('gets a gauge with its zero and correction', async () => {
    const api = fakeApi({ ...routes(), 'POST /api/projects/p/gauges': ({ body }) => body })
    await openPage('/projects/p')
    await press('Add a gauge')
    const form = within(await dialog('Add a gauge'))
    await userEvent.type(form.getByLabelText('Name'), 'Bridge')
    await userEvent.type(form.getByLabelText('Zero'), '0,75')
    await userEvent.click(form.getByRole('button', { name: 'Save' }))
    expect(api.sent('POST /api/projects/p/gauges')).toEqual([
      { name: 'Bridge', zero: 0.75, correction: 0, note: '' },
    ])
  })

  it('is deleted for good only when its name is typed', async () => {
    let isGone = false
    const api = fakeApi({
      ...routes(),
      'GET /api/projects/p': () => project({ archivedAt: at }),
      'DELETE /api/projects/p': () => {
        isGone = true
      },
      'GET /api/projects': () => pageOf([]),
    })
    const { router } = await openPage('/projects/p')
    await press('Delete for good')
    const form = within(await dialog('Delete for good'))
    const button = form.getByRole<HTMLButtonElement>('button', { name: 'Delete for good' })
    await userEvent.type(form.getByLabelText('Name of the project'), 'Ferry')
    expect(button.disabled).toBe(true)
    await userEvent.type(form.getByLabelText('Name of the project'), ' Quay')
    await userEvent.click(button)
    expect(await screen.findByText('“Ferry Quay” is deleted.')).toBeTruthy()
    await waitFor(() => expect(router.currentRoute.value.path).toBe('/projects'))
    expect(isGone).toBe(true)
    expect(api.sent('DELETE /api/projects/p')).toHaveLength(1)
  })

  it('shows why somebody was not added, and keeps what was typed', async () => {
    fakeApi({
      ...routes(),
      'POST /api/projects/p/members': () =>
        refuse(409, 'conflict', { message: 'Already a member.' }),
    })
    await openPage('/projects/p')
    await press('Add somebody')
    const form = within(await dialog('Add somebody to the project'))
    const field = form.getByLabelText<HTMLInputElement>('Address of their account')
    await userEvent.type(field, 'b@example.invalid')
    await userEvent.click(form.getByRole('button', { name: 'Add' }))
    expect(await screen.findByText('Already a member.')).toBeTruthy()
    expect(field.value).toBe('b@example.invalid')
  })

  it.each(['editor', 'reader'] as const)('leaves members to its lead: %s', async (role) => {
    fakeApi(routes(role))
    await openPage('/projects/p')
    expect(await screen.findByText('Engineer B')).toBeTruthy()
    for (const name of ['Add somebody', 'Remove Engineer B', 'Archive'])
      expect(screen.queryByRole('button', { name })).toBeNull()
    expect(screen.queryByRole('button', { name: 'Add a gauge' }) === null).toBe(role === 'reader')
  })
})

describe('the desk', () => {
  const desk = (change: Partial<Desk> = {}): Desk => ({
    projects: [],
    waiting: [],
    changes: [],
    ...change,
  })

  it('leads on where there is no project: an engineer makes one, others are added', async () => {
    fakeApi({ ...projectRoutes(), 'GET /api/desk': () => desk() })
    await openPage('/desk')
    expect(await screen.findByText('Make the first project')).toBeTruthy()
    clearPage()
    stubPage()
    fakeApi({
      'GET /api/session': () => ({ account: account({ role: 'viewer' }) }),
      'GET /api/desk': () => desk(),
    })
    await openPage('/desk')
    expect(await screen.findByText('You are in no project yet')).toBeTruthy()
    expect(screen.queryByRole('button', { name: 'New project' })).toBeNull()
  })

  it('says who changed what, with the way there', async () => {
    const change = {
      at,
      actorName: 'Engineer B',
      action: 'scenario.saved',
      subjectType: 'scenario',
      subjectName: 'Tonight',
      project: { id: 'p', name: 'Ferry Quay' },
      lineId: 'l',
      scenarioId: 's',
    }
    fakeApi({
      ...projectRoutes(),
      'GET /api/desk': () => desk({ projects: [project()], changes: [change] }),
    })
    await openPage('/desk')
    expect(await screen.findByText(/Engineer B saved the scenario/)).toBeTruthy()
    const link = screen.getByRole('link', { name: 'Tonight' })
    expect(link.getAttribute('href')).toBe('/projects/p/lines/l/scenarios/s')
  })

  it('makes a project and opens it', async () => {
    const api = fakeApi({
      ...routes(),
      'GET /api/desk': () => desk(),
      'POST /api/projects': () => project(),
    })
    const { router } = await openPage('/desk')
    await userEvent.click((await screen.findAllByRole('button', { name: 'New project' }))[0]!)
    const form = within(await dialog('New project'))
    await userEvent.type(form.getByLabelText('Name'), 'Ferry Quay')
    await userEvent.type(form.getByLabelText('Datum'), 'QD')
    await userEvent.click(form.getByRole('button', { name: 'Make the project' }))
    expect(await screen.findByRole('heading', { name: 'Ferry Quay' })).toBeTruthy()
    expect(router.currentRoute.value.path).toBe('/projects/p')
    expect(api.sent('POST /api/projects')).toMatchObject([{ name: 'Ferry Quay', datum: 'QD' }])
  })
})
