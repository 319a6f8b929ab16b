import { expect, test } from '@playwright/test'
import { QuickCheckPage } from './support/quick-check-page'

/**
 * 95th percentiles [ms]. The target counts on two quiet cores (`SPEED_GATE=1 npx playwright test
 * speed`); where other work shares them, as in a whole test run, the wide bound still finds a drag
 * that has become slow. The figures are printed either way.
 */
const TARGET = { script: 6, frame: 20 }
const ON_A_BUSY_MACHINE = { script: 40, frame: 120 }
const BOUND = process.env.SPEED_GATE ? TARGET : ON_A_BUSY_MACHINE

/** Fewer would be no drag. */
const LEAST_INPUTS = process.env.SPEED_GATE ? 60 : 10

/** How long the water is dragged [ms]. */
const DRAG = 4000

function percentile95(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b)
  return sorted[Math.min(sorted.length - 1, Math.floor(sorted.length * 0.95))] ?? Number.NaN
}

interface Recorded {
  readonly inputs: number[]
  readonly frames: number[]
}

for (const [name, grip, reach] of [
  ['water', /water/i, 60],
  ['air', /air/i, 40],
] as const) {
  test(`dragging the ${name} keeps up with the hand`, async ({ page }) => {
    const check = new QuickCheckPage(page)
    await check.open()
    await check.settle()
    await page.evaluate(() => {
      const recorded: Recorded = { inputs: [], frames: [] }
      Object.assign(window, { recorded })
      new PerformanceObserver((list) => {
        for (const { name: entry, duration } of list.getEntries())
          if (entry === 'toehold:input') recorded.inputs.push(duration)
      }).observe({ type: 'measure' })
      let last = performance.now()
      const tick = (now: number) => {
        recorded.frames.push(now - last)
        last = now
        requestAnimationFrame(tick)
      }
      requestAnimationFrame(tick)
    })

    const box = (await page.getByRole('slider', { name: grip }).boundingBox())!
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
    await page.mouse.move(x, y)
    await page.mouse.down()
    const end = Date.now() + DRAG
    for (let turn = 0; Date.now() < end; turn += 1)
      await page.mouse.move(x, y + reach * Math.sin(turn / 12))
    await page.mouse.up()

    const { inputs, frames } = await page.evaluate(
      () => (window as unknown as { recorded: Recorded }).recorded,
    )
    const [script, frame] = [percentile95(inputs), percentile95(frames)]
    console.log(
      `${name}: ${inputs.length} inputs, script p95 ${script.toFixed(2)} ms; ` +
        `${frames.length} frames, p95 ${frame.toFixed(1)} ms`,
    )
    expect(inputs.length).toBeGreaterThan(LEAST_INPUTS)
    expect(script).toBeLessThanOrEqual(BOUND.script)
    expect(frame).toBeLessThanOrEqual(BOUND.frame)
  })
}
