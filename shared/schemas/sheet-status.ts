/** Where a sheet stands on its way. */
export const SHEET_STATUSES = [
  'draft',
  'in-checking',
  'returned',
  'checked',
  'approved',
  'issued-for-information',
  'superseded',
  'withdrawn',
] as const
export type SheetStatus = (typeof SHEET_STATUSES)[number]

/** Statuses that a sheet reached with a frozen document, or after one. */
export const ISSUED_STATUSES = [
  'approved',
  'issued-for-information',
  'superseded',
] as const satisfies readonly SheetStatus[]
