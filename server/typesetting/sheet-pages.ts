import sharp from 'sharp'

/** Width of the picture of a page [px]: A4 at about 120 dpi, fit to be read on a screen. */
const WIDTH = 1000

const HEAD = /<svg [^>]*viewBox="0 0 ([\d.]+) ([\d.]+)"[^>]*>/
/** A page begins at the depth of the drawing itself; what is deeper belongs to one. */
const PAGE = /\n {4}<g(?: transform="matrix\(1 0 0 1 0 [\d.]+\)")?>[\s\S]*?\n {4}<\/g>/g

/**
 * Pictures of the pages of a document that is drawn under each other, in order.
 *
 * @param drawing What `Typesetter.draw` gives.
 */
export async function pagePictures(drawing: string): Promise<readonly Buffer[]> {
  const head = HEAD.exec(drawing)
  const pages = [...drawing.matchAll(PAGE)].map(([page]) => page)
  if (!head || pages.length === 0) throw new Error('a document without pages was drawn')
  const [width, total] = [Number(head[1]), Number(head[2])]
  const height = total / pages.length
  const glyphs = /<defs[\s\S]*<\/defs>/.exec(drawing)?.[0] ?? ''
  const pictures: Buffer[] = []
  for (const [place, page] of pages.entries()) {
    const svg =
      `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ` +
      `width="${width}" height="${height}" viewBox="0 ${place * height} ${width} ${height}">` +
      `<rect y="${place * height}" width="${width}" height="${height}" fill="#fff"/>` +
      `${page}${glyphs}</svg>`
    pictures.push(await pictureOf(svg, width))
  }
  return pictures
}

function pictureOf(svg: string, width: number): Promise<Buffer> {
  const density = (72 * WIDTH) / (width * (72 / 96)) / (96 / 72)
  return sharp(Buffer.from(svg), { density, limitInputPixels: 40_000_000 })
    .resize({ width: WIDTH })
    .png({ palette: true, compressionLevel: 9 })
    .toBuffer()
}
