import type { Sheet } from '../schemas/sheet'

/** A figure or word that is not the same in two sheets; null: not there. */
export interface Difference {
  /** Path in the sheet: `case.water.depth`, `result.holdsTo.depth`. */
  readonly path: string
  readonly before: string | number | boolean | null
  readonly after: string | number | boolean | null
}

type Leaf = Difference['before']

/** Parts that differ between any two sheets, or that others compare with more sense. */
const LEFT_OUT = ['verification', 'photographs', 'letterhead', 'people', 'date', 'status']

/** Relative difference of two figures that counts as none: other machines, same engine. */
const SAME_FIGURE = 1e-9

/** What differs between two sheets, inputs first, then results, then words; in order of the sheet. */
export function sheetChanges(before: Sheet, after: Sheet): readonly Difference[] {
  const [old, now] = [leavesOf(before), leavesOf(after)]
  const paths = [...new Set([...now.keys(), ...old.keys()])]
  return paths.flatMap((path) => {
    const [a, b] = [old.get(path) ?? null, now.get(path) ?? null]
    return isSame(a, b) ? [] : [{ path, before: a, after: b }]
  })
}

/** What this version of the program computes differently from what a sheet holds. */
export function resultDifferences(
  stored: Sheet['result'],
  now: Sheet['result'],
): readonly Difference[] {
  const [old, fresh] = [new Map<string, Leaf>(), new Map<string, Leaf>()]
  gather(stored, 'result', old)
  gather(now, 'result', fresh)
  return [...new Set([...old.keys(), ...fresh.keys()])].flatMap((path) => {
    const [a, b] = [old.get(path) ?? null, fresh.get(path) ?? null]
    return isSame(a, b) ? [] : [{ path, before: a, after: b }]
  })
}

function leavesOf(sheet: Sheet): Map<string, Leaf> {
  const { case: section, result, ...words } = sheet
  const leaves = new Map<string, Leaf>()
  gather(section, 'case', leaves)
  gather(result, 'result', leaves)
  for (const [name, value] of Object.entries(words)) {
    if (!LEFT_OUT.includes(name)) gather(value, name, leaves)
  }
  return leaves
}

function gather(value: unknown, path: string, leaves: Map<string, Leaf>): void {
  if (typeof value === 'object' && value !== null) {
    for (const [name, inner] of Object.entries(value)) gather(inner, `${path}.${name}`, leaves)
    return
  }
  if (value !== undefined) leaves.set(path, value as Leaf)
}

function isSame(a: Leaf, b: Leaf): boolean {
  if (typeof a !== 'number' || typeof b !== 'number') return a === b
  return Math.abs(a - b) <= SAME_FIGURE * Math.max(Math.abs(a), Math.abs(b))
}
