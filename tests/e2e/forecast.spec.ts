import { expect, test } from '@playwright/test'
import { signInAs } from './support/people'

/** No scenario rests on this gauge: what happens here greys no verdict of another test. */
const BOARD = '/projects/demo-ferry-quay/gauges/demo-gauge-quay-board'

const GOOD = `time;expected;low;high
2031-03-04 00:00Z;2.54;;
2031-03-04 02:00Z;2.84;2.72;2.96
2031-03-04 04:00Z;3.16;3.04;3.28
2031-03-04 07:00Z;3.42;3.30;3.54
2031-03-04 09:00Z;3.34;3.22;3.46
`

test('a forecast from a call, moved by what is observed, then one from a file', async ({
  page,
}) => {
  await signInAs(page, 'Engineer B', BOARD)
  await page.getByRole('button', { name: 'Telephone call' }).click()
  await page.getByLabel('Issued on').fill('2031-03-03T21:45')
  await page.getByLabel('Now', { exact: true }).fill('2.34')
  await page.getByLabel('Read on').fill('2031-03-03T22:00')
  await page.getByLabel('Crest', { exact: true }).fill('3.42')
  await page.getByLabel('Crest on').fill('2031-03-04T07:00')
  await page.getByLabel('±').fill('0.12')
  await page.getByRole('button', { name: 'Enter the forecast' }).click()
  await expect(page.getByText(/Crest 3\.420.m on Tue 07:00/)).toBeVisible()
  await expect(page.getByText('A sketch from a telephone call')).toBeVisible()

  // Half a cosine has done half of the rise half-way, at 02:30: 2.88. 2.93 is 0.05 above it.
  await page.getByLabel('Observed on').fill('2031-03-04T02:30')
  await page.getByLabel('Observed', { exact: true }).fill('2.93')
  await page.getByRole('button', { name: 'Add the reading' }).click()
  await expect(page.getByText(/every later hour is moved by \+0\.050.m/)).toBeVisible()
  await expect(page.getByText(/Crest 3\.470.m on Tue 07:00/)).toBeVisible()

  await page.getByRole('button', { name: 'From a file' }).click()
  const dialog = page.getByRole('dialog')
  const choose = (name: string, text: string) =>
    dialog
      .getByLabel('Choose a file')
      .setInputFiles({ name, mimeType: 'text/plain', buffer: Buffer.from(text) })
  await choose('bomb.xml', '<!DOCTYPE a [<!ENTITY b "bb">]><a>&b;</a>')
  await expect(dialog.getByRole('alert')).toContainText('it was not read')
  await choose('wrong.csv', GOOD.replace('2.84', 'high'))
  await expect(dialog.getByRole('alert')).toContainText('Line 3, column B (expected level)')
  await choose('good.csv', GOOD)
  await dialog.getByLabel('Issued on').fill('2031-03-03T23:10')
  await dialog.getByRole('button', { name: 'Enter the forecast' }).click()
  await expect(page.getByText('Issue of Mon 2031-03-03 23:10')).toBeVisible()
})
