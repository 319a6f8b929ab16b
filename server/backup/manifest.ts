import { createHash } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { stat } from 'node:fs/promises'
import { join } from 'node:path'
import { pipeline } from 'node:stream/promises'
import { z } from 'zod'

export const MANIFEST = 'manifest.json'
export const DATABASE = 'toehold.sqlite'

/** What an archive may hold besides its manifest; anything else is not ours. */
export const ENTRY_PATH =
  /^(?:toehold\.sqlite|files\/[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}(?:\.preview)?)$/

const entrySchema = z.strictObject({
  path: z.string().regex(ENTRY_PATH),
  size: z.number().int().min(0),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
})
export type ManifestEntry = z.output<typeof entrySchema>

/** What an archive holds, so that whoever restores it can tell whether all of it is there, unharmed. */
export const manifestSchema = z.strictObject({
  format: z.literal('toehold-backup'),
  formatVersion: z.literal(1),
  programVersion: z.string(),
  createdAt: z.iso.datetime(),
  /** Number of migrations that the database has been through. */
  schemaVersion: z.number().int().min(1),
  entries: z.array(entrySchema).min(1),
})
export type Manifest = z.output<typeof manifestSchema>

/** Size and checksum of a file below a folder. */
export async function describeEntry(folder: string, path: string): Promise<ManifestEntry> {
  const file = join(folder, path)
  const { size } = await stat(file)
  return { path, size, sha256: await checksumOf(file) }
}

export async function checksumOf(file: string): Promise<string> {
  const hash = createHash('sha256')
  await pipeline(createReadStream(file), hash)
  return hash.digest('hex')
}
