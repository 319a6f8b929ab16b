import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

test('US units change what is shown, not what is computed', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await page.getByRole('radio', { name: 'US' }).check({ force: true })

  await expect(check.field('Depth of water')).toHaveValue('1.378')
  await expect(check.field('Air pressure')).toHaveValue('313.3')
  await expect(check.band).toContainText('1.38 ft of water')
  await expect(check.band).toContainText('holds to 1.60 ft')
  await expect(page.getByText(/gpm per ft/)).toBeVisible()
  await expect(page).toHaveURL(/depth=0\.42&/)

  await check.type('Depth of water', '1.7')
  await expect(check.verdict).toHaveText('Does not hold')
  await page.getByRole('radio', { name: 'Metric' }).check({ force: true })
  await expect(check.field('Depth of water')).toHaveValue('0.51816')

  await page.reload()
  await expect(page.getByRole('radio', { name: 'Metric' })).toBeChecked()
})

test('the theme is kept and needs no flash', async ({ page }) => {
  await new QuickCheckPage(page).open()
  await page.getByRole('radio', { name: 'Dark' }).check({ force: true })
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark')
  await page.reload({ waitUntil: 'commit' })
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark')
})
