import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

test('with the skirt off nothing says that it holds, at any depth', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open('?v=1&skirt=0&depth=0&plusminus=0.1')
  for (const depth of [0, 0.01, 0.2, 0.42, 0.69, 0.8, 1.05]) {
    await test.step(`${depth} m`, async () => {
      await check.type('Depth of water', String(depth))
      await check.settle()
      for (const cell of await check.band.getByRole('listitem').all()) {
        await cell.getByRole('button').click()
        expect(await page.locator('body').textContent()).not.toMatch(/\bholds\b/i)
      }
      expect(await page.locator('body').innerText()).not.toMatch(/\bholds\b/i)
      await expect(check.verdict).toHaveText('Does not hold')
    })
  }
})

test('with the skirt off nothing says that it holds, also while another field is wrong', async ({
  page,
}) => {
  const check = new QuickCheckPage(page)
  await check.open('?v=1&skirt=0&uplift=developing')
  await check.settle()
  await expect(check.band).toContainText('to correct')
  expect(await page.locator('body').textContent()).not.toMatch(/\bholds\b/i)
})
