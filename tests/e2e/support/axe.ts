import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

/** Another theme changes colours and nothing else. */
const OF_COLOURS = ['color-contrast', 'link-in-text-block']

/**
 * Expects that axe finds nothing serious on the page as it stands.
 *
 * @param of The rules to ask; those of colours are enough for a page that was seen in another theme.
 */
export async function expectAccessible(
  page: Page,
  name: string,
  of: 'all' | 'colours' = 'all',
): Promise<void> {
  const axe = new AxeBuilder({ page })
  const { violations } = await (of === 'all' ? axe : axe.withRules(OF_COLOURS)).analyze()
  const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical')
  const found = serious.map(
    ({ id, nodes }) =>
      `${id}: ${nodes.map(({ html, failureSummary }) => `${html} ${failureSummary}`).join(' | ')}`,
  )
  expect(found, name).toEqual([])
}
