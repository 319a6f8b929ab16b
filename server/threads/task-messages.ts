/** What a thread can be asked for, by name; each takes one value and gives one. */
export type Tasks = Readonly<Record<string, (input: never) => unknown>>

/** A thing to do, on its way to the thread. */
export interface TaskRequest {
  readonly id: number
  readonly name: string
  readonly input: unknown
}

/** An error between two threads: its class does not travel, its name and fields do. */
export interface SentError {
  readonly name: string
  readonly message: string
  readonly stack: string
  readonly fields: Readonly<Record<string, unknown>>
}

/** What came of it. */
export type TaskAnswer =
  | { readonly id: number; readonly value: unknown }
  | { readonly id: number; readonly error: SentError }
