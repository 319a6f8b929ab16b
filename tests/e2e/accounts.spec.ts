import { readFileSync } from 'node:fs'
import { expect, test, type Browser, type Page } from '@playwright/test'
import { expectAccessibleInItsTheme } from './support/themes'
import { signInAs, signOut } from './support/people'

const PASSWORD = 'the gauge board at dusk'

/** A link that a mail of the outbox carries, as the administrator finds it in the file. */
async function linkOfMail(page: Page, recipient: string, path: string): Promise<string> {
  await page.goto('/admin/mail')
  const download = page.waitForEvent('download')
  await page
    .getByRole('link', { name: `Open the mail to ${recipient} as a file` })
    .first()
    .click()
  const file = readFileSync(await (await download).path(), 'utf8')
  // Quoted-printable folds long lines with "=".
  const text = file.replace(/=\r?\n/g, '').replaceAll('=3D', '=')
  const link = new RegExp(`${path}/[\\w-]+`).exec(text)?.[0]
  expect(link, `the mail carries a link to ${path}`).toBeTruthy()
  return link!
}

/** Changes the account that is signed in, past the page. */
async function changeAccount(page: Page, data: object): Promise<void> {
  const headers = { origin: new URL(page.url()).origin }
  const answer = await page.request.patch('/api/account', { headers, data })
  expect(answer.status(), await answer.text()).toBe(200)
}

async function invite(page: Page, person: { email: string; role: string }): Promise<void> {
  await page.getByRole('button', { name: 'Invite somebody' }).first().click()
  const dialog = page.getByRole('dialog', { name: 'Invite somebody' })
  await dialog.getByLabel('Address').fill(person.email)
  await dialog.getByLabel('Organisation').selectOption('Mill Lane Engineers')
  await dialog.getByLabel('Role').selectOption(person.role)
  await dialog.getByRole('button', { name: 'Send the invitation' }).click()
  await expect(page.getByText(`The invitation to ${person.email} is on its way.`)).toBeVisible()
}

/** Accepts an invitation in a browser of its own, as the invited person would. */
async function accept(browser: Browser, link: string, name: string): Promise<Page> {
  const page = await (await browser.newContext()).newPage()
  await page.goto(link)
  await page.getByLabel('Name').fill(name)
  await page.getByLabel('Password').fill(PASSWORD)
  await page.getByRole('button', { name: 'Accept and sign in' }).click()
  await expect(page.getByRole('button', { name: `Signed in as ${name}` })).toBeVisible()
  return page
}

test('somebody signs in, is known on the Quick check, and signs out', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/account')
  await expect(page.getByRole('heading', { name: 'My account' })).toBeVisible()
  await page.goto('/')
  await expect(page.getByRole('button', { name: 'Signed in as Engineer A' })).toBeVisible()
  await expect(page.getByRole('link', { name: 'Desk' })).toBeVisible()
  await signOut(page)
  await page.goto('/')
  await expect(page.getByRole('link', { name: 'Sign in' })).toBeVisible()
  await page.goto('/account')
  await expect(page).toHaveURL('/sign-in?next=/account')
})

test('a wrong password is refused without a hint, and a series of them has to wait', async ({
  page,
}) => {
  await page.goto('/sign-in')
  const enter = page.getByRole('button', { name: 'Sign in', exact: true })
  await page.getByLabel('Address').fill('nobody@demo.invalid')
  for (let attempt = 0; attempt < 4; attempt += 1) {
    await page.getByLabel('Password').fill(`guess ${attempt}`)
    await enter.click()
    await expect(page.getByText('Address or password is not right')).toBeVisible()
    await expect(page.getByLabel('Password')).toHaveValue('')
  }
  await page.getByLabel('Password').fill('guess again')
  await enter.click()
  await expect(page.getByText(/Too many attempts\. Try again in \d+ s\./)).toBeVisible()
  await expect(enter).toBeDisabled()
  await expect(page.getByText('You can try again now.')).toBeVisible()
  await expect(enter).toBeEnabled()
})

test('an open session in another browser is seen and ended', async ({ browser, page }) => {
  const other = await (await browser.newContext()).newPage()
  await signInAs(other, 'Trainer', '/account')
  await signInAs(page, 'Trainer', '/account')
  const table = page.getByRole('table', { name: 'Open sessions' })
  await expect(table.getByRole('row')).toHaveCount(3)
  await table.getByRole('button', { name: /^Sign out/ }).click()
  await expect(table.getByRole('row')).toHaveCount(2)
  await other.getByLabel('Registration number').fill('typed in the other browser')
  await other.getByRole('button', { name: 'Save' }).click()

  // The other browser is asked to sign in over the page, and saves what was typed.
  const dialog = other.getByRole('dialog', { name: 'Sign in to go on' })
  await expect(dialog.getByLabel('Address')).toHaveValue('trainer@demo.invalid')
  const { accounts } = (await (await page.request.get('/api/demo-accounts')).json()) as {
    accounts: { email: string; password: string }[]
  }
  const password = accounts.find(({ email }) => email === 'trainer@demo.invalid')?.password ?? ''
  await dialog.getByLabel('Password').fill(password)
  await dialog.getByRole('button', { name: 'Sign in' }).click()
  await expect(other.getByText('Saved.')).toBeVisible()
  await page.reload()
  await expect(page.getByLabel('Registration number')).toHaveValue('typed in the other browser')
  await other.context().close()
})

test('units of the account apply wherever it signs in', async ({ browser, page }) => {
  await signInAs(page, 'Engineer B', '/account')
  const elsewhere = await (await browser.newContext()).newPage()
  try {
    await page.getByRole('main').getByRole('radio', { name: 'US' }).check()
    await page.getByRole('button', { name: 'Save' }).click()
    await expect(page.getByText('Saved.')).toBeVisible()
    await signInAs(elsewhere, 'Engineer B', '/account')
    await elsewhere.goto('/')
    await expect(elsewhere.getByRole('radio', { name: 'US' })).toBeChecked()
  } finally {
    // Other tests sign in as the same person and read metres.
    await changeAccount(page, { unitSystem: 'metric' })
    await elsewhere.context().close()
  }
})

test('an administrator invites somebody, who accepts and signs in', async ({ browser, page }) => {
  await signInAs(page, 'Administrator', '/admin/people')
  await invite(page, { email: 'new.engineer@demo.invalid', role: 'Engineer' })
  await page.getByRole('link', { name: 'Invitations' }).click()
  await expect(page.getByRole('row', { name: /new\.engineer@demo\.invalid/ })).toContainText('Open')

  const link = await linkOfMail(page, 'new.engineer@demo.invalid', '/invite')
  const invited = await accept(browser, link, 'New engineer')
  await signOut(invited)
  await invited.getByLabel('Address').fill('new.engineer@demo.invalid')
  await invited.getByLabel('Password').fill(PASSWORD)
  await invited.getByRole('button', { name: 'Sign in', exact: true }).click()
  await expect(invited.getByRole('button', { name: 'Signed in as New engineer' })).toBeVisible()
  await invited.goto(link)
  await expect(invited.getByText('This invitation cannot be accepted any more')).toBeVisible()
  await invited.context().close()

  await page.goto('/admin/audit')
  await page.getByLabel('About').selectOption('Invitations')
  const trail = page.getByRole('table', { name: 'Audit trail' })
  await expect(trail.getByText('accepted the invitation')).toBeVisible()
  await expect(page).toHaveURL('/admin/audit?about=invitation')
  const csv = page.waitForEvent('download')
  await page.getByRole('link', { name: 'Download as CSV' }).click()
  const file = readFileSync(await (await csv).path(), 'utf8')
  expect(file).toContain('invitation.accepted')
  expect(file).not.toContain('account.signed-in')
})

test('a forgotten password is chosen anew by the link of a mail', async ({ browser, page }) => {
  // Somebody of their own: people of the demonstration keep the password that is offered.
  const email = 'forgetful@demo.invalid'
  await signInAs(page, 'Administrator', '/admin/people')
  await invite(page, { email, role: 'Engineer' })
  const forgetful = await accept(browser, await linkOfMail(page, email, '/invite'), 'Forgetful')
  await signOut(forgetful)
  await forgetful.getByRole('link', { name: 'Password forgotten?' }).click()
  await expect(forgetful).toHaveURL('/reset')
  await forgetful.getByLabel('Address').fill(email)
  await forgetful.getByRole('button', { name: 'Send the link' }).click()
  await expect(forgetful.getByText(`If ${email} has an account`)).toBeVisible()

  const link = await linkOfMail(page, email, '/reset')
  await forgetful.goto(link)
  await forgetful.getByLabel('New password').fill(PASSWORD)
  await forgetful.getByRole('button', { name: 'Save the new password' }).click()
  await expect(forgetful.getByText('The new password is saved')).toBeVisible()
  await forgetful.getByRole('link', { name: 'Sign in' }).last().click()
  await expect(forgetful).toHaveURL('/sign-in')
  await forgetful.getByLabel('Address').fill(email)
  await forgetful.getByLabel('Password').fill(PASSWORD)
  await forgetful.getByRole('button', { name: 'Sign in', exact: true }).click()
  await expect(forgetful.getByRole('button', { name: 'Signed in as Forgetful' })).toBeVisible()
  await forgetful.context().close()
})

test('whoever is deactivated hands over to a named person, and their address goes', async ({
  browser,
  page,
}) => {
  await signInAs(page, 'Administrator', '/admin/people')
  await invite(page, { email: 'leaver@demo.invalid', role: 'Engineer' })
  const link = await linkOfMail(page, 'leaver@demo.invalid', '/invite')
  const leaver = await accept(browser, link, 'Leaver')
  const made = await leaver.request.post('/api/projects', {
    data: { name: 'Left behind', datum: 'QD' },
    headers: { origin: new URL(leaver.url()).origin },
  })
  expect(made.status()).toBe(201)

  await page.goto('/admin/people?search=leaver')
  await page.getByRole('button', { name: 'Deactivate Leaver' }).click()
  const dialog = page.getByRole('dialog', { name: 'Deactivate Leaver?' })
  await expect(dialog.getByText('This person alone leads a project.')).toBeVisible()
  await dialog.getByRole('button', { name: 'Deactivate' }).click()
  await expect(dialog.getByText('Name somebody')).toBeVisible()
  await dialog
    .getByLabel('Successor', { exact: true })
    .selectOption('Engineer B, Mill Lane Engineers')
  await dialog.getByRole('button', { name: 'Deactivate' }).click()
  await expect(page.getByText('Leaver is deactivated.')).toBeVisible()
  await expect(page.getByRole('row', { name: /Leaver/ })).toContainText('Deactivated')

  const answer = await leaver.request.get('/api/session')
  expect(await answer.json()).toEqual({ account: null })
  await leaver.context().close()

  await page.getByRole('button', { name: 'Erase the address of Leaver' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Erase' }).click()
  await expect(page.getByRole('row', { name: /Leaver/ })).toContainText('address erased')

  await page.goto('/admin/audit?about=project')
  await expect(page.getByRole('row', { name: /handed over the project/ })).toContainText(
    'Left behind',
  )
})

test('the administration is closed to everybody else', async ({ page }) => {
  await page.goto('/admin/people')
  await page.getByRole('button', { name: /^Viewer/ }).click()
  await expect(page).toHaveURL('/account?refused=/admin/people')
  await expect(page.getByText('/admin/people is not for your role (Viewer).')).toBeVisible()
})

const OPEN_PAGES = ['/sign-in', '/reset', '/reset/unknown', '/invite/unknown']
const ADMIN_PAGES = ['people', 'invitations', 'organisations', 'audit', 'mail'].map(
  (part) => `/admin/${part}`,
)
const DIALOGS = [
  ['Invite somebody', 'Invite somebody'],
  ['Deactivate Engineer A', 'Deactivate Engineer A?'],
  ['Change Trainer', 'Change Trainer'],
] as const

async function open(page: Page, path: string): Promise<void> {
  await page.goto(path)
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
  await page.waitForLoadState('networkidle')
}

async function expectNoOverflow(page: Page, path: string): Promise<void> {
  const overflow = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(overflow, `${path} does not scroll sideways`).toBe(0)
}

for (const width of [1440, 390]) {
  test.describe(`axe finds nothing serious, ${width} px`, () => {
    test.use({ viewport: { width, height: 900 } })

    test('on pages that are open', async ({ page }) => {
      for (const path of OPEN_PAGES) {
        await open(page, path)
        await expectAccessibleInItsTheme(page, path)
        await expectNoOverflow(page, path)
      }
    })

    test('on own account and administration', async ({ page }) => {
      // Axe on seven pages.
      test.slow()
      await signInAs(page, 'Administrator', '/account')
      for (const path of ['/account', ...ADMIN_PAGES]) {
        await open(page, path)
        await expectAccessibleInItsTheme(page, path)
        await expectNoOverflow(page, path)
      }
      await page.getByRole('button', { name: /^Signed in as/ }).click()
      await expectAccessibleInItsTheme(page, 'menu of the account')
    })

    test('in dialogs, which give the focus back', async ({ page }) => {
      await signInAs(page, 'Administrator', '/admin/people')
      for (const [opener, title] of DIALOGS) {
        const button = page.getByRole('button', { name: opener })
        await button.click()
        await expect(page.getByRole('dialog', { name: title })).toBeVisible()
        await expectAccessibleInItsTheme(page, title)
        await page.keyboard.press('Escape')
        await expect(page.getByRole('dialog')).toHaveCount(0)
        await expect(button).toBeFocused()
      }
    })
  })
}
