// @vitest-environment jsdom
import { cleanup, configure, render, screen, waitFor, within } from '@testing-library/vue'
import userEvent from '@testing-library/user-event'
import { createPinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { createMemoryHistory, createRouter } from 'vue-router'
import { createTexts } from '../../../src/i18n'
import QuickCheckView from '../../../src/views/QuickCheckView.vue'

// Working out for each of a thousand elements whether it is hidden takes jsdom seconds.
configure({ defaultHidden: true })
vi.setConfig({ testTimeout: 20_000 })

/** jsdom has no layout: the page is a desk, and the drawing has a size. */
function withLayout(): void {
  vi.stubGlobal('matchMedia', (media: string) => ({
    media,
    matches: false,
    addEventListener: vi.fn(),
    removeEventListener: vi.fn(),
  }))
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe = vi.fn()
      unobserve = vi.fn()
      disconnect = vi.fn()
    },
  )
  vi.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue(
    new DOMRect(0, 0, 900, 420),
  )
}

async function open(query = '') {
  const component = { template: '<div />' }
  const router = createRouter({
    history: createMemoryHistory(),
    routes: [{ path: '/', component }],
  })
  await router.push(`/${query}`)
  render(QuickCheckView, { global: { plugins: [createPinia(), createTexts(), router] } })
  return userEvent.setup()
}

/** The field under a label. The library's own search by label takes seconds on a page of this size. */
function field(name: string): HTMLInputElement {
  const labels = [...document.querySelectorAll('label')]
  const control = labels.find(({ textContent }) => textContent === name)?.control
  if (!(control instanceof HTMLInputElement)) throw new Error(`no field "${name}"`)
  return control
}
const band = () => document.querySelector<HTMLElement>('section[aria-label="Verdict"]')!
const verdict = () => within(band()).getByTestId('verdict').textContent?.trim()

async function enter(user: ReturnType<typeof userEvent.setup>, name: string, text: string) {
  await user.clear(field(name))
  if (text !== '') await user.type(field(name), text)
}

beforeEach(() => {
  localStorage.clear()
  withLayout()
})

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
  vi.restoreAllMocks()
})

describe('the Quick check', () => {
  it('opens with a tube of 0.70 m in 0.42 m of water, which holds', async () => {
    await open()
    expect(field('Depth of water').value).toBe('0.42')
    expect(verdict()).toBe('Holds')
    expect(band().textContent).toMatch(/holds to 0\.489\sm, then slides/)
    expect(band().textContent).toMatch(/Leave before 0\.439\sm/)
  })

  it('names every text that it shows', async () => {
    const warn = vi.spyOn(console, 'warn')
    await open('?v=1&water=gauge&plusminus=0.1&wave=0.1&period=2&suitable=no&basis=partial-ec7')
    const said = warn.mock.calls.flat().map(String)
    expect(said.filter((line) => line.includes('Not found'))).toEqual([])
    expect(document.body.textContent).not.toMatch(/quickCheck\.|checks\.|drawing\./)
  })

  it('follows what is typed, with a decimal comma', async () => {
    const user = await open()
    await enter(user, 'Depth of water', '0,55')
    expect(verdict()).toBe('Does not hold')
    expect(field('Depth of water').value).toBe('0,55')
  })

  it('keeps the last good answer beside a wrong entry, and says so', async () => {
    const user = await open()
    await enter(user, 'Depth of water', 'deep')
    expect(field('Depth of water').value).toBe('deep')
    expect(field('Depth of water').getAttribute('aria-invalid')).toBe('true')
    expect(band().textContent).toMatch(/“deep” is not a number\. Allowed: 0 to 1\.05 m/)
    expect(band().textContent).toContain('last valid input')
  })

  it('does not lean on the last good answer once the skirt is off', async () => {
    await open('?v=1&skirt=0&uplift=developing')
    expect(verdict()).toBe('Does not hold')
    expect(document.body.textContent).not.toMatch(/\bholds\b/i)
  })

  it('moves the water with the arrow keys on the drawing', async () => {
    const user = await open()
    screen.getByRole('slider', { name: /water/i }).focus()
    await user.keyboard('{ArrowUp}')
    expect(field('Depth of water').value).toBe('0.421')
  })

  it('says low, expected and high water, each with its verdict', async () => {
    const user = await open()
    await enter(user, 'Give or take ±', '0.1')
    const marks = await screen.findByRole('table', { name: 'Low, expected, high' })
    expect(await within(marks).findByRole('row', { name: /Low.*Holds/ })).toBeTruthy()
    expect(within(marks).getByRole('row', { name: /High.*Does not hold/ })).toBeTruthy()
  })

  it('keeps the water where it is when it is entered as a level', async () => {
    const user = await open()
    await user.click(screen.getByRole('radio', { name: 'Level' }))
    expect(field('Water level').value).toBe('3.29')
    expect(band().textContent).toMatch(/Level 3\.290\sm \(0\.420\sm of water\)/)
  })

  it('says to leave now once the water has reached the leave level', async () => {
    const user = await open()
    await enter(user, 'Water now', '0.44')
    await waitFor(() => {
      expect(band().textContent).toContain('Leave now.')
    })
  })

  it('says that it holds but must be left before it', async () => {
    await open('?v=1&depth=0.46')
    expect(verdict()).toBe('Holds narrowly')
    expect(band().textContent).toContain('Holds, but must be left before it')
  })

  it('shows demand and resistance of a check', async () => {
    const user = await open()
    await user.click(within(band()).getByRole('button', { name: /^Sliding/ }))
    expect(band().textContent).toMatch(/The loads along the ground come to 0\.87\skN\/m/)
  })

  it('brings the waves to the front where they govern, and puts grown ones into the case', async () => {
    const user = await open('?v=1&wave=0.1&period=2&wind=15&fetch=500&fetchdepth=1')
    const title = await screen.findByText('One by one', {}, { timeout: 15_000 })
    const parts = within(title.closest('section')!)
    const [first] = parts.getAllByRole('listitem')
    expect(first!.textContent).toMatch(/^\s*Waves\s*governs/)
    await user.click(within(first!).getByRole('button', { name: /^Check with waves of/ }))
    expect(field('Wave height').value).toMatch(/^0\.[0-9]+$/)
    expect(field('Wave height').value).not.toBe('0.1')
  })

  it('answers what it says on the bag', async () => {
    await open()
    expect(band().textContent).toMatch(/“But it says 0\.70\sm on the bag”/)
    expect(band().textContent).toMatch(/It defends 0\.489\sm of water/)
  })

  it('names what decides once it is worked out', async () => {
    await open()
    await waitFor(
      () => {
        expect(screen.getByRole('row', { name: /sealed, 0\s% .*0\.588/ })).toBeTruthy()
      },
      { timeout: 15_000 },
    )
    expect(screen.getByRole('row', { name: /open, 100\s% chosen .*0\.489/ })).toBeTruthy()
  })

  it('copies two lines with the link', async () => {
    const user = await open()
    await user.click(screen.getByRole('button', { name: 'Copy as text' }))
    const lines = (await navigator.clipboard.readText()).split('\n')
    expect(lines).toHaveLength(2)
    expect(lines[0]).toMatch(/^Holds: 0\.420\sm of water; holds to 0\.489\sm, then slides\. Leave/)
    expect(lines[1]).toMatch(/^Rests on tube 0\.70\sm .* http:\/\/localhost:\d+\/\?v=1&/)
  })

  it('starts again from the default case', async () => {
    const user = await open('?v=1&depth=0.3&air=9000')
    await user.click(screen.getByRole('button', { name: 'Start again' }))
    expect(field('Depth of water').value).toBe('0.42')
    expect(field('Air pressure').value).toBe('15')
  })
})
