import { z } from 'zod'
import { momentSchema } from './paging'
import { SHEET_STATUSES } from './sheet-status'
import { VERDICTS } from './section-result'

/** `GET /api/verify/:code`: what a sheet said when it was issued, and whether it is current. */
export const verifiedSheetSchema = z
  .strictObject({
    code: z.string(),
    title: z.string(),
    project: z.string(),
    client: z.string(),
    number: z.string(),
    revision: z.string(),
    status: z.enum(SHEET_STATUSES),
    supersededBy: z.strictObject({ revision: z.string(), issuedAt: momentSchema }).nullable(),
    withdrawnBecause: z.string(),
    verdict: z.enum(VERDICTS),
    answer: z.string(),
    subject: z.string(),
    leave: z.string(),
    conditions: z.array(z.string()),
    issuedAt: momentSchema,
    signatures: z
      .array(
        z.strictObject({
          role: z.enum(['prepared', 'checked', 'approved']),
          organisation: z.string(),
          date: z.string(),
        }),
      )
      .meta({ description: 'Organisations and dates, no names' }),
    digest: z.string(),
    fileSha256: z.string(),
    pages: z.number().int(),
  })
  .meta({ id: 'VerifiedSheet' })
export type VerifiedSheet = z.output<typeof verifiedSheetSchema>

/**
 * - `issued`: the file that we issued, byte for byte
 * - `not-the-file`: merged, printed or saved again; its figures are ours as far as they can be read
 * - `changed`: figures read from it differ from those that we issued
 * - `unknown`: none of ours
 */
export const FILE_ANSWERS = ['issued', 'not-the-file', 'changed', 'unknown'] as const
export type FileAnswer = (typeof FILE_ANSWERS)[number]

/** `POST /api/verify`, as multipart: one PDF file. */
export const verifyUploadSchema = z.strictObject({
  file: z.string().meta({ format: 'binary', description: 'A PDF file' }),
})
export const verifiedFileSchema = z.strictObject({
  answer: z.enum(FILE_ANSWERS),
  /** The sheet that the file is, or says that it is. */
  sheet: verifiedSheetSchema.nullable(),
  /** What differs: where it stands, what we issued, what the file says. */
  differences: z.array(
    z.strictObject({ where: z.string(), issued: z.string(), found: z.string() }),
  ),
})
export type VerifiedFile = z.output<typeof verifiedFileSchema>
