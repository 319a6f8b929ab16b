import { encode } from 'uqr'
import { sceneToSvg } from '../../shared/drawing/scene-to-svg'
import type { Block, Drawing, SheetDocument } from '../../shared/sheet/document'
import type { ResolveText } from '../../shared/texts/format-text'

const LOGO = 'letterhead-logo'

/** Bytes of the pictures of a sheet, by the names under which its data speak of them. */
export function sheetPictures({ letterhead, photographs }: SheetDocument): Map<string, Uint8Array> {
  const pictures = new Map<string, Uint8Array>()
  if (letterhead.logo) pictures.set(LOGO, Buffer.from(letterhead.logo.base64, 'base64'))
  photographs.forEach(({ picture }, place) => {
    pictures.set(photographName(place), Buffer.from(picture.base64, 'base64'))
  })
  return pictures
}

function photographName(place: number): string {
  return `photograph-${place + 1}`
}

/** A sheet as the template reads it: scenes as SVG, pictures by name, the code as a QR symbol. */
export function sheetData(sheet: SheetDocument, resolve: ResolveText): unknown {
  const { letterhead, photographs, verification, chapters, section, pressures, factors } = sheet
  const drawn = (drawing: Drawing) => drawnAs(drawing, resolve)
  return {
    ...sheet,
    section: drawn(section),
    pressures: drawn(pressures),
    factors: drawn(factors),
    chapters: chapters.map((chapter) => ({
      ...chapter,
      blocks: chapter.blocks.map((block) => blockAs(block, drawn)),
    })),
    letterhead: { ...letterhead, logo: letterhead.logo ? LOGO : null },
    photographs: photographs.map(({ caption }, place) => ({
      caption,
      file: photographName(place),
    })),
    qr: verification ? qrSvg(`${verification.address}/${verification.code}`) : '',
  }
}

function drawnAs({ scene, caption }: Drawing, resolve: ResolveText) {
  return {
    svg: sceneToSvg(scene, { resolve, theme: 'light' }),
    alt: scene.description.map(resolve).join(' '),
    caption,
  }
}

function blockAs(block: Block, drawn: (drawing: Drawing) => object) {
  return block.kind === 'drawing' ? { ...block, drawing: drawn(block.drawing) } : block
}

/** A QR symbol, one unit a module, with its quiet zone. */
function qrSvg(text: string): string {
  const { data, size } = encode(text, { ecc: 'M', border: 2 })
  const squares = data.flatMap((row, y) =>
    row.flatMap((isDark, x) => (isDark ? [`M${x} ${y}h1v1h-1z`] : [])),
  )
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${size} ${size}">` +
    `<path d="${squares.join('')}" fill="#1b2a33"/></svg>`
  )
}
