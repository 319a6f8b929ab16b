import type { Problem, ProblemCode } from '@shared/schemas/problem'

/** The server refused, or could not be reached. */
export class ApiError extends Error {
  override readonly name = 'ApiError'

  constructor(
    message: string,
    /** Status of the answer; null where there was none. */
    readonly status: number | null,
    /** What the server said, where it answered in its own shape. */
    readonly problem: Problem | null = null,
    /** Seconds to wait before the same request may succeed; null where nothing was said. */
    readonly retryAfter: number | null = null,
  ) {
    super(problem?.message ?? message)
  }

  get code(): ProblemCode | null {
    return this.problem?.code ?? null
  }

  /** Refused fields; empty where the whole request was refused. */
  get fields(): Problem['fields'] {
    return this.problem?.fields ?? []
  }

  /** True where nothing answered: no network, or no server. */
  get isOffline(): boolean {
    return this.status === null
  }
}

export type Method = 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** Asks the server for JSON. Throws ApiError for anything but a good answer. */
export async function getJson(path: string, signal?: AbortSignal): Promise<unknown> {
  return answerOf(await ask(path, { signal: signal ?? null }))
}

/** Sends JSON and gives what is answered; undefined where the answer has no body. */
export async function sendJson(method: Method, path: string, body?: unknown): Promise<unknown> {
  if (body === undefined) return answerOf(await ask(path, { method }))
  const headers = { 'content-type': 'application/json' }
  return answerOf(await ask(path, { method, headers, body: JSON.stringify(body) }))
}

/** Sends a form with files. */
export async function sendForm(method: Method, path: string, form: FormData): Promise<unknown> {
  return answerOf(await ask(path, { method, body: form }))
}

/** Lets a person sign in again; true once they have. */
export type SignInAgain = () => Promise<boolean>

/** Set once, when the app starts: there is one page and one person in front of it. */
let signInAgain: SignInAgain = () => Promise.resolve(false)

/** Says how a person signs in again when a session has ended; the request is then repeated. */
export function whenSessionEnds(ask: SignInAgain): void {
  signInAgain = ask
}

/** Signing in and out is how a session begins and ends: neither waits for one. */
export const SESSION_PATH = '/api/session'

/** Sends a request; once more after the person has signed in again. */
function ask(path: string, init: RequestInit): Promise<Response> {
  const once = () => send(path, init)
  return path === SESSION_PATH ? once() : withSession(once)
}

/** Does what needs a session; once more where it had ended and the person has signed in again. */
export async function withSession<Answer>(attempt: () => Promise<Answer>): Promise<Answer> {
  try {
    return await attempt()
  } catch (error) {
    const isSessionOver = error instanceof ApiError && error.code === 'sign-in-required'
    if (!isSessionOver || !(await signInAgain())) throw error
    return attempt()
  }
}

async function send(path: string, init: RequestInit): Promise<Response> {
  const response = await reach(path, init)
  if (response.ok) return response
  throw errorOf(path, {
    status: response.status,
    text: await response.text(),
    retryAfter: response.headers.get('retry-after'),
  })
}

async function reach(path: string, init: RequestInit): Promise<Response> {
  const headers = { accept: 'application/json', ...init.headers }
  try {
    return await fetch(path, { credentials: 'same-origin', ...init, headers })
  } catch (cause) {
    throw Object.assign(new ApiError(`${path}: no answer`, null), { cause })
  }
}

async function answerOf(response: Response): Promise<unknown> {
  const text = await response.text()
  return text === '' ? undefined : JSON.parse(text)
}

/** An answer that is not the one that was asked for, however it arrived. */
interface Refusal {
  readonly status: number
  readonly text: string
  readonly retryAfter: string | null
}

/** The error of an answer. `subject` names what was asked for, where the server says nothing. */
export function errorOf(subject: string, { status, text, retryAfter }: Refusal): ApiError {
  const wait = Number(retryAfter ?? NaN)
  const seconds = Number.isFinite(wait) ? wait : null
  return new ApiError(`${subject}: ${status}`, status, problemOf(text), seconds)
}

/** A proxy between browser and server may answer in a shape of its own. */
function problemOf(text: string): Problem | null {
  try {
    const body: unknown = JSON.parse(text)
    return typeof body === 'object' && body !== null && 'code' in body ? (body as Problem) : null
  } catch {
    return null
  }
}
