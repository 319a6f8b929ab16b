import { expect, type Page } from '@playwright/test'
import { expectAccessible } from './axe'

/** Pages narrower than this are seen as on a phone [px]. */
const NARROW = 700

/**
 * A wide page in light, a narrow one in dark: a page that is opened at both widths is seen in both
 * themes, in half the time of all four.
 */
export async function expectAccessibleInItsTheme(page: Page, name: string): Promise<void> {
  const colorScheme = (page.viewportSize()?.width ?? 0) < NARROW ? 'dark' : 'light'
  await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
  await expect(page.locator('html')).toHaveAttribute('data-theme', colorScheme)
  await expectAccessible(page, `${name}, ${colorScheme}`)
}
