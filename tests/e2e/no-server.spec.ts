import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

test('everything is computed without the server', async ({ page }) => {
  const asked: string[] = []
  await page.route('**/api/**', (route) => {
    asked.push(new URL(route.request().url()).pathname)
    return route.abort()
  })
  const problems: string[] = []
  page.on('pageerror', (error) => problems.push(error.message))

  const check = new QuickCheckPage(page)
  await check.open()
  await check.type('Depth of water', '0.55')
  await expect(check.verdict).toHaveText('Does not hold')
  await expect(check.band).toContainText('holds only to 0.489 m, then slides')
  await check.settle()
  await expect(page.getByRole('rowheader', { name: 'sealed, 0 %' })).toBeVisible()

  // Who is there and in which mode the server runs: questions of the frame, not of the check.
  const ofTheFrame = ['/api/health', '/api/session']
  expect(asked.filter((path) => !ofTheFrame.includes(path))).toEqual([])
  expect(problems).toEqual([])
})

test('the page obeys its own content policy', async ({ page }) => {
  const refused: string[] = []
  page.on('console', (message) => {
    if (/content security policy/i.test(message.text())) refused.push(message.text())
  })
  const check = new QuickCheckPage(page)
  await check.open('?v=1&water=level&plusminus=0.1')
  await check.choose('Tube', /Tube 1\.00 m/)
  await check.settle()
  expect(refused).toEqual([])
})

test('demonstration mode says so', async ({ page }) => {
  await new QuickCheckPage(page).open()
  await expect(page.getByText('Demonstration: everything stored here is invented.')).toBeVisible()
})
