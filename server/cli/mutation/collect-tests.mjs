import { format } from 'node:util'
import { chai, JestAsymmetricMatchers, JestChaiExpect, JestExtend } from '@vitest/expect'

/** The part of the test framework that pure tests use: what is declared is collected, to be run later. */
chai.use(JestExtend)
chai.use(JestChaiExpect)
chai.use(JestAsymmetricMatchers)

export const expect = Object.assign((value, message) => chai.expect(value, message), chai.expect)

export const collected = []
const titles = []
const finishers = []

export function startFile(file) {
  titles.splice(0, titles.length, file)
}

export function describe(title, body) {
  titles.push(title)
  body()
  titles.pop()
}

export function it(title, body) {
  const name = [...titles, title].join(' › ')
  // Titles may repeat, places may not.
  const id = `${collected.length} ${name}`
  collected.push({ id, name: id, run: () => finished(body) })
}

async function finished(body) {
  try {
    await body()
  } finally {
    for (const finish of finishers.splice(0)) await finish()
  }
}

export function onTestFinished(finish) {
  finishers.push(finish)
}

const eachOf = (declare) => (rows) => (title, body) => {
  for (const row of rows) {
    const values = Array.isArray(row) ? row : [row]
    declare(format(title, ...values), () => body(...values))
  }
}
it.each = eachOf(it)
describe.each = eachOf(describe)
