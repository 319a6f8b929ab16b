/** A number by a pattern whose run of # stands for the digits: FQ-### and 7 give FQ-007. */
export function nextNumber(pattern: string, number: number): string {
  return pattern.replace(/#+/, (run) => String(number).padStart(run.length, '0'))
}

const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ'

/** The letter after A is B, after Z comes AA. */
export function nextRevision(revision: string): string {
  const last = LETTERS.indexOf(revision.at(-1) ?? '')
  const head = revision.slice(0, -1)
  if (last < 0) return `${revision}A`
  if (last < LETTERS.length - 1) return head + LETTERS[last + 1]
  return `${head === '' ? 'A' : nextRevision(head)}A`
}
