import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { captionedScene, wrapped } from '../../../shared/drawing/captioned-scene'
import { sceneToSvg } from '../../../shared/drawing/scene-to-svg'
import { textWidth } from '../../../shared/drawing/text-width'
import { allWords, boxOf, draw, say, textsOf, tube } from './drawn-case'

const paragraph = (text: string) => ({ text, role: 'label', size: 13, weight: 400 }) as const
const LONG = `Holds only if ${'the skirt lies flat and '.repeat(40)}stays. ${'x'.repeat(900)}`

describe('a caption under a drawing', () => {
  const scene = draw(tube())
  const captioned = captionedScene(scene, [paragraph('Holds: 0.420 m of water.'), paragraph(LONG)])

  it('stays inside the picture, below the drawing', () => {
    const lines = textsOf(captioned).filter(({ id }) => id.startsWith('caption'))
    expect(lines.length).toBeGreaterThan(10)
    for (const box of lines.map(boxOf)) {
      expect(box.left).toBeGreaterThanOrEqual(0)
      expect(box.right).toBeLessThanOrEqual(captioned.width)
      expect(box.top).toBeGreaterThanOrEqual(scene.height)
      expect(box.bottom).toBeLessThanOrEqual(captioned.height)
    }
  })

  it('loses no word, and says it to those who do not see the picture', () => {
    const lines = textsOf(captioned).filter(({ id }) => id.startsWith('caption-1'))
    const together = lines.map(({ message }) => say(message)).join('')
    expect(together.replace(/ /g, '')).toBe(LONG.replace(/ /g, ''))
    const svg = sceneToSvg(captioned, { resolve: say, theme: 'light' })
    expect(svg).toContain('<title id="title">Holds: 0.420 m of water.</title>')
    expect(/<desc id="desc">(.*)<\/desc>/.exec(svg)![1]).toContain('Holds only if the skirt')
    expect(allWords(captioned)).toContain(say(scene.title))
  })

  it('leaves a drawing without one as it is', () => {
    expect(captionedScene(scene, []).items).toEqual(scene.items)
  })
})

it('wraps any text into lines that fit and keep every letter', () => {
  const widthOf = (part: string) => textWidth(part, 13, 400)
  fc.assert(
    fc.property(fc.string({ maxLength: 300 }), fc.integer({ min: 30, max: 400 }), (text, room) => {
      const lines = wrapped(text, room, widthOf)
      expect(lines.join('').replace(/ /g, '')).toBe(text.replace(/ /g, ''))
      for (const line of lines) expect(widthOf(line)).toBeLessThanOrEqual(room)
    }),
  )
})
