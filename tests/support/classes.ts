import { request as httpRequest } from 'node:http'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import type { Express } from 'express'
import { onTestFinished } from 'vitest'
import type { ClassScene, ClassState } from '../../shared/schemas/class'

/** A scene that asks for a depth. */
export const ASKED: ClassScene = {
  course: 'short',
  scene: 'floats',
  phase: 'question',
  title: 'No skirt',
  question: 'A tube, no skirt. How deep before it goes?',
  units: 'metric',
  guess: { kind: 'length', min: 0, max: 0.7, step: 0.01, decimals: 2 },
  answer: 0.086,
}

export const SHOWN: ClassScene = { ...ASKED, phase: 'shown' }

/** Number that a phone drew. */
export const phone = (n: number): string => `phone-of-the-tests-${n}`

export const guessOf = (n: number, value: number, changes: object = {}) => ({
  ...{ participant: phone(n), scene: ASKED.scene, value, unit: 'm' },
  ...changes,
})

/** Lets the server listen until the test ends. */
export async function listening(app: Express): Promise<string> {
  const listener = createServer(app)
  await new Promise<void>((resolve) => listener.listen(0, '127.0.0.1', resolve))
  onTestFinished(() => {
    listener.closeAllConnections()
    listener.close()
  })
  return `http://127.0.0.1:${(listener.address() as AddressInfo).port}`
}

/** Follows a class as a browser does; `next` waits for a state that is as wanted. */
export function follow(address: string, cookie = '') {
  const states: ClassState[] = []
  const asked = { accept: 'text/event-stream', ...(cookie ? { cookie } : {}) }
  let headers: Readonly<Record<string, unknown>> = {}
  let isOver = false
  let look: () => void = () => undefined
  const sent = httpRequest(address, { headers: asked }, (answer) => {
    headers = answer.headers
    let rest = ''
    answer.setEncoding('utf8').on('data', (part: string) => {
      const events = (rest + part).split('\n\n')
      rest = events.pop() ?? ''
      for (const event of events) {
        const data = /^event: state\ndata: (.*)$/.exec(event)?.[1]
        if (data !== undefined) states.push(JSON.parse(data) as ClassState)
      }
      look()
    })
    answer.on('end', () => {
      isOver = true
      look()
    })
  })
  sent.on('error', () => look()).end()
  onTestFinished(() => void sent.destroy())

  const until = <T>(found: () => T | undefined): Promise<T> =>
    new Promise((resolve) => {
      look = () => {
        const value = found()
        if (value !== undefined) resolve(value)
      }
      look()
    })
  return {
    headers: () => headers,
    next: (isWanted: (state: ClassState) => boolean) => until(() => states.findLast(isWanted)),
    end: () => until(() => (isOver ? true : undefined)),
    hangUp: () => sent.destroy(),
  }
}
