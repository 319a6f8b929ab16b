// @vitest-environment jsdom
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { sectionFileName, useSceneExport } from '../../../src/composables/useSceneExport'
import type { CaptionParagraph } from '../../../shared/drawing/captioned-scene'
import { draw, say, tube } from '../../shared/drawing/drawn-case'

let files: Blob[]
let links: { name: string; href: string }[]

beforeEach(() => {
  files = []
  links = []
  URL.createObjectURL = (file) => `blob:${files.push(file as Blob)}`
  URL.revokeObjectURL = () => undefined
  vi.spyOn(HTMLAnchorElement.prototype, 'click').mockImplementation(function (
    this: HTMLAnchorElement,
  ) {
    links.push({ name: this.download, href: this.href })
  })
})
afterEach(() => {
  vi.restoreAllMocks()
  vi.unstubAllGlobals()
})

const wanted = { scene: draw(tube()), theme: 'light', resolve: say, name: 'section' } as const

it('names a file by what it shows and at which depth', () => {
  expect(sectionFileName(0.42)).toBe('toehold-section-0.420m')
})

describe('saving a drawing', () => {
  it('gives an SVG file that brings its font along', async () => {
    const { save, state } = useSceneExport()
    await save({ ...wanted, format: 'svg' })
    expect(links).toEqual([{ name: 'section.svg', href: 'blob:1' }])
    expect(files[0]!.type).toBe('image/svg+xml')
    const svg = await textOf(files[0]!)
    expect(svg).toContain('<svg xmlns=')
    expect(svg.match(/@font-face/g)).toHaveLength(2)
    expect(state.value).toBe('idle')
  })

  it('writes the caption into the picture, its title and its description', async () => {
    const line = { text: 'Holds: 0.420 m of water.', role: 'labelHolds', size: 16, weight: 600 }
    await useSceneExport().save({ ...wanted, caption: [line as CaptionParagraph], format: 'svg' })
    const svg = await textOf(files[0]!)
    expect(svg.match(/Holds: 0\.420 m of water\./g)).toHaveLength(3)
  })

  it('gives a picture of two pixels for each of the drawing', async () => {
    const drawImage = vi.fn()
    const picture = new Blob(['picture'], { type: 'image/png' })
    vi.stubGlobal(
      'Image',
      class {
        decode = () => Promise.resolve()
      },
    )
    vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue({
      drawImage,
    } as unknown as null)
    HTMLCanvasElement.prototype.toBlob = (give) => give(picture)
    await useSceneExport().save({ ...wanted, format: 'png' })
    expect(drawImage).toHaveBeenCalledWith(expect.anything(), 0, 0, 2200, 920)
    expect(files).toEqual([expect.any(Blob), picture])
    expect(links[0]!.name).toBe('section.png')
  })

  it('says so when the browser cannot paint it', async () => {
    vi.stubGlobal(
      'Image',
      class {
        decode = () => Promise.reject(new Error('no picture'))
      },
    )
    const { save, state } = useSceneExport()
    await expect(save({ ...wanted, format: 'png' })).rejects.toThrow('no picture')
    expect(state.value).toBe('failed')
    expect(links).toEqual([])
  })
})

/** Blob.text(), which jsdom does not have. */
function textOf(file: Blob): Promise<string> {
  return new Promise((resolve) => {
    const reader = new FileReader()
    reader.onload = () => resolve(String(reader.result))
    reader.readAsText(file)
  })
}
