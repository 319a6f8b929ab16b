import { shallowReadonly, shallowRef } from 'vue'

/** A guess of this phone. */
export interface KeptGuess {
  readonly value: number
  /** False until the server has it. */
  readonly isSent: boolean
}

interface Kept {
  readonly participant: string
  readonly guesses: Readonly<Record<string, KeptGuess>>
}

/** Number of this phone, of random digits alone; pages without https have no `randomUUID`. */
function newParticipant(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16))
  return [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('')
}

function read(key: string): Kept {
  try {
    const kept: unknown = JSON.parse(sessionStorage.getItem(key) ?? 'null')
    if (typeof kept === 'object' && kept !== null && 'guesses' in kept) return kept as Kept
  } catch {
    // Nothing that can be read is there: the phone begins anew.
  }
  return { participant: newParticipant(), guesses: {} }
}

/** What this phone is in a class, and its guesses; nothing else is kept, and only until it is closed. */
export function keptGuesses(code: string) {
  const key = `toehold:class:${code}`
  const kept = shallowRef(read(key))

  function put(scene: string, guess: KeptGuess | null): void {
    const { [scene]: _, ...others } = kept.value.guesses
    const guesses = guess ? { ...others, [scene]: guess } : others
    kept.value = { ...kept.value, guesses }
    keep()
  }

  function keep(): void {
    try {
      sessionStorage.setItem(key, JSON.stringify(kept.value))
    } catch {
      // A browser that keeps nothing still goes on until its page is closed.
    }
  }

  keep()
  return { kept: shallowReadonly(kept), put }
}
