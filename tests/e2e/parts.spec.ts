import { expect, test } from '@playwright/test'
import { expectAccessible } from './support/axe'
import { QuickCheckPage } from './support/quick-check-page'

const WAVES = '?v=1&wave=0.1&period=2&wind=15&fetch=500&fetchdepth=1'

for (const [width, colorScheme] of [
  [1440, 'light'],
  [390, 'dark'],
] as const) {
  test(`the part that governs comes first, ${width} px, ${colorScheme}`, async ({ browser }) => {
    const context = await browser.newContext({ viewport: { width, height: 900 }, colorScheme })
    const page = await context.newPage()
    const check = new QuickCheckPage(page)
    await check.open(WAVES)
    const parts = page.locator('section', {
      has: page.getByRole('heading', { name: 'One by one' }),
    })
    const first = parts.getByRole('button', { expanded: true })
    await expect(first).toHaveText(/Waves\s*governs/)

    // What is entered on the wet side is one press away, also where the side is folded.
    await parts.getByRole('button', { name: 'Enter height and period' }).click()
    await expect(check.field('Wave height')).toBeFocused()

    // With the keyboard: fold it, open the air, type into it.
    const air = parts.getByRole('button', { name: /^Air/ })
    await air.focus()
    await page.keyboard.press('Enter')
    await expect(air).toHaveAttribute('aria-expanded', 'true')
    await check.type('Sections on one air', '4')
    await expect(page).toHaveURL(/linked=4/)
    await expectAccessible(page, 'an opened part')

    await parts.getByRole('button', { name: /^Check with waves of/ }).click()
    await expect(check.verdict).toHaveText('Does not hold')
    await context.close()
  })
}
