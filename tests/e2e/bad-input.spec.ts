import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

const TABLE: readonly [label: string, typed: string, ...named: string[]][] = [
  ['Depth of water', '1.06', 'Depth of water', '1.06', '0 to 1.05 m'],
  ['Depth of water', '-0.1', 'Depth of water', '-0.1', '0 to 1.05 m'],
  ['Depth of water', '420', 'Depth of water', '420', '0 to 1.05 m', 'millimetres'],
  ['Depth of water', '', 'Depth of water', 'nothing', '0 to 1.05 m'],
  ['Depth of water', '0.4x', 'Depth of water', '0.4x', 'not a number', '0 to 1.05 m'],
  ['Depth of water', 'NaN', 'Depth of water', 'NaN', 'not a number', '0 to 1.05 m'],
  ['Depth of water', '1e309', 'Depth of water', '1e309', '0 to 1.05 m'],
  ['Friction', '5', 'Friction', '5', 'above 0, up to 1.5'],
  ['Friction', '0', 'Friction', '0', 'above 0, up to 1.5'],
  ['Air pressure', '15000', 'Air pressure', '15000', '0.001 to 100 kPa'],
  ['Skirt edge', '120', 'Skirt edge', '120', '0 to 100 %'],
  ['Water standing here', '-1', 'Water standing here', '-1', '0 to 1.05 m'],
  ['Wind gust', '90', 'Wind gust', '90', '0 to 60 m/s'],
]

test('a wrong entry is refused with its name, its value and its range', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  for (const [label, typed, ...named] of TABLE) {
    await test.step(`${label} "${typed}"`, async () => {
      const field = check.field(label)
      const before = await field.inputValue()
      await check.type(label, typed)
      await expect(field).toHaveAttribute('aria-invalid', 'true')
      await expect(field).toHaveValue(typed)
      const message = page.locator(`#${await field.getAttribute('aria-describedby')}`)
      for (const part of named) await expect(message).toContainText(part)
      await expect(check.verdict).toHaveText('Holds')
      await check.type(label, before)
      await expect(field).not.toHaveAttribute('aria-invalid', 'true')
    })
  }
})

test('waves without a period ask for it', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await page.getByRole('button', { name: 'Current, waves, debris' }).click()
  await check.type('Wave height', '0.1')
  await expect(check.band).toContainText(
    'Wave period: nothing entered. Needed with waves: 0.5 to 20 s',
  )
  await check.type('Wave period', '2')
  await expect(check.band).not.toContainText('Wave period')
})

test('the last good answer stays and says to which input it belongs', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await check.type('Depth of water', '0.45')
  await check.type('Depth of water', '0.45m')
  await expect(check.band).toContainText(
    'These figures belong to the last valid input, 0.450 m of water',
  )
  await check.type('Depth of water', '0,46')
  await expect(check.band).not.toContainText('last valid input')
  await expect(check.band).toContainText('0.460 m of water')
})

test('the range is named in the chosen units', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await page.getByRole('radio', { name: 'US' }).check({ force: true })
  await check.type('Depth of water', '9')
  await expect(check.band).toContainText('Depth of water: 9 is not allowed. Allowed: 0 to 3.44 ft')
})
