import { hash, hashSync, verify } from '@node-rs/argon2'

/** What guessing one password costs. */
export interface PasswordCost {
  /** Memory [KiB]. */
  readonly memoryCost: number
  /** Passes over the memory. */
  readonly timeCost: number
}

/** OWASP, Password Storage Cheat Sheet, argon2id: 19 MiB, two passes, one lane. */
const OWASP_COST: PasswordCost = { memoryCost: 19_456, timeCost: 2 }

export interface Passwords {
  readonly hash: (password: string) => Promise<string>
  /** For seeds, which run before the server listens. */
  readonly hashNow: (password: string) => string
  /** Always does the work of one comparison; without a hash it is against a decoy, and false. */
  readonly fits: (password: string, stored: string | null) => Promise<boolean>
}

/** Passwords as argon2id hashes (the default of the library); tests bring a cheaper cost. */
export function createPasswords(cost: PasswordCost = OWASP_COST): Passwords {
  const options = { ...cost, parallelism: 1 }
  const decoy = hashSync('nobody signs in with this', options)
  return {
    hash: (password) => hash(typed(password), options),
    hashNow: (password) => hashSync(typed(password), options),
    fits: async (password, stored) => {
      const isEqual = await verify(stored ?? decoy, typed(password))
      return stored !== null && isEqual
    },
  }
}

/** Keyboards write the same letter in different ways; NFKC makes them one. */
function typed(password: string): string {
  return password.normalize('NFKC')
}
