import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { problemSchema } from '../../shared/schemas/problem'
import { type Drawn, arbitraryRequest } from '../support/arbitrary-request'
import { send, type WholeServer, wholeServer } from '../support/whole-server'

const REQUESTS = 5000
/** Requests that follow each other on one state, before it is taken back. */
const IN_A_ROW = 5

const STACK = /\n\s+at |node_modules|\.[cm]?[jt]s:\d+|SQLITE_|ZodError/

interface Tally {
  sent: number
  signedInAndShaped: number
  readonly succeeded: Set<string>
}

/** What is wrong with an answer; null where nothing is. */
function faultIn({ status }: Response, text: string, { operation }: Drawn): string | null {
  if (status >= 500) return `${status}: ${text}`
  if (operation.mediaType === undefined && STACK.test(text)) return `inner parts show: ${text}`
  if (status >= 400) {
    const isProblem = problemSchema.loose().safeParse(JSON.parse(text)).success
    return isProblem ? null : `no problem: ${text}`
  }
  if (!operation.response) return null
  const parsed = operation.response.safeParse(JSON.parse(text))
  return parsed.success ? null : `not as described: ${parsed.error.message}\n${text}`
}

async function tryOut({ address }: WholeServer, drawn: Drawn, tally: Tally): Promise<void> {
  const answer = await send(address, drawn.sent)
  const text = await answer.text()
  const fault = faultIn(answer, text, drawn)
  const { method, path, body } = drawn.sent
  const what = `${method} ${path} by ${drawn.visitor.what}: ${typeof body === 'string' ? body : ''}`
  if (fault !== null) throw new Error(`${what}\n${fault}`)
  tally.sent++
  const isSignedIn = drawn.visitor.role !== null && answer.status !== 401
  if (isSignedIn && drawn.isShaped) tally.signedInAndShaped++
  if (answer.ok) tally.succeeded.add(drawn.operation.id)
}

/** The requests in short, instead of the schemas that they were made from. */
function reporter({ failed, seed, counterexample, errorInstance }: fc.RunDetails<[Drawn[]]>): void {
  if (!failed) return
  const rows = (counterexample?.[0] ?? []).map(({ visitor, sent }) =>
    [visitor.what, sent.method, sent.path, typeof sent.body === 'string' ? sent.body : ''].join(
      ' ',
    ),
  )
  const cause = errorInstance instanceof Error ? errorInstance.message : String(errorInstance)
  throw new Error(`FC_SEED=${seed}\n${rows.join('\n')}\n\n${cause}`)
}

describe('5 000 generated requests over every route', { timeout: 300_000 }, () => {
  it('are all answered as described, and none by a failure of the server', async () => {
    const server = await wholeServer()
    const tally: Tally = { sent: 0, signedInAndShaped: 0, succeeded: new Set() }
    const rows = fc.array(arbitraryRequest(server), { minLength: IN_A_ROW, maxLength: IN_A_ROW })
    await fc.assert(
      fc.asyncProperty(rows, (row) =>
        server.undone(async () => {
          for (const drawn of row) await tryOut(server, drawn, tally)
        }),
      ),
      { numRuns: REQUESTS / IN_A_ROW, reporter },
    )
    expect(tally.sent).toBe(REQUESTS)
    expect(tally.signedInAndShaped).toBeGreaterThanOrEqual(REQUESTS / 2)
    // Hardly a route was only ever refused: the requests reach what lies behind shape and access.
    const refused = server.operations.filter(({ id }) => !tally.succeeded.has(id))
    expect(refused.length / server.operations.length).toBeLessThan(0.15)
  })
})
