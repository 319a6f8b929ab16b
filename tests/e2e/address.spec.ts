import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

const SENT =
  '?v=1&water=gauge&stage=2.86&zero=0.6&tosite=-0.04&groundlevel=2.87&plusminus=0.12' +
  '&diameter=1&skirt=3.1&strip=0.18&mass=7.8&air=18000&stated=1&friction=0.4&edge=0.5' +
  '&surface=concrete&permeability=1e-7&basis=unusual&rise=0.0000361&gust=14'

async function expectSent(check: QuickCheckPage): Promise<void> {
  await expect(check.field('Gauge reading')).toHaveValue('2.86')
  await expect(check.field('Gauge zero')).toHaveValue('0.6')
  await expect(check.field('Correction to site')).toHaveValue('-0.04')
  await expect(check.field('Ground level here')).toHaveValue('2.87')
  await expect(check.field('Air pressure')).toHaveValue('18')
  await expect(check.field('Friction')).toHaveValue('0.4')
  await expect(check.field('Skirt edge')).toHaveValue('50')
  await expect(check.field('Wind gust')).toHaveValue('14')
  await expect(check.verdict).toHaveText('Holds')
  await expect(check.band).toContainText('Level 3.420 m (0.550 m of water)')
}

test('a sent address brings the same inputs and the same verdict, and survives a reload', async ({
  page,
}) => {
  const check = new QuickCheckPage(page)
  await check.open(SENT)
  await expectSent(check)
  await page.reload()
  await expectSent(check)
})

test('the address follows what is entered and can be sent on', async ({ page, context }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await check.type('Depth of water', '0,55')
  await check.type('Air pressure', '12.5')
  await page.getByRole('radio', { name: 'Unsuitable' }).check({ force: true })
  await expect(page).toHaveURL(/depth=0\.55.*air=12500/)
  await expect(page).toHaveURL(/suitable=no/)

  const other = new QuickCheckPage(await context.newPage())
  await other.open(new URL(page.url()).search)
  await expect(other.field('Depth of water')).toHaveValue('0.55')
  await expect(other.verdict).toHaveText('Does not hold')
  await expect(other.band).toContainText('unsuitable surface')
})

test('what cannot be read in an address is named', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open('?v=1&depth=0.5&colour=red&friction=slippery&basis=best&mass=1e309')
  const notice = page.getByRole('alert')
  await expect(notice).toContainText('colour=red')
  await expect(notice).toContainText('friction=slippery')
  await expect(notice).toContainText('basis=best')
  await expect(notice).toContainText('mass=1e309')
  await expect(check.field('Depth of water')).toHaveValue('0.5')
  await notice.getByRole('button', { name: 'Close' }).click()
  await expect(notice).toBeHidden()
})

test('an address of another version is refused as a whole', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open('?v=2&depth=0.5')
  await expect(page.getByRole('alert')).toContainText('v=2')
  await expect(check.field('Depth of water')).toHaveValue('0.42')
})

test('a wrong entry survives a reload as it was typed', async ({ page }) => {
  const check = new QuickCheckPage(page)
  await check.open()
  await check.type('Depth of water', 'knee-deep')
  await expect(page).toHaveURL(/typed\.depth=knee-deep/)
  await page.reload()
  await expect(check.field('Depth of water')).toHaveValue('knee-deep')
  await expect(check.band).toContainText('last valid input')
})
