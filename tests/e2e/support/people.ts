import { expect, type Page } from '@playwright/test'

/** Signs in through the list of the demonstration and waits for the page that was asked for. */
export async function signInAs(page: Page, name: string, path: string): Promise<void> {
  await page.goto(path)
  await expect(page).toHaveURL(/\/sign-in\?next=/)
  const answered = page.waitForResponse(
    (answer) => answer.url().endsWith('/api/session') && answer.request().method() === 'POST',
  )
  await page.getByRole('button', { name: new RegExp(`^${name}`) }).click()
  expect((await answered).status(), `${name} signs in`).toBe(200)
  // The page is loaded with its area before the address changes.
  await expect(page).toHaveURL(path, { timeout: 30_000 })
}

export async function signOut(page: Page): Promise<void> {
  await page.getByRole('button', { name: /^Signed in as/ }).click()
  await page.getByRole('button', { name: 'Sign out', exact: true }).click()
  await expect(page).toHaveURL(/\/sign-in/)
}
