import type { ClassGuess, ClassItem, ClassScene, ClassState } from '@shared/schemas/class'
import { getJson, sendJson } from './request'

const PATH = '/api/classes'
const one = (code: string) => `${PATH}/${encodeURIComponent(code)}`

export async function fetchOpenClasses(): Promise<readonly ClassItem[]> {
  return ((await getJson(PATH)) as { classes: ClassItem[] }).classes
}

export async function openClass(): Promise<ClassItem> {
  return (await sendJson('POST', PATH)) as ClassItem
}

export async function closeClass(code: string): Promise<ClassState> {
  return (await sendJson('POST', `${one(code)}/closing`)) as ClassState
}

export async function tellScene(code: string, scene: ClassScene): Promise<ClassState> {
  return (await sendJson('PUT', `${one(code)}/scene`, scene)) as ClassState
}

export async function fetchClass(code: string): Promise<ClassState> {
  return (await getJson(one(code))) as ClassState
}

export async function sendGuess(code: string, guess: ClassGuess): Promise<ClassState> {
  return (await sendJson('PUT', `${one(code)}/guess`, guess)) as ClassState
}

/** What a follower of a class hears. */
export interface ClassEars {
  readonly state: (state: ClassState) => void
  /** False while the line is down; the browser tries again by itself. */
  readonly line: (isUp: boolean) => void
}

/** Silence longer than two signs of life means that the line is dead [ms]. */
const SILENCE = 40_000
/** Until a line that the server refused is tried again [ms]. */
const AGAIN = 3000

/** Follows a class until it is told to stop; a line that breaks is made anew. */
export function followClass(code: string, participant: string | null, ears: ClassEars): () => void {
  const query = participant === null ? '' : `?participant=${encodeURIComponent(participant)}`
  let source: EventSource | null = null
  let timer = 0

  function open(): void {
    close()
    const own = new EventSource(`${one(code)}/events${query}`)
    source = own
    own.addEventListener('state', ({ data }: MessageEvent<string>) => {
      ears.line(true)
      ears.state(JSON.parse(data) as ClassState)
      wait(SILENCE)
    })
    own.addEventListener('beat', () => {
      ears.line(true)
      wait(SILENCE)
    })
    own.addEventListener('error', () => {
      ears.line(false)
      // A line that the server refused is closed for good; one that broke is made anew by the browser.
      wait(own.readyState === EventSource.CLOSED ? AGAIN : SILENCE)
    })
    wait(SILENCE)
  }

  function wait(time: number): void {
    window.clearTimeout(timer)
    timer = window.setTimeout(open, time)
  }

  function close(): void {
    window.clearTimeout(timer)
    source?.close()
    source = null
  }

  function offline(): void {
    ears.line(false)
    close()
  }

  window.addEventListener('online', open)
  window.addEventListener('offline', offline)
  open()
  return () => {
    window.removeEventListener('online', open)
    window.removeEventListener('offline', offline)
    close()
  }
}
