// @vitest-environment jsdom
import { screen, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { usePreferences } from '../../../src/stores/preferences'
import { account, fakeApi, field, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'

beforeEach(stubPage)
afterEach(clearPage)

const CHROME = 'Mozilla/5.0 (X11; Linux x86_64) AppleWebKit/537.36 Chrome/140.0 Safari/537.36'
const PHONE = 'Mozilla/5.0 (iPhone; CPU iPhone OS 18_0 like Mac OS X) Version/18.0 Safari/604.1'
const at = Date.UTC(2026, 2, 29, 12, 0)
const sessions = [
  { id: 's-1', createdAt: at, expiresAt: at + 1, userAgent: CHROME, isThis: true },
  { id: 's-2', createdAt: at, expiresAt: at + 1, userAgent: PHONE, isThis: false },
]
const signedIn = {
  'GET /api/session': () => ({ account: account() }),
  'GET /api/account/sessions': () => ({ sessions }),
}
const retype = async (label: string, text: string) => {
  const input = await screen.findByLabelText(label)
  await userEvent.clear(input)
  await userEvent.type(input, text)
}
const press = (name: string) => userEvent.click(screen.getByRole('button', { name }))

describe('the profile', () => {
  it('is saved, and its units apply at once', async () => {
    const api = fakeApi({
      ...signedIn,
      'PATCH /api/account': ({ body }) => account(body as object),
    })
    const { pinia } = await openPage('/account')
    await retype('Name', 'Engineer in charge')
    await retype('Time zone', 'Europe/Lisbon')
    await userEvent.click(screen.getByRole('radio', { name: 'US' }))
    await press('Save')
    expect(await screen.findByText('Saved.')).toBeTruthy()
    expect(api.sent('PATCH /api/account')).toEqual([
      {
        name: 'Engineer in charge',
        registrationNumber: '',
        timeZone: 'Europe/Lisbon',
        unitSystem: 'us',
      },
    ])
    expect(usePreferences(pinia).units).toBe('us')
    expect(screen.getByRole('button', { name: 'Signed in as Engineer in charge' })).toBeTruthy()
  })

  it('names the field that is wrong', async () => {
    const api = fakeApi(signedIn)
    await openPage('/account')
    await retype('Name', ' ')
    await retype('Time zone', 'Nowhere/At all')
    await press('Save')
    expect(screen.getByText('Enter a name')).toBeTruthy()
    expect(screen.getByText('Choose one of the list, such as Europe/Lisbon')).toBeTruthy()
    expect(api.sent('PATCH /api/account')).toEqual([])
  })

  it('shows what the server allows beside the field', async () => {
    const fields = [field('registrationNumber', '60 characters or less')]
    fakeApi({ ...signedIn, 'PATCH /api/account': () => refuse(400, 'invalid-input', { fields }) })
    await openPage('/account')
    await retype('Registration number', 'R-1')
    await press('Save')
    expect(await screen.findByText('Allowed: 60 characters or less')).toBeTruthy()
    expect(screen.getByLabelText('Registration number').getAttribute('aria-invalid')).toBe('true')
  })
})

describe('the password', () => {
  it('is not changed by somebody who does not know the present one', async () => {
    const fields = [field('current', 'your present password')]
    fakeApi({
      ...signedIn,
      'PUT /api/account/password': () => refuse(400, 'invalid-input', { fields }),
    })
    await openPage('/account')
    await retype('Present password', 'guessed')
    await retype('New password', 'low water at noon')
    await press('Change the password')
    expect(await screen.findByText('This is not your present password')).toBeTruthy()
  })

  it('must be long, and the fields are empty once it is changed', async () => {
    const api = fakeApi({ ...signedIn, 'PUT /api/account/password': () => undefined })
    await openPage('/account')
    await retype('Present password', 'high water at seven')
    await retype('New password', 'short')
    await press('Change the password')
    expect(screen.getByText('Twelve characters or more')).toBeTruthy()
    await retype('New password', 'low water at noon')
    await press('Change the password')
    await screen.findByText('The password is changed; other sessions have ended.')
    expect(api.sent('PUT /api/account/password')).toEqual([
      { current: 'high water at seven', next: 'low water at noon' },
    ])
    expect(screen.getByLabelText<HTMLInputElement>('New password').value).toBe('')
  })
})

describe('open sessions', () => {
  it('are named by browser; another one is ended, this one is not', async () => {
    const api = fakeApi({ ...signedIn, 'DELETE /api/account/sessions/s-2': () => undefined })
    await openPage('/account')
    const table = await screen.findByRole('table', { name: 'Open sessions' })
    const [, mine, other] = within(table).getAllByRole('row')
    expect(mine!.textContent).toContain('Chrome on Linux')
    expect(mine!.textContent).toContain('29 Mar 2026, 12:00')
    expect(within(mine!).queryByRole('button')).toBeNull()
    await userEvent.click(
      within(other!).getByRole('button', { name: /^Sign out Safari on iPhone/ }),
    )
    expect(await screen.findByText('That session has ended.')).toBeTruthy()
    expect(api.sent('DELETE /api/account/sessions/s-2')).toHaveLength(1)
  })

  it('all end after a question', async () => {
    const api = fakeApi({ ...signedIn, 'DELETE /api/account/sessions': () => undefined })
    const { router } = await openPage('/account')
    await userEvent.click(await screen.findByRole('button', { name: 'Sign out everywhere' }))
    const dialog = screen.getByRole('dialog', { name: 'Sign out everywhere?' })
    expect(api.sent('DELETE /api/account/sessions')).toEqual([])
    await userEvent.click(within(dialog).getByRole('button', { name: 'Sign out everywhere' }))
    await screen.findByLabelText('Address')
    expect(router.currentRoute.value.path).toBe('/sign-in')
  })

  it('say what failed, and load when asked again', async () => {
    let isBroken = true
    fakeApi({
      ...signedIn,
      'GET /api/account/sessions': () =>
        isBroken ? refuse(403, 'forbidden', { message: 'Not now.' }) : { sessions },
    })
    await openPage('/account')
    const alert = await screen.findByRole('alert')
    expect(alert.textContent).toContain('Not now.')
    isBroken = false
    await userEvent.click(within(alert).getByRole('button', { name: 'Try again' }))
    expect(await screen.findByRole('table', { name: 'Open sessions' })).toBeTruthy()
  })
})

describe('an ended session', () => {
  it('asks for the password over the page and then saves what was typed', async () => {
    let isOver = true
    const api = fakeApi({
      ...signedIn,
      'PATCH /api/account': ({ body }) =>
        isOver ? refuse(401, 'sign-in-required') : account(body as object),
      'POST /api/session': () => {
        isOver = false
        return { account: account() }
      },
    })
    await openPage('/account')
    await retype('Name', 'Typed before')
    await press('Save')
    const dialog = await screen.findByRole('dialog', { name: 'Sign in to go on' })
    const email = within(dialog).getByLabelText<HTMLInputElement>('Address')
    expect([email.value, email.readOnly]).toEqual(['engineer@example.invalid', true])
    await userEvent.type(within(dialog).getByLabelText('Password'), 'high water at seven')
    await userEvent.click(within(dialog).getByRole('button', { name: 'Sign in' }))
    expect(await screen.findByText('Saved.')).toBeTruthy()
    expect(api.sent('PATCH /api/account')).toHaveLength(2)
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Typed before')
    expect(screen.queryByRole('dialog')).toBeNull()
  })

  it('leaves the page as it is when the dialog is closed', async () => {
    fakeApi({ ...signedIn, 'PATCH /api/account': () => refuse(401, 'sign-in-required') })
    await openPage('/account')
    await retype('Name', 'Typed before')
    await press('Save')
    const dialog = await screen.findByRole('dialog', { name: 'Sign in to go on' })
    await userEvent.click(within(dialog).getByRole('button', { name: 'Close' }))
    expect((await screen.findByRole('alert')).textContent).toContain('You are signed out')
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Typed before')
  })
})
