import type { Sheet } from '../schemas/sheet'
import { canonicalJson } from './canonical-json'

/**
 * The text over which the digest of a sheet is taken: its canonical JSON without the part that names
 * code and digest. Whoever has the attached JSON can take it again.
 */
export function digestText({ verification: _, ...content }: Sheet): string {
  return canonicalJson(content)
}
