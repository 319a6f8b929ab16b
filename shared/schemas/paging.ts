import { z } from 'zod'

/** Rows of one page of a list. */
export const PAGE_SIZE = 50

/** Search, order and page of a list, as they stand in the address. */
export const listQuerySchema = z.object({
  search: z.string().trim().max(100).default(''),
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  archived: z.enum(['no', 'yes']).default('no'),
  order: z.enum(['asc', 'desc']).default('desc'),
})

/** One page of a list. */
export function pageOf<Item extends z.ZodType>(item: Item) {
  return z.strictObject({
    items: z.array(item),
    page: z.number().int(),
    pageSize: z.number().int(),
    total: z.number().int().meta({ description: 'Rows of all pages' }),
  })
}

/** Moment in milliseconds since 1970, UTC. */
export const momentSchema = z.number().int().meta({ unit: 'ms since 1970-01-01T00:00Z' })

/** A name that people read in lists. */
export const nameSchema = z.string().trim().min(1).max(120)
export const noteSchema = z.string().trim().max(2000)

/** Version that a change was made on: an older one is refused with 409. */
export const versionSchema = z.number().int().min(1)
