import { expect, test } from '@playwright/test'
import { expectAccessible } from './support/axe'
import { QuickCheckPage } from './support/quick-check-page'

const CASES = [
  ['as it opens', ''],
  [
    'with everything on show',
    '?v=1&water=gauge&plusminus=0.1&uplift=developing&wave=0.1&unknown=1&typed.friction=wet',
  ],
] as const

const THEMES = [
  ['light', 'all'],
  ['dark', 'colours'],
] as const

for (const width of [1440, 390]) {
  for (const [name, query] of CASES) {
    test(`axe finds nothing serious ${name}, ${width} px`, async ({ page }) => {
      await page.setViewportSize({ width, height: 900 })
      const check = new QuickCheckPage(page)
      await check.open(query)
      await check.unfoldAll()
      await check.settle()
      for (const [colorScheme, rules] of THEMES) {
        await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
        await expect(page.locator('html')).toHaveAttribute('data-theme', colorScheme)
        await expectAccessible(page, colorScheme, rules)
      }
    })
  }
}

test('the page works with the keyboard alone', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await page.keyboard.press('Tab')
  await expect(page.getByRole('link', { name: 'Skip to the page' })).toBeFocused()
  await page.keyboard.press('Enter')

  const reached: string[] = []
  for (let press = 0; press < 80; press += 1) {
    await page.keyboard.press('Tab')
    reached.push(
      await page.evaluate(() => {
        const active = document.activeElement
        return (
          active?.getAttribute('aria-label') ??
          document.querySelector(`label[for="${active?.id}"]`)?.textContent ??
          active?.textContent ??
          ''
        ).trim()
      }),
    )
  }
  const order = ['Copy link', 'Depth of water', 'Air pressure', 'Friction', 'Time to clear']
  const places = order.map((label) => reached.indexOf(label))
  expect(places.every((place) => place >= 0)).toBe(true)
  expect([...places].sort((a, b) => a - b)).toEqual(places)

  await check.field('Depth of water').focus()
  await page.keyboard.press('ControlOrMeta+A')
  await page.keyboard.type('0.6')
  await expect(check.verdict).toHaveText('Does not hold')
})

test('an explanation opens by keyboard and closes with Escape', async ({ page }) => {
  await new QuickCheckPage(page).open()
  const tip = page.getByRole('button', { name: 'What is this: Skirt edge' })
  await tip.focus()
  await page.keyboard.press('Enter')
  await expect(page.getByRole('tooltip')).toContainText('0 % sealed')
  await page.keyboard.press('Escape')
  await expect(page.getByRole('tooltip')).toBeHidden()
})

test('the verdict is announced once, after the changes settle', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  const status = page.getByRole('status').filter({ hasText: 'governs' })
  await expect(status).toHaveCount(0)
  await check.type('Depth of water', '0.6')
  await expect(status).toHaveText(/^Does not hold\.\s0\.600\sm of water/)
})
