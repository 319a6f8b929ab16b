import { expect, test, type Page } from '@playwright/test'
import { expectAccessible } from './support/axe'
import { QuickCheckPage } from './support/quick-check-page'

test('the Method page recomputes every check value, and every one passes', async ({ page }) => {
  const complaints: string[] = []
  page.on('pageerror', ({ message }) => complaints.push(message))
  page.on('console', (message) => {
    if (/content security|katex/i.test(message.text())) complaints.push(message.text())
  })
  await page.goto('/method')
  const values = page.getByRole('region', { name: 'Check values, recomputed now' })
  await expect(values.getByRole('status')).toContainText('All pass.')
  await expect(values).toContainText(
    /\d+ published, \d+ from memory, \d+ derived, \d+ common practice/,
  )
  const results = await values.locator('.result').allTextContents()
  expect(results.length).toBeGreaterThan(130)
  expect(results.filter((result) => result.trim() !== 'pass')).toEqual([])

  expect(await page.locator('.katex').count()).toBeGreaterThan(500)
  await expect(page.locator('.katex-error')).toHaveCount(0)
  await expect(page.getByText('the engine refused')).toHaveCount(0)
  expect(complaints).toEqual([])
})

test('the Method page marks the case of the Quick check and gives its chart away', async ({
  page,
}) => {
  const check = new QuickCheckPage(page)
  await check.open('?v=1&depth=0.6&diameter=1&air=9810')
  await page.getByRole('link', { name: 'Method' }).click()
  await expect(page).toHaveURL(/\/method\?v=1&.*depth=0\.6/)
  const chart = page.getByRole('img', { name: /Design chart/ })
  await expect(chart).toContainText('p/(ρgD) 1.00')

  for (const [button, ending] of [
    ['SVG', /\.svg$/],
    ['PNG', /\.png$/],
    ['CSV', /\.csv$/],
  ] as const) {
    const file = page.waitForEvent('download')
    await page.getByRole('button', { name: button, exact: true }).click()
    expect((await file).suggestedFilename()).toMatch(ending)
  }
})

test('a formula wider than a phone is reached by the keyboard, and moves', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 800 })
  await page.goto('/method#goda')
  const wide = page.getByRole('group', { name: 'Waves against the barrier' }).first()
  await wide.focus()
  await page.keyboard.press('ArrowRight')
  await expect.poll(() => wide.evaluate((formula) => formula.scrollLeft)).toBeGreaterThan(0)
})

/**
 * Axe would take minutes over tens of thousands of elements. KaTeX brings its own MathML for screen
 * readers; formulas and check values are alike, so that a few of each stand for all.
 */
async function thinOut(page: Page): Promise<void> {
  await page.evaluate(() => {
    for (const formula of document.querySelectorAll('.katex')) formula.replaceChildren()
    for (const kind of ['.formula', '.values article', '.references .row']) {
      const [, , , ...others] = document.querySelectorAll(kind)
      for (const other of others) other.remove()
    }
  })
}

for (const [width, colorScheme] of [
  [1440, 'light'],
  [390, 'dark'],
] as const) {
  test(`axe finds nothing serious on the Method page, ${width} px, ${colorScheme}`, async ({
    browser,
  }) => {
    const context = await browser.newContext({ viewport: { width, height: 900 }, colorScheme })
    const page = await context.newPage()
    await page.goto('/method')
    await page.getByText('The figures behind the chart').click()
    await expect(page.getByText('All pass.')).toBeVisible()
    await thinOut(page)
    await expectAccessible(page, 'method')
    const over = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    )
    expect(over).toBe(0)
    await context.close()
  })
}
