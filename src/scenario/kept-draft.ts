import type { RefusedEntry } from '@/quick-check/address'
import type { FieldId } from '@/quick-check/fields'
import type { VersionedState } from './scenario-state'

/** What was not saved yet, with what is refused in its fields as it was typed. */
export interface KeptDraft extends VersionedState {
  readonly refused: Readonly<Partial<Record<FieldId, RefusedEntry>>>
}

const PREFIX = 'toehold:scenario:'

/** Unsaved work of one scenario, kept in this window over a reload or the end of a session. */
export function draftStore(scenarioId: string) {
  const key = PREFIX + scenarioId
  return {
    read: () => readKept(key),
    write: (draft: KeptDraft) => attempt(() => sessionStorage.setItem(key, JSON.stringify(draft))),
    clear: () => attempt(() => sessionStorage.removeItem(key)),
  }
}

function readKept(key: string): KeptDraft | null {
  try {
    const kept: unknown = JSON.parse(sessionStorage.getItem(key) ?? 'null')
    const isDraft = typeof kept === 'object' && kept !== null && 'state' in kept
    return isDraft ? (kept as KeptDraft) : null
  } catch {
    return null
  }
}

/** Storage can be full or barred: the work then lives in the page alone. */
function attempt(change: () => void): void {
  try {
    change()
  } catch {
    return
  }
}
