import { expect, type APIRequestContext, type Page } from '@playwright/test'
import { lowRoadContent, SHORT_STATIONS, sizeRun } from '../../support/ferry-quay'

/** Names that no other test of the run uses. */
export function unique(name: string): string {
  return `${name} ${Date.now().toString(36)}${Math.floor(Math.random() * 1296).toString(36)}`
}

export async function makeProject(page: Page, name: string): Promise<void> {
  await page.goto('/desk')
  await page.getByRole('button', { name: 'New project' }).first().click()
  const dialog = page.getByRole('dialog', { name: 'New project' })
  await dialog.getByLabel('Name', { exact: true }).fill(name)
  await dialog.getByLabel('Datum').fill('Test datum')
  await dialog.getByRole('button', { name: 'Make the project' }).click()
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible()
}

/** Makes a line with three stations, the second and third pasted as from a spreadsheet. */
export async function makeLine(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'New line' }).first().click()
  const dialog = page.getByRole('dialog', { name: 'New line' })
  await dialog.getByLabel('Name').fill(name)
  await dialog.getByLabel('Ground level').fill('2,90')
  await dialog.getByRole('button', { name: 'Make the line' }).click()
  await expect(page.getByRole('heading', { level: 1, name })).toBeVisible()
  await page.getByRole('button', { name: 'Change the survey' }).click()
  await page.getByRole('button', { name: 'Paste rows' }).click()
  const paste = page.getByRole('dialog', { name: 'Rows from a spreadsheet' })
  await paste.getByLabel('Rows').fill('10\t2,80\tturf\n20\t2,95\tturf')
  await expect(paste.getByText('2 rows read as Chainage, Ground, Surface.')).toBeVisible()
  await paste.getByRole('button', { name: 'Add below' }).click()
  await page.getByRole('button', { name: 'Save the survey' }).click()
  await expect(page.getByText('20 m, 3 stations, sections of 10 m')).toBeVisible()
}

/** A project with one line and one scenario, made over the API with the session of the page. */
export async function givenScenario(page: Page): Promise<{ project: string; scenario: string }> {
  const headers = { origin: new URL(page.url()).origin }
  const make = async (path: string, data: object) => {
    const answer = await page.request.post(path, { headers, data })
    expect(answer.status(), await answer.text()).toBe(201)
    return ((await answer.json()) as { id: string }).id
  }
  const name = unique('Mill bank')
  const project = await make('/api/projects', { name, datum: 'Test datum' })
  const lines = `/api/projects/${project}/lines`
  const line = await make(lines, { name: 'Mill road', stations: SHORT_STATIONS })
  const content = { ...lowRoadContent(), waterLevel: 3.22, place: 10, sizes: [sizeRun(0, 20)] }
  const scenario = await make(`${lines}/${line}/scenarios`, { name: 'Tonight', content })
  const path = `/projects/${project}/lines/${line}/scenarios/${scenario}`
  await page.goto(path)
  await expectSaved(page)
  return { project: name, scenario: path }
}

export async function makeScenario(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name: 'New scenario' }).first().click()
  const dialog = page.getByRole('dialog', { name: 'New scenario' })
  await dialog.getByLabel('Name').fill(name)
  await dialog.getByRole('button', { name: 'Make it' }).click()
  await expectSaved(page)
}

/** Where the workbench says how it stands with the server. */
export const saving = (page: Page) => page.getByTestId('saving')

export const level = (page: Page) => page.getByRole('textbox', { name: 'Water level' })

/** Waits until the newest state is with the server. */
export async function expectSaved(page: Page): Promise<void> {
  await expect(saving(page)).toContainText('Saved at', { timeout: 15_000 })
}

/** Addresses of the demonstration project, asked of the API with the session of the page. */
export async function demoPlaces(request: APIRequestContext) {
  const items = async (path: string) =>
    ((await (await request.get(path)).json()) as { items: { id: string; name: string }[] }).items
  const project = (await items('/api/projects?search=Ferry')).find((p) => p.name === 'Ferry Quay')!
  const lines = await items(`/api/projects/${project.id}/lines`)
  const line = lines.find(({ name }) => name === 'Low road')!
  const [scenario] = await items(`/api/projects/${project.id}/lines/${line.id}/scenarios`)
  const projectPath = `/projects/${project.id}`
  const linePath = `${projectPath}/lines/${line.id}`
  return { project: projectPath, line: linePath, scenario: `${linePath}/scenarios/${scenario!.id}` }
}
