import type { LetterheadRecord } from '@shared/schemas/letterhead'

/** Largest file [byte]; as base64 it stays within what the server takes. */
const LARGEST = 150_000

const TYPES = ['image/png', 'image/jpeg'] as const

type Logo = NonNullable<LetterheadRecord['logo']>

/** A chosen picture as it is sent, or why it cannot be. */
export async function readLogo(
  file: File,
): Promise<{ readonly logo: Logo } | { readonly fault: 'wrongType' | 'tooLarge' }> {
  const mediaType = TYPES.find((type) => type === file.type)
  if (!mediaType) return { fault: 'wrongType' }
  if (file.size > LARGEST) return { fault: 'tooLarge' }
  const bytes = new Uint8Array(await file.arrayBuffer())
  let text = ''
  for (const byte of bytes) text += String.fromCharCode(byte)
  return { logo: { mediaType, base64: btoa(text) } }
}
