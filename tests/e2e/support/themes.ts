import { expect, type Page } from '@playwright/test'
import { expectAccessible } from './axe'

/** The same page, light and dark: the theme is changed in place, without loading the page anew. */
export async function expectAccessibleInBothThemes(page: Page, name: string): Promise<void> {
  for (const colorScheme of ['light', 'dark'] as const) {
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
    await expect(page.locator('html')).toHaveAttribute('data-theme', colorScheme)
    await expectAccessible(page, `${name}, ${colorScheme}`)
  }
}
