import type { Message } from '../texts/format-text'
import type { Scene, TextItem, TextRole, TextWeight } from './scene'
import { textWidth } from './text-width'

/** One paragraph under a drawing, in words. */
export interface CaptionParagraph {
  readonly text: string
  readonly role: TextRole
  readonly size: number
  readonly weight: TextWeight
}

/** Room around the caption, between its paragraphs, and the height of a line in sizes. */
const MARGIN = 20
const GAP = 5
const LEADING = 1.4

/**
 * The drawing with a caption under it, so that a picture that leaves its page still says what it shows.
 * Words wrap within the width of the drawing; a word that is wider than that is broken. The first
 * paragraph becomes the title, and all of them follow the description.
 */
export function captionedScene(scene: Scene, paragraphs: readonly CaptionParagraph[]): Scene {
  const room = scene.width - 2 * MARGIN
  const items: TextItem[] = []
  let y = scene.height
  paragraphs.forEach(({ text, role, size, weight }, paragraph) => {
    y += GAP
    for (const line of wrapped(text, room, (part) => textWidth(part, size, weight))) {
      y += size * LEADING
      const id = `caption-${paragraph}-${items.length}`
      const place = { x: MARGIN, y, anchor: 'start' } as const
      items.push({ kind: 'text', id, role, size, weight, message: verbatim(line), ...place })
    }
  })
  const [first] = paragraphs
  return {
    width: scene.width,
    height: Math.ceil(y + MARGIN),
    title: first ? verbatim(first.text) : scene.title,
    description: [
      scene.title,
      ...scene.description,
      ...paragraphs.map(({ text }) => verbatim(text)),
    ],
    items: [...scene.items, ...items],
  }
}

/** A text that is in words already. */
function verbatim(text: string): Message {
  return { key: 'drawing.verbatim', values: { text } }
}

/** Lines that are no wider than the room, broken between words, or within one that is too long. */
export function wrapped(
  text: string,
  room: number,
  widthOf: (part: string) => number,
): readonly string[] {
  const lines: string[] = []
  let line = ''
  for (const word of text.split(' ').flatMap((whole) => pieces(whole, room, widthOf))) {
    const longer = line === '' ? word : `${line} ${word}`
    if (line !== '' && widthOf(longer) > room) {
      lines.push(line)
      line = word
    } else line = longer
  }
  return line === '' ? lines : [...lines, line]
}

/** A word in pieces that fit; most are one. */
function pieces(word: string, room: number, widthOf: (part: string) => number): readonly string[] {
  if (widthOf(word) <= room) return [word]
  const parts: string[] = []
  let part = ''
  for (const character of word) {
    if (part !== '' && widthOf(part + character) > room) {
      parts.push(part)
      part = character
    } else part += character
  }
  return [...parts, part]
}
