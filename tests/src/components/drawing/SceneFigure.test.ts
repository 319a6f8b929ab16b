// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import SceneFigure from '../../../../src/components/drawing/SceneFigure.vue'
import { usePreferences } from '../../../../src/stores/preferences'
import { draw, tube, WIDE } from '../../../shared/drawing/drawn-case'
import { plugins, stubBrowser } from './painted'

beforeEach(() => stubBrowser(WIDE))
afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
  vi.restoreAllMocks()
})

const scene = draw(tube())

function show() {
  return render(SceneFigure, { props: { scene }, global: { plugins: plugins() } })
}

describe('a painted scene', () => {
  it('is one image with a name and a description', () => {
    show()
    const image = screen.getByRole('img', { name: 'Cross-section of the barrier under load' })
    const description = document.getElementById(image.getAttribute('aria-describedby')!)
    expect(description!.textContent).toContain('The water is 0.420\u00a0m deep.')
  })

  it('changes its description with the case', async () => {
    const { rerender } = show()
    await rerender({ scene: draw(tube({ water: { depth: 0.6 } })) })
    expect(document.querySelector('desc')!.textContent).toContain('The section does not hold.')
  })

  it('paints every item with the class of its role and no colour of its own', () => {
    const { container } = show()
    expect(container.querySelectorAll('svg > path, svg > text')).toHaveLength(scene.items.length)
    expect(container.querySelector('.scene-water-line')).not.toBeNull()
    expect(container.querySelector('.scene-skirt')!.getAttribute('stroke')).toBeNull()
    expect(container.innerHTML).not.toMatch(/#[0-9a-f]{6}/)
  })

  it('paints fading areas with gradients that it holds itself', () => {
    const { container } = show()
    const fill = container.querySelector('.scene-water')!.getAttribute('fill')!
    const id = /^url\(#(.+)\)$/.exec(fill)![1]!
    expect(document.getElementById(id)!.localName.toLowerCase()).toBe('lineargradient')
  })

  it('speaks the units of the reader', async () => {
    show()
    expect(screen.getByText(/^thrust 0\.87\skN\/m$/)).toBeTruthy()
    usePreferences().units = 'us'
    await nextTick()
    expect(screen.getByText(/^thrust 59\.3\slbf\/ft$/)).toBeTruthy()
  })
})
