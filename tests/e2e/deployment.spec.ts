import { expect, test } from '@playwright/test'
import { expectAccessible } from './support/axe'
import { signInAs } from './support/people'
import { expectSaved } from './support/projects'

const LINE = '/projects/demo-ferry-quay/lines/demo-line-off-the-gravel'
const PLAN = `${LINE}/scenarios/demo-line-off-the-gravel-edges-weighed/deployment`

test('a plan is judged, laid in another order, taken back and kept', async ({ page }) => {
  await signInAs(page, 'Engineer A', PLAN)
  const answer = page.getByTestId('plan-answer')
  await expect(answer).toContainText(/Finished at Tue \d\d:\d\d; late by \d+ min at ch \d+\./)
  await expect(page.getByRole('img', { name: 'Timeline of the deployment' })).toBeVisible()
  await expectAccessible(page, 'deployment')

  const late = await answer.innerText()
  await page.getByRole('button', { name: 'Lay so Outward from ch 40' }).click()
  await expect(answer).toContainText('margin')
  await expect(answer).not.toHaveText(late)
  await expectSaved(page)
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(answer).toContainText('late by')

  await page.getByRole('textbox', { name: 'Pairs' }).fill('2.5')
  await expect(page.getByText('Whole numbers only.')).toBeVisible()
  await page.getByRole('textbox', { name: 'Pairs' }).fill('0')
  await expect(page.getByText(/1 to 50/)).toBeVisible()
  await page.getByRole('textbox', { name: 'Pairs' }).fill('2')
  await expectSaved(page)
})

test('a depot is changed by whoever keeps it, and read by others', async ({ page }) => {
  await signInAs(page, 'Engineer B', '/depots')
  await page.getByRole('button', { name: 'Change Works yard' }).click()
  const row = page.getByRole('textbox', { name: 'In repair 1' })
  await row.fill('-1')
  await expect(page.getByText(/0 to 100000/)).toBeVisible()
  await expect(page.getByRole('button', { name: 'Save the depot' })).toBeDisabled()
  await row.fill('1')
  await expectAccessible(page, 'depots')
  await page.getByRole('button', { name: 'Save the depot' }).click()
  await expect(page.getByText('Works yard is saved.')).toBeVisible()
})
