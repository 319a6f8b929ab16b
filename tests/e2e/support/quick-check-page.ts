import { expect, type Locator, type Page } from '@playwright/test'

/** The Quick check as a person meets it: roles and labels. */
export class QuickCheckPage {
  readonly verdict: Locator
  readonly waterGrip: Locator
  readonly band: Locator

  constructor(readonly page: Page) {
    this.band = page.getByRole('region', { name: 'Verdict' })
    this.verdict = this.band.getByTestId('verdict')
    this.waterGrip = page.getByRole('slider', { name: /water/i })
  }

  async open(query = ''): Promise<void> {
    await this.page.goto(`/${query}`)
    await expect(this.verdict).toBeVisible()
  }

  field(label: string): Locator {
    return this.page.getByRole('textbox', { name: label, exact: true })
  }

  async type(label: string, text: string): Promise<void> {
    await this.field(label).fill(text)
  }

  /** Depth that the grip reports [m]. */
  async depth(): Promise<number> {
    return Number(await this.waterGrip.getAttribute('aria-valuenow'))
  }

  /** Opens every folded group of inputs and the workings of one check. */
  async unfoldAll(): Promise<void> {
    const folded = 'main button[aria-expanded="false"]:not([aria-label])'
    await this.page.evaluate((selector) => {
      document.querySelectorAll<HTMLElement>(selector).forEach((button) => button.click())
    }, folded)
    // A phone folds the groups themselves: their inner ones appear only now.
    await this.page.evaluate((selector) => {
      document.querySelectorAll<HTMLElement>(selector).forEach((button) => button.click())
    }, folded)
  }

  /** Takes an option of a list with the keys. */
  async choose(label: string, option: RegExp): Promise<void> {
    await this.page.getByRole('combobox', { name: label }).focus()
    await this.page.keyboard.press('Enter')
    await this.page.getByRole('option', { name: option }).click()
  }

  /** Waits until nothing on the page is still being worked out. */
  async settle(): Promise<void> {
    await expect(this.page.locator('[aria-busy="true"]')).toHaveCount(0)
    await expect(this.page.getByText('updating')).toHaveCount(0)
  }
}
