/** Verdicts from best to worst; `notChecked` counts nowhere. */
export const VERDICTS = ['holds', 'narrow', 'fails', 'notChecked'] as const
export type Verdict = (typeof VERDICTS)[number]

/**
 * Checks in the order that breaks a tie. Apart from the zod contract, so that the page computes a
 * section without loading zod.
 */
export const CHECK_IDS = [
  'sliding',
  'overturning',
  'flotation',
  'skirt',
  'freeboard',
  'fabric',
  'ground',
] as const
export type CheckId = (typeof CHECK_IDS)[number]
