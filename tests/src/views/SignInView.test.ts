// @vitest-environment jsdom
import { screen, waitFor } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { account, fakeApi, refuse } from '../support/fake-api'
import { clearPage, openPage, stubPage } from '../support/open-page'

beforeEach(stubPage)
afterEach(clearPage)

const nobody = { 'GET /api/session': () => ({ account: null }) }
const fill = async (email: string, password: string) => {
  await userEvent.type(await screen.findByLabelText('Address'), email)
  await userEvent.type(screen.getByLabelText('Password'), password)
}
const enter = () => userEvent.click(screen.getByRole('button', { name: 'Sign in' }))

it('leads somebody who must sign in to where they wanted to go', async () => {
  fakeApi({
    ...nobody,
    'POST /api/session': () => ({ account: account() }),
    'GET /api/account/sessions': () => ({ sessions: [] }),
  })
  const { router } = await openPage('/account?from=mail')
  expect(router.currentRoute.value).toMatchObject({
    name: 'sign-in',
    query: { next: '/account?from=mail' },
  })
  await fill('engineer@example.invalid', 'high water')
  await enter()
  await waitFor(() => expect(router.currentRoute.value.fullPath).toBe('/account?from=mail'))
})

it('says that the pair does not fit, without saying which, and keeps the address', async () => {
  fakeApi({ ...nobody, 'POST /api/session': () => refuse(401, 'sign-in-required') })
  await openPage('/sign-in')
  await fill('engineer@example.invalid', 'wrong')
  await enter()
  expect(await screen.findByText('Address or password is not right')).toBeTruthy()
  expect(screen.getByLabelText('Password').getAttribute('aria-invalid')).toBe('true')
  expect(screen.getByLabelText<HTMLInputElement>('Address').value).toBe('engineer@example.invalid')
  expect(screen.getByLabelText<HTMLInputElement>('Password').value).toBe('')
})

it('counts a wait down and opens the button again', async () => {
  fakeApi({
    ...nobody,
    'POST /api/session': () => refuse(429, 'too-many-requests', { retryAfter: 3 }),
  })
  await openPage('/sign-in')
  await fill('engineer@example.invalid', 'wrong')
  await enter()
  await screen.findByText(/Too many attempts. Try again in [23] s\./)
  const button = screen.getByRole<HTMLButtonElement>('button', { name: 'Sign in' })
  expect(button.disabled).toBe(true)
  await screen.findByText(/Try again in [12] s\./)
  await screen.findByText('You can try again now.')
  expect(button.disabled).toBe(false)
})

it('asks for what is missing before it asks the server', async () => {
  const api = fakeApi(nobody)
  await openPage('/sign-in')
  await screen.findByLabelText('Address')
  await enter()
  expect(screen.getByText('Enter your address')).toBeTruthy()
  expect(screen.getByText('Enter your password')).toBeTruthy()
  expect(api.sent('POST /api/session')).toEqual([])
})

it('lists the people of the demonstration, and signs in whoever is chosen', async () => {
  const person = { email: 'a@demo.invalid', password: 'p', name: 'Engineer A', what: 'Leads' }
  const api = fakeApi({
    ...nobody,
    'GET /api/demo-accounts': () => ({ accounts: [person] }),
    'POST /api/session': () => ({ account: account({ name: 'Engineer A' }) }),
  })
  const { router } = await openPage('/sign-in?next=//elsewhere.invalid/')
  await userEvent.click(await screen.findByRole('button', { name: /^Engineer A/ }))
  expect(api.sent('POST /api/session')).toEqual([{ email: 'a@demo.invalid', password: 'p' }])
  await waitFor(() => expect(router.currentRoute.value.path).toBe('/desk'))
})

it('shows no list in production', async () => {
  fakeApi(nobody)
  await openPage('/sign-in')
  await screen.findByLabelText('Address')
  await waitFor(() => expect(screen.queryByText('People of the demonstration')).toBeNull())
})

it('says that the server cannot be reached', async () => {
  fakeApi({ ...nobody, 'POST /api/session': () => Promise.reject(new TypeError('no network')) })
  await openPage('/sign-in')
  await fill('engineer@example.invalid', 'high water')
  await enter()
  expect((await screen.findByRole('alert')).textContent).toContain('The server cannot be reached')
})
