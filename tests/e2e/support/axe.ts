import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

/** Expects that axe finds nothing serious on the page as it stands. */
export async function expectAccessible(page: Page, name: string): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze()
  const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')
  const found = serious.map(
    ({ id, nodes }) =>
      `${id}: ${nodes.map(({ html, failureSummary }) => `${html} ${failureSummary}`).join(' | ')}`,
  )
  expect(found, name).toEqual([])
}
