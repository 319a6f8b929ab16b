import { expect, test, type Browser, type Page } from '@playwright/test'
import { expectAccessibleInItsTheme } from './support/themes'
import { signInAs, signOut } from './support/people'
import {
  demoPlaces,
  expectSaved,
  givenScenario,
  level,
  makeLine,
  makeProject,
  makeScenario,
  saving,
  unique,
} from './support/projects'

async function otherPage(browser: Browser, name: string, path: string): Promise<Page> {
  const page = await (await browser.newContext()).newPage()
  await signInAs(page, name, path)
  return page
}

test('work is made, moves with the water, is saved by itself and found again tomorrow', async ({
  page,
}) => {
  await signInAs(page, 'Engineer A', '/desk')
  const project = unique('Mill bank')
  await makeProject(page, project)
  await makeLine(page, 'Mill road')
  await makeScenario(page, 'Tonight')

  await expect(level(page)).toHaveValue('3.22')
  await expect(page.getByTestId('line-verdict')).toContainText('Holds')
  const grip = page.getByRole('slider', { name: 'Water level' })
  await grip.focus()
  for (let step = 0; step < 10; step += 1) await page.keyboard.press('PageUp')
  await expect(level(page)).toHaveValue('3.32')
  await expect(page.getByTestId('verdict')).toContainText('Does not hold')
  await expect(page.getByTestId('line-verdict')).toContainText('Does not hold')
  await expectSaved(page)

  await signOut(page)
  await signInAs(page, 'Engineer A', '/desk')
  await page.getByRole('link', { name: project, exact: true }).first().click()
  await expect(page.getByRole('heading', { level: 1, name: project })).toBeVisible()
  await page.getByRole('link', { name: 'Mill road' }).click()
  const row = page.getByRole('row', { name: /Tonight/ })
  await expect(row).toContainText('3.320')
  await expect(row).toContainText('Does not hold')
  await row.getByRole('link', { name: 'Tonight' }).click()
  await expect(level(page)).toHaveValue('3.32')
})

test('every change is a step that is taken back and done again', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/desk')
  await givenScenario(page)
  await level(page).fill('3,10')
  await page.getByRole('textbox', { name: 'Friction', exact: true }).fill('0.3')
  await expectSaved(page)
  await page.getByRole('button', { name: 'Undo' }).click()
  await expect(page.getByRole('textbox', { name: 'Friction', exact: true })).toHaveValue('0.45')
  await page.keyboard.press('Control+z')
  await expect(level(page)).toHaveValue('3.22')
  await expect(page.getByRole('button', { name: 'Undo' })).toBeDisabled()
  await page.keyboard.press('Control+Shift+Z')
  await expect(level(page)).toHaveValue('3.1')
  await expectSaved(page)
  await page.reload()
  await expect(level(page)).toHaveValue('3.1')
  await expect(page.getByRole('textbox', { name: 'Friction', exact: true })).toHaveValue('0.45')
})

test('an older state is looked at, and comes back as the newest version', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/desk')
  await givenScenario(page)
  await level(page).fill('3.05')
  await expectSaved(page)
  await page.getByRole('button', { name: 'History' }).click()
  await page.getByRole('button', { name: 'Look at version 1' }).click()
  const dialog = page.getByRole('dialog', { name: 'History of the scenario' })
  await expect(dialog.getByRole('row', { name: /Water level/ })).toContainText('3.22')
  await dialog.getByRole('button', { name: 'Restore this version' }).click()
  await expect(level(page)).toHaveValue('3.22')
  await page.reload()
  await expect(level(page)).toHaveValue('3.22')
})

test('two people save one scenario, both versions are shown, and nothing is lost', async ({
  page,
  browser,
}) => {
  await signInAs(page, 'Engineer A', '/desk')
  const { scenario } = await givenScenario(page)
  await page.goto(scenario.split('/lines/')[0]!)
  await page.getByRole('button', { name: 'Add somebody' }).click()
  const form = page.getByRole('dialog', { name: 'Add somebody to the project' })
  await form.getByLabel('Address of their account').fill('engineer.b@demo.invalid')
  await form.getByLabel('Role', { exact: true }).selectOption('Editor')
  await form.getByRole('button', { name: 'Add', exact: true }).click()
  await expect(page.getByText('Engineer B is a member now.')).toBeVisible()

  await page.goto(scenario)
  await expectSaved(page)
  const other = await otherPage(browser, 'Engineer B', scenario)
  await expectSaved(other)

  await other.getByRole('textbox', { name: 'Friction', exact: true }).fill('0.35')
  await level(other).fill('3.4')
  await expectSaved(other)
  await level(page).fill('3.3')

  const dialog = page.getByRole('dialog', { name: 'Somebody else saved meanwhile' })
  await expect(dialog).toBeVisible({ timeout: 15_000 })
  await dialog.getByRole('button', { name: 'Decide later' }).click()
  await expect(saving(page)).toContainText('somebody else saved')
  await page.getByRole('textbox', { name: 'Crossfall' }).fill('1')
  await page.getByRole('button', { name: 'Decide', exact: true }).click()
  await expect(dialog.getByRole('row', { name: /Water level/ })).toContainText('3.30')
  await expect(dialog.getByRole('row', { name: /Water level/ })).toContainText('3.40')
  await expect(
    dialog.getByRole('radio', { name: 'Friction, Turf, mown and firm: Theirs, Engineer B' }),
  ).toBeChecked()
  await expect(dialog.getByRole('radio', { name: 'Crossfall: Mine' })).toBeChecked()
  await expect(dialog.getByRole('button', { name: 'Save this' })).toBeDisabled()
  await dialog.getByRole('radio', { name: 'Water level: Mine' }).check()
  await dialog.getByRole('button', { name: 'Save this' }).click()
  await expectSaved(page)

  for (const shown of [page, other]) {
    await shown.reload()
    await expect(level(shown)).toHaveValue('3.3')
    await expect(shown.getByRole('textbox', { name: 'Friction', exact: true })).toHaveValue('0.35')
    await expect(shown.getByRole('textbox', { name: 'Crossfall' })).toHaveValue('1')
  }
  await page.getByRole('button', { name: 'History' }).click()
  await page.getByRole('button', { name: 'Look at version 3' }).click()
  await expect(page.getByRole('dialog').getByRole('row', { name: /Water level/ })).toContainText(
    '3.40',
  )
})

test('without a network nothing typed is lost, and it is sent as soon as there is one', async ({
  page,
  context,
}) => {
  await signInAs(page, 'Engineer A', '/desk')
  await givenScenario(page)
  await context.setOffline(true)
  await level(page).fill('3.01')
  await expect(saving(page)).toContainText('Not saved: no answer', { timeout: 15_000 })
  await context.setOffline(false)
  await expectSaved(page)
  await page.reload()
  await expect(level(page)).toHaveValue('3.01')
})

test('a session that ends in the middle of work loses nothing', async ({ page, context }) => {
  await signInAs(page, 'Engineer A', '/desk')
  await givenScenario(page)
  await context.clearCookies()
  await level(page).fill('3.02')
  await expect(level(page)).toHaveValue('3.02')
  const dialog = page.getByRole('dialog')
  await expect(dialog).toBeVisible({ timeout: 15_000 })
  await dialog.getByLabel('Password').fill('high water at seven')
  await dialog.getByRole('button', { name: /Sign in/ }).click()
  await expect(dialog).toBeHidden()
  await expect(level(page)).toHaveValue('3.02')
  await expectSaved(page)
  await page.reload()
  await expect(level(page)).toHaveValue('3.02')
})

test('a viewer reads everything and can write nothing', async ({ page }) => {
  await signInAs(page, 'Viewer at the authority', '/desk')
  await expect(page.getByRole('button', { name: 'New project' })).toHaveCount(0)
  const places = await demoPlaces(page.request)
  await page.goto(places.project)
  await expect(page.getByText('You read this project')).toBeVisible()
  for (const name of ['Change', 'New line', 'Add a gauge', 'Add somebody', 'Archive'])
    await expect(page.getByRole('button', { name, exact: true })).toHaveCount(0)
  await page.goto(places.line)
  await expect(page.getByText('You read this project')).toBeVisible()
  for (const name of ['New scenario', 'Change the survey', 'Duplicate'])
    await expect(page.getByRole('button', { name, exact: true })).toHaveCount(0)
  await page.goto(places.scenario)
  await expect(page.getByText('You read this project')).toBeVisible()
  await expect(level(page)).toHaveAttribute('readonly', '')
  await expect(page.getByRole('slider', { name: 'Water level' })).toHaveCount(0)
  await expect(page.getByRole('button', { name: 'Undo' })).toHaveCount(0)
  await expect(page.getByTestId('line-verdict')).toBeVisible()
})

test('an outsider sees no project that is not theirs', async ({ page, browser }) => {
  await signInAs(page, 'Engineer A', '/desk')
  const places = await demoPlaces(page.request)
  const outsider = await otherPage(browser, 'Trainer', '/desk')
  await expect(outsider.getByRole('link', { name: 'Ferry Quay' })).toHaveCount(0)
  for (const path of Object.values(places)) {
    await outsider.goto(path)
    await expect(outsider.getByText('It is not here').first()).toBeVisible()
    await expect(outsider.getByRole('heading', { level: 1 })).toHaveCount(0)
  }
})

test('a Quick check is kept in a project after signing in, with the case intact', async ({
  page,
}) => {
  await page.goto('/?v=1&water=level&level=3.35&groundlevel=2.87&friction=0.41')
  await page.getByRole('button', { name: 'Save to a project' }).click()
  await expect(page).toHaveURL(/\/sign-in/)
  await page.getByRole('button', { name: /^Engineer A/ }).click()
  const dialog = page.getByRole('dialog', { name: 'Save to a project' })
  await expect(dialog).toBeVisible()
  await dialog.getByLabel('Project').selectOption('Ferry Quay')
  await dialog.getByLabel('Line', { exact: true }).selectOption('A new line with one station')
  await dialog.getByLabel('Name of the line').fill(unique('Behind the mill'))
  await expect(dialog.getByLabel('Ground level of its station')).toHaveValue('2.87')
  await dialog.getByLabel('Name of the scenario').fill('From the Quick check')
  await dialog.getByRole('button', { name: 'Save it there' }).click()
  await expectSaved(page)
  await expect(level(page)).toHaveValue('3.35')
  await expect(page.getByRole('textbox', { name: 'Friction', exact: true })).toHaveValue('0.41')
  await expect(page.getByText('Level 3.350 m (0.480 m of water)').first()).toBeVisible()
})

test('two scenarios stand side by side with their differences marked', async ({ page }) => {
  await signInAs(page, 'Engineer A', '/desk')
  const places = await demoPlaces(page.request)
  await page.goto(places.line)
  await page.getByRole('checkbox', { name: 'Compare As asked: 0.70 m on Low road' }).check()
  await page.getByRole('checkbox', { name: 'Compare Upper band 3.54' }).check()
  const table = page.getByRole('table', { name: 'Two scenarios and where they differ' })
  await expect(table.getByRole('row', { name: /Water level.*differs/ })).toContainText('3.54')
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('link', { name: 'CSV file' }).click(),
  ])
  expect(download.suggestedFilename()).toBe('scenarios.csv')
})

test('a survey names its faults by row and column, and warns of a chainage that x and y deny', async ({
  page,
}) => {
  await signInAs(page, 'Engineer A', '/desk')
  await givenScenario(page)
  await page.getByRole('link', { name: 'Mill road' }).click()
  await page.getByRole('button', { name: 'Change the survey' }).click()
  await page.getByRole('textbox', { name: 'Ground, row 2' }).fill('low')
  await expect(page.getByText('Row 2, Ground: not a number')).toBeVisible()
  await expect(page.getByRole('button', { name: 'Save the survey' })).toBeDisabled()
  await page.getByRole('textbox', { name: 'Ground, row 2' }).fill('2.8')
  for (const [row, x] of [
    [1, '0'],
    [2, '14'],
    [3, '24'],
  ] as const) {
    await page.getByRole('textbox', { name: `x, row ${row}` }).fill(x)
    await page.getByRole('textbox', { name: `y, row ${row}` }).fill('0')
  }
  await expect(page.getByText(/Row 2: 10 is 10.00 m from the station before it/)).toBeVisible()
})

for (const width of [1440, 390]) {
  test(`axe finds nothing serious at ${width} px`, async ({ page }) => {
    // Axe on five pages and a dialog.
    test.slow()
    await page.setViewportSize({ width, height: 900 })
    await signInAs(page, 'Engineer A', '/desk')
    const places = await demoPlaces(page.request)
    const pages = { desk: '/desk', projects: '/projects', ...places }
    for (const [name, path] of Object.entries(pages)) {
      await page.goto(path)
      await expect(page.getByRole('heading', { level: 1 })).toBeAttached()
      await page.waitForLoadState('networkidle')
      await expectAccessibleInItsTheme(page, `${name}, ${width} px`)
      const overflow = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      )
      expect(overflow, `${name} is not wider than ${width} px`).toBeLessThanOrEqual(0)
    }
    await page.getByRole('button', { name: 'History' }).click()
    await expect(page.getByRole('button', { name: 'Look at version 1' })).toBeVisible()
    await expectAccessibleInItsTheme(page, `history, ${width} px`)
  })
}
