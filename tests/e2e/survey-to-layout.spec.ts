import { expect, test } from '@playwright/test'
import { FERRY_QUAY_CSV } from '../src/survey/ferry-quay-survey'
import { expectAccessible } from './support/axe'
import { signInAs } from './support/people'
import { expectSaved, makeProject, makeScenario, unique } from './support/projects'

test('a survey is uploaded, drawn, laid and mended', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/desk')
  await makeProject(page, unique('Quay'))
  await page.getByRole('button', { name: 'New line' }).first().click()
  const making = page.getByRole('dialog', { name: 'New line' })
  await making.getByLabel('Name').fill('Low road')
  await making.getByLabel('Ground level').fill('3')
  await making.getByRole('button', { name: 'Make the line' }).click()

  await page.getByRole('button', { name: 'Upload a file' }).click()
  const dialog = page.getByRole('dialog', { name: 'Survey from a file' })
  const choose = (name: string, buffer: Buffer) =>
    dialog.getByLabel('Choose a file').setInputFiles({ name, mimeType: 'text/csv', buffer })
  await choose('photo.csv', Buffer.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0]))
  await expect(dialog.getByRole('alert')).toContainText('“photo.csv” is no text.')
  await choose('mixed.csv', Buffer.from('ch;z\n0;3,1\n10;3,2\n20;3.3\n'))
  await expect(dialog.getByRole('alert')).toContainText('Line 4, column B (Ground): “3.3”')
  await expect(dialog.getByRole('button', { name: /^Replace the survey/ })).toBeDisabled()
  await choose('survey.csv', Buffer.from(FERRY_QUAY_CSV.replaceAll('Loose gravel', 'asphalt')))
  await expectAccessible(page, 'upload of a survey')
  await dialog.getByRole('button', { name: 'Replace the survey by 28 stations' }).click()
  await expect(page.getByText('180 m, 28 stations, sections of 10 m')).toBeVisible()

  const plan = page.getByRole('application', { name: 'Plan of the line' })
  await plan.focus()
  await page.keyboard.press('+')
  await expect(page.getByRole('button', { name: 'Show all' }).first()).toBeEnabled()

  await makeScenario(page, 'Tonight')
  await page.getByRole('textbox', { name: 'Water level' }).fill('3,42')
  const best = page.getByTestId('best-layout')
  await expect(best).toContainText('Best layout: 4 × 0.50 m, 9 × 0.70 m, 5 × 1.00 m.')
  await best.getByRole('button', { name: 'Lay the best' }).click()
  await expect(best).toContainText('The best layout is laid.')
  await expect(page.getByRole('cell', { name: 'enough' }).first()).toBeVisible()
  await expect(page.getByText('The line holds to 3.384 m.').first()).toBeVisible()

  const weigh = page.getByText('Weigh the skirt edge', { exact: true })
  await expect(weigh).toBeVisible()
  await page.getByRole('button', { name: 'Do it' }).first().click()
  await expect(page.getByText('The line holds to 3.403 m.').first()).toBeVisible()
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(page.getByText('The line holds to 3.384 m.').first()).toBeVisible()
  await expectSaved(page)
})
