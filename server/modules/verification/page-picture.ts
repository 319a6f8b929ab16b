import { createCanvas } from '@napi-rs/canvas'
import { openPdf } from './read-pdf'

/** Width of the picture of a page [px]: fit to be read on a screen. */
const WIDTH = 1000

/** Pictures that stay in memory: those of a few sheets, about 0.3 MB each. */
const MOST_KEPT = 60
const pictures = new Map<string, Promise<Buffer>>()

/**
 * A page of a frozen PDF as PNG, drawn from the very file.
 *
 * @param key Names the file; equal names mean equal bytes.
 */
export function pagePicture(
  key: string,
  page: number,
  read: () => Promise<Uint8Array>,
): Promise<Buffer> {
  const name = `${key} ${page}`
  const kept = pictures.get(name)
  if (kept) return kept
  const drawn = read().then((bytes) => draw(bytes, page))
  pictures.set(name, drawn)
  // A picture that could not be drawn is tried again.
  drawn.catch(() => pictures.delete(name))
  const [oldest] = pictures.keys()
  if (pictures.size > MOST_KEPT && oldest !== undefined) pictures.delete(oldest)
  return drawn
}

async function draw(bytes: Uint8Array, number: number): Promise<Buffer> {
  const task = openPdf(bytes)
  try {
    const page = await (await task.promise).getPage(number)
    const { width } = page.getViewport({ scale: 1 })
    const viewport = page.getViewport({ scale: WIDTH / width })
    const canvas = createCanvas(Math.round(viewport.width), Math.round(viewport.height))
    const canvasContext = canvas.getContext('2d')
    // Both libraries describe the same drawing surface, each in types of its own.
    const surface = { canvas: null, canvasContext, viewport } as unknown
    await page.render(surface as Parameters<typeof page.render>[0]).promise
    return canvas.toBuffer('image/png')
  } finally {
    await task.destroy()
  }
}
