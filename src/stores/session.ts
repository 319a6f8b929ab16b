import { defineStore } from 'pinia'
import { shallowReadonly, shallowRef } from 'vue'
import type { Account } from '@shared/schemas/account'
import { whenSessionEnds } from '@/api/request'
import { fetchSession, signIn, signOut, type SignIn } from '@/api/session'
import { usePreferences } from './preferences'

/** Who is signed in. Header and pages share it. */
export const useSession = defineStore('session', () => {
  const preferences = usePreferences()
  /** Undefined until the server has answered. */
  const account = shallowRef<Account | null>()

  let changes = 0

  /** Takes over an account; its choice of units applies from now on. */
  function set(next: Account | null): void {
    changes += 1
    account.value = next
    if (next) preferences.units = next.unitSystem
  }

  /** An answer that was asked for before somebody signed in or out comes too late. */
  async function ask(): Promise<void> {
    const before = changes
    const answer = await fetchSession()
    if (changes === before) set(answer)
  }

  let asked: Promise<void> | null = null
  /** Asks the server once, however many ask at the same time. */
  async function reload(): Promise<Account | null> {
    asked ??= ask().finally(() => (asked = null))
    await asked
    return account.value ?? null
  }

  /** Whoever is signed in, as far as it is known. */
  async function load(): Promise<Account | null> {
    return account.value === undefined ? reload() : account.value
  }

  async function enter(input: SignIn): Promise<Account> {
    const entered = await signIn(input)
    set(entered)
    return entered
  }

  async function leave(): Promise<void> {
    await signOut()
    set(null)
  }

  return {
    account: shallowReadonly(account),
    set,
    load,
    reload,
    enter,
    leave,
    ...useSignInAgain(),
  }
})

/**
 * A session that has ended in the middle of work: a dialog opens over the page, and every request
 * that was refused waits for its answer, so that nothing typed is lost.
 */
function useSignInAgain() {
  const isAskedAgain = shallowRef(false)
  let waiting: { answer: Promise<boolean>; give: (isBack: boolean) => void } | null = null

  function askAgain(): Promise<boolean> {
    if (!waiting) {
      let give: (isBack: boolean) => void = () => undefined
      const answer = new Promise<boolean>((resolve) => (give = resolve))
      waiting = { answer, give }
      isAskedAgain.value = true
    }
    return waiting.answer
  }

  function answerAgain(isBack: boolean): void {
    waiting?.give(isBack)
    waiting = null
    isAskedAgain.value = false
  }

  whenSessionEnds(askAgain)
  return { isAskedAgain: shallowReadonly(isAskedAgain), answerAgain }
}
