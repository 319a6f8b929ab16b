/** The server refused, or could not be reached. */
export class ApiError extends Error {
  override readonly name = 'ApiError'

  constructor(
    message: string,
    readonly status: number | null,
  ) {
    super(message)
  }
}

/** Asks the server for JSON. Throws ApiError for anything but a good answer. */
export async function getJson(path: string, signal?: AbortSignal): Promise<unknown> {
  const response = await send(path, signal)
  if (!response.ok) throw new ApiError(`${path}: ${response.status}`, response.status)
  return response.json()
}

async function send(path: string, signal?: AbortSignal): Promise<Response> {
  try {
    return await fetch(path, { headers: { accept: 'application/json' }, signal: signal ?? null })
  } catch (cause) {
    throw Object.assign(new ApiError(`${path}: no answer`, null), { cause })
  }
}
