// @vitest-environment jsdom
import { screen, waitFor, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import type { Person } from '../../../../shared/schemas/account'
import { account, fakeApi, refuse } from '../../support/fake-api'
import { clearPage, openPage, stubPage } from '../../support/open-page'

beforeEach(stubPage)
afterEach(clearPage)

function person(id: string, name: string, change: Partial<Person> = {}): Person {
  return {
    id,
    email: `${id}@example.invalid`,
    name,
    organisation: { id: 'org-1', name: 'Firm' },
    role: 'engineer',
    mayCheck: false,
    mayApprove: false,
    createdAt: 0,
    deactivatedAt: null,
    leads: 0,
    ...change,
  }
}
const pageOf = (items: readonly object[], total = items.length) => ({
  items,
  page: 1,
  pageSize: 50,
  total,
})
const admin = account({ id: 'admin', name: 'Administrator', role: 'admin' })
const everybody = [
  person('admin', 'Administrator', { role: 'admin' }),
  person('lead', 'Lead', { leads: 2 }),
  person('next', 'Successor'),
  person('watch', 'Viewer', { role: 'viewer' }),
  person('gone', 'Gone', { deactivatedAt: 1 }),
]
const base = {
  'GET /api/session': () => ({ account: admin }),
  'GET /api/admin/people': () => pageOf(everybody),
  'GET /api/admin/organisations': () => ({
    organisations: [
      { id: 'org-1', name: 'Firm', people: 5 },
      { id: 'org-2', name: 'Checkers', people: 0 },
    ],
  }),
}
const click = async (name: string | RegExp) =>
  userEvent.click(await screen.findByRole('button', { name }))

describe('people', () => {
  it('are listed, and nobody is offered to deactivate themselves', async () => {
    fakeApi(base)
    await openPage('/admin/people')
    const own = await screen.findByRole('row', { name: /^Administrator/ })
    expect(within(own).queryByRole('button', { name: /Deactivate/ })).toBeNull()
    expect(within(own).getByRole('button', { name: 'Change Administrator' })).toBeTruthy()
    const gone = screen.getByRole('row', { name: /^Gone/ })
    expect(within(gone).getAllByRole('button')).toHaveLength(1)
  })

  it('are searched at the server, and the search stands in the address', async () => {
    const api = fakeApi(base)
    const { router } = await openPage('/admin/people?page=2')
    await userEvent.type(
      await screen.findByLabelText('Name, address or organisation'),
      'lead{Enter}',
    )
    await waitFor(() =>
      expect(router.currentRoute.value.fullPath).toBe('/admin/people?search=lead'),
    )
    await waitFor(() => {
      const { query } = api.calls.filter(({ path }) => path === '/api/admin/people').at(-1)!
      expect([query.get('search'), query.get('page')]).toEqual(['lead', '1'])
    })
  })

  it('that nobody fits lead back to everybody', async () => {
    fakeApi({
      ...base,
      'GET /api/admin/people': ({ query }) => pageOf(query.get('search') ? [] : everybody),
    })
    await openPage('/admin/people?search=xyz')
    expect(await screen.findByText('Nothing fits')).toBeTruthy()
    await click('Show everything')
    expect(await screen.findByRole('row', { name: /^Lead/ })).toBeTruthy()
  })

  it('are turned over page by page', async () => {
    fakeApi({ ...base, 'GET /api/admin/people': () => pageOf(everybody, 120) })
    const { router } = await openPage('/admin/people')
    expect(await screen.findByText('1 to 50 of 120')).toBeTruthy()
    await click('Next')
    expect(await screen.findByText('51 to 100 of 120')).toBeTruthy()
    expect(router.currentRoute.value.query).toEqual({ page: '2' })
  })
})

describe('a change', () => {
  it('of the role to checking engineer brings both permissions', async () => {
    const api = fakeApi({
      ...base,
      'PATCH /api/admin/people/next': ({ body }) => ({ ...everybody[2], ...(body as object) }),
    })
    await openPage('/admin/people')
    await click('Change Successor')
    const dialog = screen.getByRole('dialog', { name: 'Change Successor' })
    await userEvent.selectOptions(within(dialog).getByLabelText('Role'), 'Checking engineer')
    await userEvent.selectOptions(within(dialog).getByLabelText('Organisation'), 'Checkers')
    expect(within(dialog).getByLabelText<HTMLInputElement>('May check').disabled).toBe(true)
    await userEvent.click(within(dialog).getByRole('button', { name: 'Save' }))
    expect(await screen.findByText('Successor is changed.')).toBeTruthy()
    expect(api.sent('PATCH /api/admin/people/next')).toEqual([
      { role: 'checker', mayCheck: true, mayApprove: true, organisationId: 'org-2' },
    ])
  })

  it('that is refused says why, in the dialog', async () => {
    const message = 'person: this is the last administrator; name another one first'
    fakeApi({
      ...base,
      'PATCH /api/admin/people/admin': () => refuse(409, 'conflict', { message }),
    })
    await openPage('/admin/people')
    await click('Change Administrator')
    const dialog = screen.getByRole('dialog')
    await userEvent.selectOptions(within(dialog).getByLabelText('Role'), 'Viewer')
    await userEvent.click(within(dialog).getByRole('button', { name: 'Save' }))
    expect((await within(dialog).findByRole('alert')).textContent).toContain(message)
  })
})

describe('a deactivation', () => {
  it('asks who leads from now on, and offers only people who may', async () => {
    const api = fakeApi({
      ...base,
      'POST /api/admin/people/lead/deactivation': () => ({ ...everybody[1], deactivatedAt: 1 }),
    })
    await openPage('/admin/people')
    await click('Deactivate Lead')
    const dialog = screen.getByRole('dialog', { name: 'Deactivate Lead?' })
    expect(within(dialog).getByText(/This person alone leads 2 projects\./)).toBeTruthy()
    const successor = within(dialog).getByLabelText('Successor')
    await within(successor).findByText('Successor, Firm')
    expect(
      within(successor)
        .getAllByRole('option')
        .map(({ textContent }) => textContent?.trim()),
    ).toEqual(['Choose somebody', 'Successor, Firm'])
    const confirm = within(dialog).getByRole('button', { name: 'Deactivate' })
    await userEvent.click(confirm)
    expect(within(dialog).getByText('Name somebody')).toBeTruthy()
    await userEvent.selectOptions(successor, 'Successor, Firm')
    await userEvent.click(confirm)
    expect(await screen.findByText('Lead is deactivated.')).toBeTruthy()
    expect(api.sent('POST /api/admin/people/lead/deactivation')).toEqual([{ handOverTo: 'next' }])
  })

  it('needs no successor for somebody who leads nothing', async () => {
    const api = fakeApi({
      ...base,
      'POST /api/admin/people/watch/deactivation': () => ({ ...everybody[3], deactivatedAt: 1 }),
    })
    await openPage('/admin/people')
    await click('Deactivate Viewer')
    const dialog = screen.getByRole('dialog')
    await userEvent.click(within(dialog).getByRole('button', { name: 'Deactivate' }))
    await screen.findByText('Viewer is deactivated.')
    expect(api.sent('POST /api/admin/people/watch/deactivation')).toEqual([{ handOverTo: null }])
  })
})

describe('an invitation', () => {
  it('goes to an address, with role and organisation', async () => {
    const api = fakeApi({ ...base, 'POST /api/admin/invitations': ({ body }) => body })
    await openPage('/admin/people')
    await waitFor(() =>
      expect(
        screen.getByRole<HTMLButtonElement>('button', { name: 'Invite somebody' }).disabled,
      ).toBe(false),
    )
    await click('Invite somebody')
    const dialog = screen.getByRole('dialog', { name: 'Invite somebody' })
    const send = within(dialog).getByRole('button', { name: 'Send the invitation' })
    await userEvent.click(send)
    expect(within(dialog).getByText('Enter an address')).toBeTruthy()
    await userEvent.type(within(dialog).getByLabelText('Address'), 'new@example.invalid')
    await userEvent.click(send)
    expect(
      await screen.findByText('The invitation to new@example.invalid is on its way.'),
    ).toBeTruthy()
    expect(api.sent('POST /api/admin/invitations')).toEqual([
      {
        email: 'new@example.invalid',
        name: '',
        role: 'engineer',
        mayCheck: false,
        mayApprove: false,
        organisationId: 'org-1',
      },
    ])
  })
})

it('is closed to other roles', async () => {
  fakeApi({
    ...base,
    'GET /api/session': () => ({ account: account() }),
    'GET /api/account/sessions': () => ({ sessions: [] }),
  })
  const { router } = await openPage('/admin/people')
  expect(router.currentRoute.value.path).toBe('/account')
  expect(await screen.findByText(/\/admin\/people is not for your role \(Engineer\)/)).toBeTruthy()
})
