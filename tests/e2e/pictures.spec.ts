import { test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

for (const [name, width, height] of [
  ['desk', 1440, 900],
  ['phone', 390, 844],
] as const) {
  for (const colorScheme of ['light', 'dark'] as const) {
    test(`picture of the Quick check, ${name}, ${colorScheme}`, async ({ browser }) => {
      const context = await browser.newContext({ viewport: { width, height }, colorScheme })
      const page = await context.newPage()
      const check = new QuickCheckPage(page)
      await check.open()
      await check.settle()
      await page.screenshot({ path: `docs/pictures/quick-check-${name}-${colorScheme}.png` })
      await context.close()
    })
  }
}
