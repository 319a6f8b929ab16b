// @vitest-environment jsdom
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import {
  SHAPE_PAINTS,
  TEXT_TONES,
  THEMES,
  TONES,
  type ThemeName,
} from '../../../shared/drawing/paints'
import { paintsCss } from '../../../shared/drawing/paints-css'
import { SHAPE_ROLES, TEXT_ROLES, type Scene } from '../../../shared/drawing/scene'
import { sceneToSvg } from '../../../shared/drawing/scene-to-svg'
import { texts } from '../../../shared/texts'
import { textResolver } from '../../../shared/texts/format-text'
import { draw, say, tube } from './drawn-case'

const scene = draw(tube({ water: { currentSpeed: 1, depth: 0.42 } }))

function parsed(svg: string): Document {
  const document = new DOMParser().parseFromString(svg, 'image/svg+xml')
  expect(document.querySelector('parsererror')).toBeNull()
  return document
}

describe('a scene as an SVG file', () => {
  const svg = sceneToSvg(scene, { resolve: say, theme: 'light' })
  const document = parsed(svg)

  it('is one valid document with a title and a description', () => {
    expect(document.documentElement.localName).toBe('svg')
    expect(document.querySelector('title')!.textContent).toBe(say(scene.title))
    expect(document.querySelector('desc')!.textContent).toContain('The section does not hold.')
    expect(document.documentElement.getAttribute('viewBox')).toBe('0 0 1100 460')
  })

  it('holds every item of the scene in its order', () => {
    const painted = [...document.querySelectorAll('path, text')]
    expect(painted).toHaveLength(scene.items.length)
    expect(painted.map(({ localName }) => localName)).toEqual(
      scene.items.map(({ kind }) => (kind === 'text' ? 'text' : 'path')),
    )
  })

  it('needs nothing from outside and runs nothing', () => {
    expect(svg.replace('http://www.w3.org/2000/svg', '')).not.toMatch(
      /https?:|script|var\(|href|class=/,
    )
  })

  it('is the same for the same scene', () => {
    const again = draw(tube({ water: { currentSpeed: 1, depth: 0.42 } }))
    expect(sceneToSvg(again, { resolve: say, theme: 'light' })).toBe(svg)
  })

  it('speaks the units of the reader', () => {
    const us = sceneToSvg(scene, { resolve: textResolver(texts.en, 'us'), theme: 'light' })
    expect(us).toContain('1.38\u00a0ft')
    expect(us).not.toContain('kN/m')
  })

  it('is dark on request', () => {
    const dark = sceneToSvg(scene, { resolve: say, theme: 'dark' })
    expect(dark).toContain(THEMES.dark.surface)
    expect(dark).not.toContain(THEMES.light.surface)
  })

  it('brings a font along where it is given one', () => {
    const fontFaces = '@font-face{font-family:X;src:url(data:font/woff2;base64,AA==)}'
    const style = parsed(sceneToSvg(scene, { resolve: say, theme: 'light', fontFaces }))
    expect(style.querySelector('style')!.textContent).toBe(fontFaces)
  })
})

it('escapes whatever a text holds', () => {
  const nasty = `<b>"Low & high"</b> 'quay' ]]> \u0000\u0007`
  const named: Scene = {
    width: 10,
    height: 10,
    title: { key: nasty },
    description: [{ key: nasty }],
    items: [
      {
        kind: 'text',
        id: 'a',
        role: 'label',
        x: 1.005,
        y: 2,
        anchor: 'start',
        size: 12,
        weight: 400,
        message: { key: nasty },
      },
    ],
  }
  const document = parsed(sceneToSvg(named, { resolve: ({ key }) => key, theme: 'light' }))
  const plain = `<b>"Low & high"</b> 'quay' ]]> `
  expect(document.querySelector('text')!.textContent).toBe(plain)
  expect(document.querySelector('title')!.textContent).toBe(plain)
  expect(document.querySelector('b')).toBeNull()
})

describe('looks', () => {
  it('are known for every role', () => {
    expect(Object.keys(SHAPE_PAINTS).sort()).toEqual([...SHAPE_ROLES].sort())
    expect(Object.keys(TEXT_TONES).sort()).toEqual([...TEXT_ROLES].sort())
  })

  it('are the same on the page: its style sheet is what the paints say', () => {
    const css = readFileSync('src/assets/drawing.css', 'utf8')
    expect(css.slice(css.indexOf('\n') + 1)).toBe(paintsCss())
  })

  it.each<ThemeName>(['light', 'dark'])('have the colours of the page: %s', (theme) => {
    const css = readFileSync('src/assets/tokens.css', 'utf8')
    const start = theme === 'light' ? css.indexOf(':root {') : css.indexOf("[data-theme='dark']")
    const block = css.slice(start, css.indexOf('}', start))
    for (const tone of TONES) {
      expect(block, tone).toContain(`--${tone}: ${THEMES[theme][tone]};`)
    }
  })
})
