/** The address exists, the method does not (HTTP 405). */
export class MethodNotAllowedError extends Error {
  override readonly name = 'MethodNotAllowedError'

  constructor(
    method: string,
    readonly allowed: readonly string[],
  ) {
    super(`${method} is not allowed here; use ${allowed.join(' or ')}`)
  }
}

/** The body is not sent as JSON (HTTP 415). */
export class UnsupportedMediaTypeError extends Error {
  override readonly name = 'UnsupportedMediaTypeError'
}

/** What was sent is larger than the address takes (HTTP 413). */
export class TooLargeError extends Error {
  override readonly name = 'TooLargeError'
}
