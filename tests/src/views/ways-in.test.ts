// @vitest-environment jsdom
import { screen, waitFor } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { account, fakeApi, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'

beforeEach(stubPage)
afterEach(clearPage)

const at = Date.UTC(2026, 2, 29, 12, 0)
const nobody = { 'GET /api/session': () => ({ account: null }) }
const invitation = {
  email: 'new@example.invalid',
  name: '',
  organisation: 'Firm',
  role: 'checker',
  expiresAt: at,
}
const click = async (name: string) => userEvent.click(await screen.findByRole('button', { name }))

describe('an invitation', () => {
  it('is accepted with a name and a password, and signs in', async () => {
    const api = fakeApi({
      ...nobody,
      'GET /api/invitations/token': () => invitation,
      'POST /api/invitations/token': () => ({ account: account({ name: 'Checker' }) }),
    })
    const { router } = await openPage('/invite/token')
    expect(await screen.findByText('Firm invites you as Checking engineer.')).toBeTruthy()
    await click('Accept and sign in')
    expect(screen.getByText('Enter a name')).toBeTruthy()
    expect(screen.getByText('Twelve characters or more')).toBeTruthy()
    await userEvent.type(screen.getByLabelText('Name'), 'Checker')
    await userEvent.type(screen.getByLabelText('Password'), 'the gauge board at dusk')
    await click('Accept and sign in')
    await waitFor(() => expect(router.currentRoute.value.path).toBe('/desk'))
    expect(await screen.findByRole('button', { name: 'Signed in as Checker' })).toBeTruthy()
    expect(api.sent('POST /api/invitations/token')).toEqual([
      {
        name: 'Checker',
        password: 'the gauge board at dusk',
        registrationNumber: '',
        timeZone: new Intl.DateTimeFormat().resolvedOptions().timeZone,
        unitSystem: 'metric',
      },
    ])
  })

  it('asks the first administrator for an address', async () => {
    const api = fakeApi({
      ...nobody,
      'GET /api/invitations/token': () => ({ ...invitation, email: '', role: 'admin' }),
      'POST /api/invitations/token': () => ({ account: account() }),
    })
    await openPage('/invite/token')
    await userEvent.type(await screen.findByLabelText('Address'), 'admin@example.invalid')
    await userEvent.type(screen.getByLabelText('Name'), 'Administrator')
    await userEvent.type(screen.getByLabelText('Password'), 'the gauge board at dusk')
    await click('Accept and sign in')
    await waitFor(() => expect(api.sent('POST /api/invitations/token')).toHaveLength(1))
    expect(api.sent('POST /api/invitations/token')[0]).toMatchObject({
      email: 'admin@example.invalid',
    })
  })

  it('that was used leads on', async () => {
    fakeApi(nobody)
    await openPage('/invite/used')
    expect(await screen.findByText('This invitation cannot be accepted any more')).toBeTruthy()
  })
})

describe('a forgotten password', () => {
  it('is answered alike for every address', async () => {
    const api = fakeApi({ ...nobody, 'POST /api/password-resets': () => undefined })
    await openPage('/reset')
    await click('Send the link')
    expect(screen.getByText('Enter your address')).toBeTruthy()
    await userEvent.type(screen.getByLabelText('Address'), 'who@example.invalid')
    await click('Send the link')
    expect(await screen.findByText(/^If who@example\.invalid has an account/)).toBeTruthy()
    expect(api.sent('POST /api/password-resets')).toEqual([{ email: 'who@example.invalid' }])
  })

  it('is replaced by the link', async () => {
    const api = fakeApi({
      ...nobody,
      'GET /api/password-resets/token': () => ({ name: 'Engineer', expiresAt: at }),
      'POST /api/password-resets/token': () => undefined,
    })
    await openPage('/reset/token')
    await userEvent.type(await screen.findByLabelText('New password'), 'the gauge board at dusk')
    await click('Save the new password')
    expect(await screen.findByText('The new password is saved')).toBeTruthy()
    expect(api.sent('POST /api/password-resets/token')).toEqual([
      { password: 'the gauge board at dusk' },
    ])
  })

  it('has a link that runs out, even while the page is open', async () => {
    fakeApi({
      ...nobody,
      'GET /api/password-resets/token': () => ({ name: 'Engineer', expiresAt: at }),
      'POST /api/password-resets/token': () => refuse(404, 'not-found'),
    })
    await openPage('/reset/token')
    await userEvent.type(await screen.findByLabelText('New password'), 'the gauge board at dusk')
    await click('Save the new password')
    expect(await screen.findByText('This link does not work any more')).toBeTruthy()
  })
})

describe('the menu of the account', () => {
  const signedIn = {
    'GET /api/session': () => ({ account: account() }),
    'GET /api/account/sessions': () => ({ sessions: [] }),
  }

  it('offers the administration to administrators only', async () => {
    fakeApi(signedIn)
    await openPage('/account')
    await click('Signed in as Engineer')
    expect(screen.getByRole('link', { name: 'My account' })).toBeTruthy()
    expect(screen.queryByRole('link', { name: 'Administration' })).toBeNull()
  })

  it('signs out', async () => {
    const api = fakeApi({ ...signedIn, 'DELETE /api/session': () => undefined })
    const { router } = await openPage('/account')
    await click('Signed in as Engineer')
    await click('Sign out')
    await waitFor(() => expect(router.currentRoute.value.path).toBe('/sign-in'))
    expect(api.sent('DELETE /api/session')).toHaveLength(1)
    expect(await screen.findByRole('link', { name: 'Sign in' })).toBeTruthy()
  })

  it('says so when signing out did not work, and stays signed in', async () => {
    fakeApi({ ...signedIn, 'DELETE /api/session': () => refuse(503, 'unavailable') })
    const { router } = await openPage('/account')
    await click('Signed in as Engineer')
    await click('Sign out')
    expect((await screen.findByRole('alert')).textContent).toContain('Not signed out')
    expect(router.currentRoute.value.path).toBe('/account')
  })
})
