// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import { evaluateSection } from '../../../../shared/checks/evaluate-section'
import type { SectionCase } from '../../../../shared/schemas/section-case'
import { FOOT } from '../../../../shared/units'
import CrossSectionFigure from '../../../../src/components/drawing/CrossSectionFigure.vue'
import { usePreferences } from '../../../../src/stores/preferences'
import { draw, tube, WIDE } from '../../../shared/drawing/drawn-case'
import { plugins, point, stubBrowser } from './painted'

let browser: ReturnType<typeof stubBrowser>
beforeEach(() => {
  browser = stubBrowser(WIDE)
})
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
  vi.restoreAllMocks()
})

const propsOf = (section: SectionCase, more: object = {}) => ({
  section,
  evaluation: evaluateSection(section),
  ...more,
})

async function show(section = tube(), more: object = {}) {
  const shown = render(CrossSectionFigure, {
    props: propsOf(section, more),
    global: { plugins: plugins() },
  })
  await nextTick()
  return shown
}

const water = () => screen.getByRole('slider', { name: 'Water level' })
const air = () => screen.getByRole('slider', { name: 'Air pressure in the tube' })

describe('the grip on the water', () => {
  it('is a slider in metres that speaks in words', async () => {
    await show()
    expect(water().getAttribute('aria-orientation')).toBe('vertical')
    expect(water().getAttribute('aria-valuetext')).toBe('0.420\u00a0m of water')
    expect(Number(water().getAttribute('aria-valuenow'))).toBe(0.42)
    expect(Number(water().getAttribute('aria-valuemin'))).toBe(0)
    expect(Number(water().getAttribute('aria-valuemax'))).toBeCloseTo(1.05, 12)
    expect(water().getAttribute('tabindex')).toBe('0')
  })

  it('speaks in levels where the ground is known, and follows the case', async () => {
    const level = { ground: 2.87, datum: 'QD' }
    const { rerender } = await show(tube(), { level })
    expect(water().getAttribute('aria-valuetext')).toBe('3.290\u00a0m QD, 0.420\u00a0m of water')
    await rerender(propsOf(tube({ water: { depth: 0.5 } }), { level }))
    expect(water().getAttribute('aria-valuetext')).toBe('3.370\u00a0m QD, 0.500\u00a0m of water')
  })

  it.each([
    [{ key: 'ArrowUp' }, 0.421],
    [{ key: 'ArrowDown' }, 0.419],
    [{ key: 'ArrowUp', shiftKey: true }, 0.43],
    [{ key: 'PageUp' }, 0.43],
    [{ key: 'PageDown' }, 0.41],
    [{ key: 'Home' }, 0],
    [{ key: 'End' }, 1.5 * 0.7],
  ])('moves by %o', async (key, depth) => {
    const { emitted } = await show()
    await fireEvent.keyDown(water(), key)
    expect(emitted('update:depth')).toEqual([[depth]])
  })

  it('moves by hundredths of a foot in US units', async () => {
    const { emitted } = await show()
    usePreferences().units = 'us'
    await nextTick()
    await fireEvent.keyDown(water(), { key: 'ArrowUp' })
    const [[depth]] = emitted<[number]>('update:depth') as [[number]]
    expect(depth / FOOT).toBeCloseTo(1.39, 9)
  })

  it('leaves other keys to the page', async () => {
    const { emitted } = await show()
    await fireEvent.keyDown(water(), { key: 'Tab' })
    await fireEvent.keyDown(water(), { key: 'ArrowUp', altKey: true })
    expect(emitted('update:depth')).toBeUndefined()
  })

  it('stays inside the range', async () => {
    const { emitted } = await show(tube({ water: { depth: 0 } }))
    await fireEvent.keyDown(water(), { key: 'ArrowDown' })
    expect(emitted('update:depth')).toBeUndefined()
  })

  it('follows a drag to scale, once for each frame, and rests where it is let go', async () => {
    const { emitted } = await show()
    const { scale } = draw(tube()).grips
    const at = (clientY: number) => ({ clientY })
    await point('pointerdown', water(), at(200))
    expect(emitted('drag-start')).toHaveLength(1)
    for (const y of [190, 180, 170]) await point('pointermove', water(), at(y))
    expect(emitted('update:depth')).toBeUndefined()
    browser.nextFrame()
    const expected = Math.round((0.42 + 30 / scale) * 1000) / 1000
    expect(emitted('update:depth')).toEqual([[expected]])

    await point('pointermove', water(), at(160))
    await point('pointerup', water(), at(160))
    const rest = Math.round((0.42 + 40 / scale) * 1000) / 1000
    expect(emitted('update:depth')).toEqual([[expected], [rest]])
    expect(emitted('drag-end')).toHaveLength(1)
    browser.nextFrame()
    expect(emitted('update:depth')).toHaveLength(2)
  })

  it('ignores a second finger and other buttons', async () => {
    const { emitted } = await show()
    await point('pointerdown', water(), { button: 2, clientY: 200 })
    expect(emitted('drag-start')).toBeUndefined()
    await point('pointerdown', water(), { clientY: 200 })
    await point('pointermove', water(), { pointerId: 2, clientY: 100 })
    browser.nextFrame()
    expect(emitted('update:depth')).toBeUndefined()
  })
})

describe('the grip on the air', () => {
  it('speaks in kilopascals', async () => {
    await show()
    expect(air().getAttribute('aria-valuetext')).toBe('15.0\u00a0kPa')
    expect(Number(air().getAttribute('aria-valuemax'))).toBe(100_000)
  })

  it.each([
    [{ key: 'ArrowUp' }, 15_100],
    [{ key: 'ArrowDown', shiftKey: true }, 14_000],
    [{ key: 'Home' }, 1],
  ])('moves by %o', async (key, pressure) => {
    const { emitted } = await show()
    await fireEvent.keyDown(air(), key)
    expect(emitted('update:airPressure')).toEqual([[pressure]])
  })

  it('follows a drag, a tenth of a kilopascal for each pixel', async () => {
    const { emitted } = await show()
    await point('pointerdown', air(), { clientY: 200 })
    await point('pointermove', air(), { clientY: 220 })
    browser.nextFrame()
    expect(emitted('update:airPressure')).toEqual([[13_000]])
  })
})

it('shows the last shape that stood where the tube does not stand', async () => {
  const { rerender } = await show()
  await rerender(propsOf(tube({ water: { depth: 0.8 } })))
  expect(screen.getByText(/^Overtopped by 0\.12/)).toBeTruthy()
  expect(document.querySelector('.scene-ghost')).not.toBeNull()
})
