/** What was asked for does not exist (HTTP 404). */
export class NotFoundError extends Error {
  override readonly name = 'NotFoundError'
}

/** The account may not do this (HTTP 403). */
export class ForbiddenError extends Error {
  override readonly name = 'ForbiddenError'
}

/** It contradicts what is already there (HTTP 409). */
export class ConflictError extends Error {
  override readonly name = 'ConflictError'

  constructor(
    message: string,
    /** What is there now, where the answer shows it beside what was sent. */
    readonly current?: Readonly<Record<string, unknown>>,
  ) {
    super(message)
  }
}

/** Something that the server needs does not answer (HTTP 503). */
export class UnavailableError extends Error {
  override readonly name = 'UnavailableError'
}

/** A text is not JSON at all, so that no field of it can be named (HTTP 400). */
export class InvalidJsonError extends Error {
  override readonly name = 'InvalidJsonError'
}

/** Nobody is signed in, or the session has ended (HTTP 401). */
export class SignInRequiredError extends Error {
  override readonly name = 'SignInRequiredError'
}

/** Too many attempts; the same request may succeed later (HTTP 429). */
export class TooManyRequestsError extends Error {
  override readonly name = 'TooManyRequestsError'

  constructor(
    message: string,
    /** Seconds to wait. */
    readonly retryAfter: number,
  ) {
    super(message)
  }
}
