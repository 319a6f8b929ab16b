import type { ResolveText, Message } from '../texts/format-text'
import type { TextWeight } from './scene'

/** Advance widths of U+0020 to U+007E in hundredths of an em, IBM Plex Sans 5.3, weight 400. */
const REGULAR = [
  24, 28, 42, 71, 60, 93, 69, 24, 33, 33, 45, 60, 27, 40, 27, 38, 60, 60, 60, 60, 60, 60, 60, 60,
  60, 60, 29, 29, 60, 60, 60, 48, 89, 64, 65, 62, 67, 58, 56, 69, 71, 40, 51, 63, 50, 81, 71, 71,
  61, 71, 64, 58, 57, 68, 61, 89, 61, 59, 58, 32, 38, 32, 60, 56, 60, 53, 58, 50, 58, 55, 32, 53,
  57, 25, 25, 53, 27, 87, 57, 56, 58, 58, 37, 49, 35, 57, 49, 77, 51, 50, 46, 34, 31, 34, 60,
] as const

/** The same for weight 600. */
const SEMIBOLD = [
  24, 31, 47, 66, 60, 96, 71, 26, 34, 34, 56, 60, 30, 40, 30, 44, 60, 60, 60, 60, 60, 60, 60, 60,
  60, 60, 32, 32, 60, 60, 60, 49, 90, 67, 66, 64, 69, 60, 58, 71, 72, 42, 54, 68, 52, 82, 72, 71,
  64, 71, 66, 61, 58, 69, 64, 95, 65, 63, 60, 33, 44, 33, 60, 56, 60, 56, 60, 51, 60, 56, 35, 54,
  59, 27, 27, 56, 29, 89, 59, 56, 60, 60, 39, 50, 37, 59, 52, 82, 54, 52, 50, 36, 38, 36, 60,
] as const

/** Spaces that do not break, the middle dot, and superscripts; anything else is as wide as a digit. */
const OTHERS: Readonly<Record<string, number>> = { '\u00a0': 24, '\u202f': 12, '·': 34, '²': 35 }
const DIGIT = 60

/** Width of a text in CSS pixels, without asking a browser; kerning is left out. */
export function textWidth(text: string, size: number, weight: TextWeight): number {
  const table: readonly number[] = weight === 600 ? SEMIBOLD : REGULAR
  let hundredths = 0
  for (const character of text) {
    hundredths += table[character.charCodeAt(0) - 32] ?? OTHERS[character] ?? DIGIT
  }
  return (hundredths / 100) * size
}

/** Gives the width that a message will have once it is words. */
export type MeasureText = (message: Message, size: number, weight: TextWeight) => number

/** Measures messages as the given resolver will print them. */
export function measureWith(resolve: ResolveText): MeasureText {
  return (message, size, weight) => textWidth(resolve(message), size, weight)
}
