import { readFileSync } from 'node:fs'
import { text as readAll } from 'node:stream/consumers'
import { z } from 'zod'
import { InvalidInputError, OutOfRangeError } from '../../shared/errors'
import { type BatchCommand, runBatch } from '../batch/batch-command'
import { COMMANDS } from '../batch/commands'
import { readJson } from '../batch/read-json'
import { InvalidJsonError } from '../errors'

const BAD_INPUT = 2

/** What the caller did wrong, in one line or in one line per fault. */
class UsageError extends Error {
  override readonly name = 'UsageError'
}

/** The one command whose answer is a file, not JSON. */
const SHEET = 'sheet'
const SHEET_SUMMARY =
  'Write the calculation sheet of one case: calc sheet CASE -o FILE.pdf, .json or .csv'

interface Request {
  readonly command: BatchCommand | undefined
  readonly file: string | undefined
  readonly wantsHelp: boolean
  readonly wantsSchema: boolean
}

function readArguments(words: readonly string[]): Request {
  const options = words.filter((word) => word.startsWith('-') && word !== '-')
  const [name, file, ...rest] = words.filter((word) => !options.includes(word))
  const unknown = options.find((word) => !['--help', '-h', '--schema'].includes(word))
  if (unknown) throw new UsageError(`${unknown} is not an option; it must be --schema or --help`)
  if (rest.length > 0) throw new UsageError(`one FILE at most, not ${rest.length + 1}`)
  return {
    command: name === undefined ? undefined : findCommand(name),
    file,
    wantsHelp: options.includes('--help') || options.includes('-h'),
    wantsSchema: options.includes('--schema'),
  }
}

function findCommand(name: string): BatchCommand {
  const command = COMMANDS.find((candidate) => candidate.name === name)
  if (command) return command
  const known = [...COMMANDS.map((candidate) => candidate.name), SHEET].join(', ')
  throw new UsageError(`"${name}" is not a command; it must be one of: ${known}`)
}

function describeUsage(): string {
  const all = [...COMMANDS, { name: SHEET, summary: SHEET_SUMMARY }]
  const commands = all.map(({ name, summary }) => `  ${name.padEnd(12)}${summary}`)
  return [
    'npm run --silent calc -- COMMAND [FILE]',
    '',
    ...commands,
    '',
    'FILE holds one JSON case or a list of cases in SI units; without FILE, or with -, it is read',
    'from standard input. The answer is JSON of the same form on standard output.',
    '',
    '  --schema    print the JSON Schema of input and output',
    '  --help      print this',
    '',
    'Bad input: exit status 2, nothing on standard output, a line per fault on standard error.',
  ].join('\n')
}

function describeSchema({ inputSchema, outputSchema }: BatchCommand): string {
  const oneOrMany = (schema: z.ZodType) => z.union([schema, z.array(schema)])
  const schemas = {
    input: z.toJSONSchema(oneOrMany(inputSchema), { io: 'input' }),
    output: z.toJSONSchema(oneOrMany(outputSchema), { io: 'output' }),
  }
  return JSON.stringify(schemas, null, 2)
}

async function readText(file: string | undefined): Promise<string> {
  if (file === undefined || file === '-') return readAll(process.stdin)
  try {
    return readFileSync(file, 'utf8')
  } catch (error) {
    const isMissing = error instanceof Error && 'code' in error && error.code === 'ENOENT'
    throw new UsageError(`${file}: ${isMissing ? 'there is no such file' : messageOf(error)}`)
  }
}

async function answer(command: BatchCommand, file: string | undefined): Promise<string> {
  return JSON.stringify(runBatch(command, parseText(await readText(file), file)), null, 2)
}

function parseText(text: string, file: string | undefined): unknown {
  try {
    return readJson(text)
  } catch (error) {
    if (!(error instanceof InvalidJsonError)) throw error
    throw new UsageError(`${file ?? 'standard input'}: not JSON: ${error.message}`)
  }
}

/** `sheet CASE -o FILE`. Loaded only when it is asked for: the other commands need no typesetting. */
async function answerSheet(words: readonly string[]): Promise<string> {
  const at = words.findIndex((word) => word === '-o' || word === '--output')
  const output = at < 0 ? undefined : words[at + 1]
  const [source, ...rest] = words.filter((_, place) => at < 0 || (place !== at && place !== at + 1))
  if (output === undefined || rest.length > 0) throw new UsageError(SHEET_SUMMARY)
  const { SHEET_ENDINGS, writeSheet } = await import('./calc-sheet')
  if (!SHEET_ENDINGS.some((ending) => output.toLowerCase().endsWith(ending))) {
    throw new UsageError(`${output}: the ending must be one of ${SHEET_ENDINGS.join(', ')}`)
  }
  const input = parseText(await readText(source), source)
  return writeSheet(input, { source: source ?? '-', output, software: `Toehold ${readVersion()}` })
}

function readVersion(): string {
  const file = new URL('../../package.json', import.meta.url)
  return (JSON.parse(readFileSync(file, 'utf8')) as { version: string }).version
}

async function run(words: readonly string[]): Promise<string> {
  if (words[0] === SHEET && !words.includes('--help')) return answerSheet(words.slice(1))
  const { command, file, wantsHelp, wantsSchema } = readArguments(words)
  if (wantsHelp) return describeUsage()
  if (!command) throw new UsageError(`a command is missing\n\n${describeUsage()}`)
  return wantsSchema ? describeSchema(command) : answer(command, file)
}

function messageOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error)
}

/** A line per fault, whatever line breaks the input had in it. */
function describeRefusal(error: unknown): string | undefined {
  if (error instanceof UsageError) return error.message
  if (!(error instanceof InvalidInputError || error instanceof OutOfRangeError)) return undefined
  return error.faults.map(({ message }) => message.replace(/\s+/g, ' ')).join('\n')
}

try {
  process.stdout.write(`${await run(process.argv.slice(2))}\n`)
} catch (error) {
  const refusal = describeRefusal(error)
  if (refusal === undefined) throw error
  process.stderr.write(`${refusal}\n`)
  process.exitCode = BAD_INPUT
}
