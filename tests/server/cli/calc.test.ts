import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { describe, expect, it, onTestFinished } from 'vitest'
import { z } from 'zod'
import { type Problem, problemSchema } from '../../../shared/schemas/problem'
import flows from '../../golden/flow.json'
import { expectClose } from '../../support/close-to'
import { freshApp } from '../../support/server-app'
import { BAD_INPUTS, holdingCase } from '../../support/server-cases'
import { serverBundle } from '../../support/server-bundle'
import { type Outcome, startNode } from '../../support/server-process'

const program = await serverBundle('server/cli/calc.ts')

function calc(words: readonly string[], input?: string): Promise<Outcome> {
  const options = input === undefined ? {} : { input }
  return startNode([program, ...words], options).ended
}

async function post(text: string): Promise<unknown> {
  const server = request(freshApp().app).post('/api/check/section')
  return (await server.set('Content-Type', 'application/json').send(text)).body
}

function fileWith(text: string): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-calc-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true })
  })
  const file = join(folder, 'case.json')
  writeFileSync(file, text)
  return file
}

const deeper = { ...holdingCase, water: { depth: 0.55 } }

describe('calc section', { timeout: 30_000 }, () => {
  it('gives for a case in a file what the API gives', async () => {
    const text = JSON.stringify(holdingCase)
    const { status, stdout, stderr } = await calc(['section', fileWith(text)])
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' })
    expect(JSON.parse(stdout)).toEqual(await post(text))
  })

  it('gives for a list on standard input what the API gives', async () => {
    const text = JSON.stringify([holdingCase, deeper])
    const { status, stdout } = await calc(['section'], text)
    expect(status).toBe(0)
    expect(JSON.parse(stdout)).toEqual(await post(text))
  })

  it('refuses every bad input in the words of the API, a line per fault', async () => {
    const list = `[${BAD_INPUTS.map(({ text }) => text).join(',')}]`
    const { status, stdout, stderr } = await calc(['section'], list)
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' })
    expect(stderr.trimEnd().split('\n')).toEqual(
      BAD_INPUTS.map(({ message }, index) => `[${index}].${message}`),
    )
    expect(stderr.trimEnd()).toBe(problemSchema.parse(await post(list)).message)
  })

  it('names the field of a single case without a place in a list', async () => {
    const { text, message } = BAD_INPUTS[0]!
    const { status, stderr } = await calc(['section'], text)
    expect({ status, stderr }).toEqual({ status: 2, stderr: `${message}\n` })
  })

  it('says that a text is not JSON, as the API does', async () => {
    const text = '{"depth": 0,42}'
    const { status, stdout, stderr } = await calc(['section'], text)
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' })
    const reason = ((await post(text)) as Problem).message.replace('The body is not JSON: ', '')
    expect(stderr).toBe(`standard input: not JSON: ${reason}\n`)
  })

  it.each([
    [[], /^a command is missing\n/],
    [
      ['seepages'],
      /^"seepages" is not a command; it must be one of: section, seepage, duty, ponding, event\b/,
    ],
    [['section', '/nowhere/case.json'], /^\/nowhere\/case\.json: there is no such file\n$/],
    [['section', '/'], /^\/: EISDIR/],
    [['section', 'a.json', 'b.json'], /^one FILE at most, not 2\n$/],
    [['section', '--units'], /^--units is not an option; it must be --schema or --help\n$/],
  ])('refuses the words %j', async (words, message) => {
    const { status, stdout, stderr } = await calc(words)
    expect({ status, stdout }).toEqual({ status: 2, stdout: '' })
    expect(stderr).toMatch(message)
  })

  it('prints how it is used', async () => {
    const { status, stdout } = await calc(['--help'])
    expect(status).toBe(0)
    expect(stdout).toContain('npm run --silent calc -- COMMAND [FILE]')
    expect(stdout).toMatch(/^ {2}section {2,}Check one cross-section/m)
  })

  it('prints schemas that fit its input and its output', async () => {
    const printed = z
      .strictObject({ input: z.looseObject({}), output: z.looseObject({}) })
      .parse(JSON.parse((await calc(['section', '--schema'])).stdout))
    type JsonSchema = Parameters<typeof z.fromJSONSchema>[0]
    const input = z.fromJSONSchema(printed.input as JsonSchema)
    const output = z.fromJSONSchema(printed.output as JsonSchema)
    for (const value of [holdingCase, [holdingCase, deeper]]) {
      input.parse(value)
      output.parse(await post(JSON.stringify(value)))
    }
    expect(input.safeParse({ ...holdingCase, colour: 'red' }).success).toBe(false)
    expect(output.safeParse({}).success).toBe(false)
    expect(JSON.stringify(printed.input)).toContain('"unit":"kg/m"')
  })
})

describe('calc duty', { timeout: 30_000 }, () => {
  it('answers the worked cases, and refuses a curve that starts above zero flow', async () => {
    const worked = flows.filter(({ case: { command } }) => command === 'duty')
    const { status, stdout } = await calc(['duty'], JSON.stringify(worked.map((flow) => flow.case)))
    expect(status).toBe(0)
    const answers = JSON.parse(stdout) as Record<string, unknown>[]
    for (const [i, { expected }] of worked.entries()) {
      expect(answers[i]!.state).toBe(expected.state)
      expectClose(answers[i]!.flow as number, expected.flow!, 1e-6)
      expectClose(answers[i]!.head as number, expected.head!, 1e-6)
    }
    const curve = [
      [0.001, 16],
      [0.012, 13],
    ]
    const refused = await calc(['duty'], JSON.stringify({ ...worked[0]!.case, pumpCurve: curve }))
    expect(refused).toMatchObject({ status: 2, stdout: '' })
    expect(refused.stderr).toMatch(
      /^pumpCurve\[0\]\[0\]: 0\.001 is not allowed; it must be 0 m³\/s \(/,
    )
  })
})
