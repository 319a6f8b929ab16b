import { expect, test, type Browser, type Page } from '@playwright/test'
import { signInAs } from './support/people'

async function joined(browser: Browser, code: string): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 } })
  const page = await context.newPage()
  await page.goto(`/class/${code}`)
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(/How deep before it goes/)
  return page
}

async function guess(page: Page, step: number): Promise<void> {
  await page.getByRole('slider').fill(String(step))
  await page.getByRole('button', { name: 'Send my guess' }).click()
}

test('a class of three guesses, one of them without signal for a while', async ({ browser }) => {
  const trainer = await (await browser.newContext()).newPage()
  await signInAs(trainer, 'Trainer', '/desk')
  await trainer.goto('/demonstrator?course=short')
  await trainer.getByRole('button', { name: 'Class', exact: true }).click()
  await trainer.getByRole('button', { name: 'Open a class' }).click()
  const code = (await trainer.getByTestId('class-code').textContent())!.replace(' ', '')

  const phones = [await joined(browser, code), await joined(browser, code)]
  const third = await joined(browser, code)
  await expect(trainer.getByTestId('class-follow')).toHaveText(/^Phones: 3/)
  for (const [i, phone] of phones.entries()) {
    await guess(phone, 10 + 20 * i)
    await expect(phone.getByTestId('told')).toHaveText(/^Sent: 0\.[13]0\sm/)
  }
  const plot = trainer.getByTestId('dot-plot')
  await expect(plot).toHaveAttribute('data-dots', '2')

  await third.context().setOffline(true)
  await expect(third.getByText(/^No signal/)).toBeVisible()
  await guess(third, 50)
  await expect(third.getByTestId('told')).toHaveText(/^Kept: 0\.50\sm/)
  await expect(plot).toHaveAttribute('data-dots', '2')
  await third.context().setOffline(false)
  await expect(third.getByTestId('told')).toHaveText(/^Sent: 0\.50\sm/)
  await expect(plot).toHaveAttribute('data-dots', '3')

  // Show, and let the script run to its end at once.
  await trainer.getByRole('button', { name: 'Show', exact: true }).click()
  await trainer.getByRole('button', { name: 'Show', exact: true }).click()
  for (const phone of [...phones, third]) {
    await expect(phone.getByTestId('dot-plot')).toHaveAttribute('data-dots', '3')
  }
  await trainer.getByRole('button', { name: 'Close the class' }).click()
  await expect(third.getByText('The class is over. Thank you.')).toBeVisible()
})
