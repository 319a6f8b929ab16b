import { Buffer } from 'node:buffer'
import { expect, test, type Page } from '@playwright/test'
import { signInAs } from './support/people'
import { makeProject, unique } from './support/projects'

async function choose(page: Page, name: string, mimeType: string, buffer: Buffer): Promise<void> {
  await page.getByLabel('Choose files').setInputFiles({ name, mimeType, buffer })
}

const row = (page: Page, name: string) => page.getByRole('listitem').filter({ hasText: name })

test('files are added, looked at, captioned and deleted', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/desk')
  await makeProject(page, unique('Files'))
  await choose(page, 'slipway.png', 'image/png', await page.screenshot())
  const picture = row(page, 'slipway.png')
  await expect(picture).toContainText('Engineer A')
  const preview = picture.getByRole('img', { name: 'Preview of slipway.png' })
  await expect
    .poll(() => preview.evaluate((image: HTMLImageElement) => image.naturalWidth))
    .toBeGreaterThan(0)

  await choose(page, 'program.exe', 'application/octet-stream', Buffer.from('MZ\u0000\u0001'))
  await expect(page.getByText('program.exe was not taken')).toBeVisible()
  await page.getByRole('button', { name: 'Leave it out' }).click()

  await picture.getByRole('button', { name: 'Name and caption of slipway.png' }).click()
  await page.getByRole('dialog').getByLabel('Caption').fill('The slipway head at low water')
  await page.getByRole('dialog').getByRole('button', { name: 'Save' }).click()
  await expect(picture).toContainText('The slipway head at low water')
  await picture.getByRole('button', { name: 'Delete slipway.png' }).click()
  await page.getByRole('dialog').getByRole('button', { name: 'Delete' }).click()
  await expect(page.getByText('No file yet')).toBeVisible()
})

test('an upload on an ended session asks to sign in, and nothing is lost', async ({
  page,
  context,
}) => {
  await signInAs(page, 'Engineer A', '/desk')
  await makeProject(page, unique('Files'))
  await context.clearCookies()
  const large = Buffer.concat([Buffer.from('%PDF-1.7\n'), Buffer.alloc(6_000_000, 'a')])
  await choose(page, 'report.pdf', 'application/pdf', large)
  const dialog = page.getByRole('dialog', { name: 'Sign in to go on' })
  await dialog.getByLabel('Password').fill('high water at seven')
  await dialog.getByRole('button', { name: 'Sign in' }).click()
  await expect(row(page, 'report.pdf')).toContainText('6.0 MB')
})

test('whoever reads a project leaves it by themselves', async ({ page, browser }) => {
  await signInAs(page, 'Engineer A', '/desk')
  const name = unique('Left')
  await makeProject(page, name)
  const project = new URL(page.url()).pathname
  const added = await page.request.post(`/api${project}/members`, {
    headers: { origin: new URL(page.url()).origin },
    data: { email: 'engineer.b@demo.invalid', role: 'reader' },
  })
  expect(added.status(), await added.text()).toBe(201)
  const reader = await (await browser.newContext()).newPage()
  await signInAs(reader, 'Engineer B', project)
  await reader.getByRole('button', { name: 'Leave the project' }).click()
  const dialog = reader.getByRole('dialog', { name: 'Leave the project' })
  await dialog.getByRole('button', { name: 'Leave the project' }).click()
  await expect(reader.getByText('You are no longer in this project.')).toBeVisible()
  await expect(reader).toHaveURL('/desk')
  await expect(reader.getByRole('link', { name, exact: true })).toHaveCount(0)
  await reader.context().close()
})
