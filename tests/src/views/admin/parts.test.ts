// @vitest-environment jsdom
import { screen, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { account, fakeApi, refuse } from '../../support/fake-api'
import { clearPage, openPage, stubPage } from '../../support/open-page'

beforeEach(stubPage)
afterEach(clearPage)

const pageOf = (items: readonly object[]) => ({ items, page: 1, pageSize: 50, total: items.length })
const at = Date.UTC(2026, 2, 29, 12, 0)
const base = {
  'GET /api/session': () => ({ account: account({ role: 'admin' }) }),
  'GET /api/admin/organisations': () => ({
    organisations: [{ id: 'org-1', name: 'Firm', people: 5 }],
  }),
}
const click = async (name: string | RegExp) =>
  userEvent.click(await screen.findByRole('button', { name }))

describe('invitations', () => {
  const invitation = {
    id: 'inv-1',
    email: 'new@example.invalid',
    name: '',
    role: 'engineer',
    mayCheck: false,
    mayApprove: false,
    organisation: { id: 'org-1', name: 'Firm' },
    createdAt: at,
    expiresAt: at + 1,
    state: 'open',
  }

  it('can be revoked while they are open', async () => {
    const used = { ...invitation, id: 'inv-2', email: 'used@example.invalid', state: 'accepted' }
    const api = fakeApi({
      ...base,
      'GET /api/admin/invitations': () => ({ invitations: [invitation, used] }),
      'DELETE /api/admin/invitations/inv-1': () => undefined,
    })
    await openPage('/admin/invitations')
    await click('Revoke the invitation of new@example.invalid')
    expect(
      await screen.findByText('The invitation of new@example.invalid is revoked.'),
    ).toBeTruthy()
    expect(api.sent('DELETE /api/admin/invitations/inv-1')).toHaveLength(1)
    expect(screen.queryByRole('button', { name: /used@example/ })).toBeNull()
  })

  it('lead on where there are none', async () => {
    fakeApi({ ...base, 'GET /api/admin/invitations': () => ({ invitations: [] }) })
    await openPage('/admin/invitations')
    expect(await screen.findByText('No invitation yet')).toBeTruthy()
    expect(screen.getByRole('button', { name: 'Invite somebody' })).toBeTruthy()
  })
})

describe('organisations', () => {
  it('are added and renamed; a name that is taken is refused beside the form', async () => {
    const message = 'name: there is an organisation "Firm" already'
    const api = fakeApi({
      ...base,
      'POST /api/admin/organisations': ({ body }) =>
        (body as { name: string }).name === 'Firm'
          ? refuse(409, 'conflict', { message })
          : { id: 'org-2', people: 0, ...(body as object) },
      'PATCH /api/admin/organisations/org-1': ({ body }) => ({
        id: 'org-1',
        people: 5,
        ...(body as object),
      }),
    })
    await openPage('/admin/organisations')
    const name = await screen.findByLabelText('New organisation')
    await userEvent.type(name, 'Firm{Enter}')
    expect((await screen.findByRole('alert')).textContent).toContain(message)
    await userEvent.clear(name)
    await userEvent.type(name, 'Harbour office{Enter}')
    expect(await screen.findByText('Harbour office is added.')).toBeTruthy()

    await click('Rename Firm')
    const input = screen.getByLabelText('Rename Firm')
    await userEvent.clear(input)
    await userEvent.type(input, 'Firm and Sons{Enter}')
    expect(await screen.findByText('Renamed to Firm and Sons.')).toBeTruthy()
    expect(api.sent('PATCH /api/admin/organisations/org-1')).toEqual([{ name: 'Firm and Sons' }])
  })
})

describe('the audit trail', () => {
  const entry = {
    id: 7,
    at,
    actorName: '',
    action: 'person.changed',
    subjectType: 'account',
    subjectId: 'account-2',
    subjectName: 'Trainer',
    projectId: null,
    fromVersion: 1,
    toVersion: 2,
    detail: {
      role: { from: 'viewer', to: 'trainer' },
      fields: ['name', 'unitSystem'],
      mayCheck: { from: false, to: true },
    },
  }

  it('shows who did what, from which version to which', async () => {
    fakeApi({ ...base, 'GET /api/admin/audit': () => pageOf([entry]) })
    await openPage('/admin/audit')
    const row = await screen.findByRole('row', { name: /changed the person/ })
    const cells = within(row)
      .getAllByRole('cell')
      .map(({ textContent }) => textContent?.trim())
    expect(cells).toEqual([
      '29 Mar 2026, 12:00',
      'nobody signed in',
      'changed the person',
      'Trainer',
      '1 to 2',
      'role: viewer to trainer · changed: name, unit system · may check: no to yes',
    ])
  })

  it('is filtered at the server, and the file holds the same', async () => {
    const api = fakeApi({ ...base, 'GET /api/admin/audit': () => pageOf([entry]) })
    await openPage('/admin/audit?search=lock&about=gauge&from=2026-03-01&to=2026-03-29')
    await screen.findByRole('table', { name: 'Audit trail' })
    const { query } = api.calls.find(({ path }) => path === '/api/admin/audit')!
    const from = new Date(2026, 2, 1).getTime()
    const to = new Date(2026, 2, 30).getTime() - 1
    const wanted = { search: 'lock', action: 'gauge.', from: String(from), to: String(to) }
    expect(Object.fromEntries(query)).toEqual({ ...wanted, page: '1' })
    const href = screen.getByRole('link', { name: 'Download as CSV' }).getAttribute('href')
    expect(href).toBe(`/api/admin/audit.csv?${new URLSearchParams(wanted)}`)
  })
})

describe('mail', () => {
  const mail = {
    id: 'mail-1',
    recipient: 'new@example.invalid',
    subject: 'You are invited to Toehold',
    state: 'failed',
    tries: 5,
    lastError: 'no answer',
    createdAt: at,
    sentAt: null,
  }

  it('that did not leave can be opened and sent again', async () => {
    const api = fakeApi({
      ...base,
      'GET /api/admin/mails': () => pageOf([mail]),
      'POST /api/admin/mails/mail-1/retry': () => undefined,
    })
    await openPage('/admin/mail')
    expect(await screen.findByText('no answer')).toBeTruthy()
    const file = screen.getByRole('link', { name: /^Open the mail to new@example/ })
    expect(file.getAttribute('href')).toBe('/api/admin/mails/mail-1')
    await click('Send the mail to new@example.invalid again')
    await screen.findByText('The mail to new@example.invalid is waiting to be sent.')
    expect(api.sent('POST /api/admin/mails/mail-1/retry')).toHaveLength(1)
  })

  it('that was sent offers neither', async () => {
    fakeApi({
      ...base,
      'GET /api/admin/mails': () => pageOf([{ ...mail, state: 'sent', lastError: '', sentAt: at }]),
    })
    await openPage('/admin/mail')
    const row = await screen.findByRole('row', { name: /You are invited/ })
    expect(within(row).queryByRole('link')).toBeNull()
    expect(within(row).queryByRole('button')).toBeNull()
  })
})
