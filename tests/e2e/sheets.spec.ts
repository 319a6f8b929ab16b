import { expect, test, type Browser, type Page } from '@playwright/test'
import { signInAs } from './support/people'
import { FERRY_QUAY } from '../../server/demo/ferry-quay'

/** A sheet is derived twice before it is shown, and set when it is approved. */
const SLOW = { timeout: 60_000 }

async function asSomebody(browser: Browser, name: string, path: string): Promise<Page> {
  const page = await (await browser.newContext()).newPage()
  await signInAs(page, name, path)
  return page
}

/** Presses a move, says why where it is asked for, and waits for where it leads. */
async function move(page: Page, name: string, status: string, reason?: string): Promise<void> {
  await page.getByRole('button', { name, exact: true }).click()
  const dialog = page.getByRole('dialog', { name })
  if (reason !== undefined) await dialog.getByLabel('Reason').fill(reason)
  await dialog.getByRole('button', { name, exact: true }).click()
  await expect(page.getByTestId('status')).toHaveText(status, SLOW)
}

async function makeSheet(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'New sheet' }).click()
  const dialog = page.getByRole('dialog', { name: 'New sheet' })
  await dialog.getByLabel('Line', { exact: true }).selectOption('Low road, off the gravel')
  await expect(
    dialog.getByLabel('Scenario', { exact: true }).locator('option').first(),
  ).toBeAttached()
  await dialog.getByLabel('Check category').selectOption('2')
  await dialog.getByLabel('Purpose').fill('For the flood plan.')
  await dialog.getByLabel(/^Holds only if/).fill('the gully at chainage 95 is plugged')
  await dialog.getByRole('button', { name: 'Make the sheet' }).click()
  await expect(page.getByTestId('status')).toHaveText('Draft', SLOW)
}

test('a scenario of Ferry Quay becomes an approved sheet that anybody verifies', async ({
  browser,
}) => {
  // Three people, and a sheet that is derived and set several times.
  test.slow()
  const project = `/projects/${FERRY_QUAY.project}`
  const engineer = await asSomebody(browser, 'Engineer A', project)
  await makeSheet(engineer)
  await expect(engineer.getByText('the gully at chainage 95 is plugged')).toBeVisible()
  await expect(engineer.getByRole('button', { name: 'Check complete' })).toHaveCount(0)
  await move(engineer, 'Submit for checking', 'In checking')
  const address = new URL(engineer.url()).pathname

  const checker = await asSomebody(browser, 'Checker', address)
  await checker.getByLabel('Line 1.1 is right').check()
  await expect(checker.getByTestId('ticked')).toHaveText(/^1 of \d+ lines ticked$/)
  await checker.getByLabel('Own figure of line 2.1').fill('0,9')
  await checker.getByLabel('Own figure of line 2.1').press('Enter')
  await expect(checker.locator('#line-2-1').getByText(/^Difference/)).toBeVisible()
  await move(checker, 'Check complete', 'Checked, not yet approved')
  await expect(checker.getByRole('button', { name: 'Approve', exact: true })).toHaveCount(0)

  const approver = await asSomebody(browser, 'Approver', address)
  await move(approver, 'Approve', 'Approved')
  const code = await approver.getByTestId('code').textContent()
  const saved = approver.waitForEvent('download')
  await approver.getByRole('link', { name: 'PDF', exact: true }).click()
  const file = await (await saved).path()

  const open = await (await browser.newContext()).newPage()
  await open.goto('/verify')
  await open.getByLabel('Code').fill(code!.toLowerCase())
  await open.getByRole('button', { name: 'Look it up' }).click()
  await expect(open.getByTestId('standing')).toHaveText('Current')
  await expect(open.getByText('Second Look Checking')).toBeVisible()
  const first = open.getByAltText(/^Page 1 of/)
  await expect
    .poll(() => first.evaluate((img: HTMLImageElement) => img.naturalWidth), SLOW)
    .toBe(1000)
  await open.getByLabel('Or the PDF file').setInputFiles(file)
  await expect(open.getByTestId('file-answer')).toHaveText('This is the file that we issued.', SLOW)
})
