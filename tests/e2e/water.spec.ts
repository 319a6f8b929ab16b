import { expect, type Page, test } from '@playwright/test'
import { calcSection, DEFAULT_SECTION } from './support/calc-section'
import { QuickCheckPage } from './support/quick-check-page'

/** What a person sees is what the frame ends with. */
function painted(page: Page): Promise<void> {
  return page.evaluate(
    () => new Promise<void>((done) => requestAnimationFrame(() => setTimeout(done))),
  )
}

test('the dragged water turns the verdict at the depth that the batch command gives', async ({
  page,
}) => {
  const { holdsTo } = calcSection(DEFAULT_SECTION)
  const check = new QuickCheckPage(page)
  await check.open()
  await expect(check.verdict).toHaveText('Holds')

  const grip = (await check.waterGrip.boundingBox())!
  const x = grip.x + grip.width / 2
  const start = grip.y + grip.height / 2
  await page.mouse.move(x, start)
  await page.mouse.down()

  const seen: { depth: number; verdict: string }[] = []
  for (let y = start; y > start - 90; y -= 0.25) {
    await page.mouse.move(x, y)
    await painted(page)
    const verdict = (await check.verdict.textContent())?.trim() ?? ''
    seen.push({ depth: await check.depth(), verdict })
    if (verdict === 'Does not hold') break
  }
  await page.mouse.up()

  const words = seen.map(({ verdict }) => verdict)
  expect(words).toContain('Holds narrowly')
  const turn = words.indexOf('Does not hold')
  expect(words[turn - 1]).toBe('Holds narrowly')
  expect(seen[turn - 1]!.depth).toBeLessThanOrEqual(holdsTo.depth + 1e-9)
  expect(holdsTo.depth - seen[turn - 1]!.depth).toBeLessThanOrEqual(0.001)
  expect(seen[turn]!.depth).toBeGreaterThan(holdsTo.depth)
  expect(seen[turn]!.depth - holdsTo.depth).toBeLessThanOrEqual(0.001)
})

test('the water and the air are moved with the keys as well', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await check.waterGrip.focus()
  await page.keyboard.press('ArrowUp')
  await expect(check.field('Depth of water')).toHaveValue('0.421')
  await page.keyboard.press('PageUp')
  await expect(check.field('Depth of water')).toHaveValue('0.431')
  for (let press = 0; press < 7; press += 1) await page.keyboard.press('PageUp')
  await expect(check.verdict).toHaveText('Does not hold')

  await page.getByRole('slider', { name: /air/i }).focus()
  await page.keyboard.press('ArrowDown')
  await expect(check.field('Air pressure')).toHaveValue('14.9')
})

test('the drawing tells the case in words that change with it', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  const description = page.getByRole('img', { name: /section/i }).locator('desc')
  const before = await description.textContent()
  expect(before).toContain('0.420')
  await check.type('Depth of water', '0.55')
  await expect(description).toContainText('0.550')
  await expect(description).not.toHaveText(before!)
})

test('a depth over the crest is a result: overtopped, and by how much', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await check.type('Depth of water', '0.80')
  await expect(check.verdict).toHaveText('Does not hold')
  await expect(check.band).toContainText('stands 0.100 m above the unloaded crest')
})
