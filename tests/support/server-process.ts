import { type ChildProcess, spawn } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { onTestFinished } from 'vitest'

const ROOT = fileURLToPath(new URL('../..', import.meta.url))

export interface Outcome {
  readonly status: number | null
  readonly stdout: string
  readonly stderr: string
}

export interface RunOptions {
  readonly input?: string
  readonly environment?: Record<string, string>
}

export interface Running {
  readonly child: ChildProcess
  /** Resolves when the program has ended. */
  readonly ended: Promise<Outcome>
  /** Resolves with the first line that it prints. */
  readonly firstLine: Promise<string>
  /** Resolves with the first group of the pattern once that is printed. */
  readonly printed: (pattern: RegExp) => Promise<string>
}

/** What the program needs from its surroundings, without what the test runner adds. */
const SURROUNDINGS = {
  PATH: process.env.PATH ?? '',
  HOME: process.env.HOME ?? '',
  DEMO_SHEETS: 'no',
}

/** Starts Node in the project; the process ends with the test at the latest. */
export function startNode(
  words: readonly string[],
  { input, environment = {} }: RunOptions = {},
): Running {
  const child = spawn(process.execPath, words, {
    cwd: ROOT,
    env: { ...SURROUNDINGS, ...environment },
  })
  onTestFinished(() => void child.kill('SIGKILL'))
  child.stdin.end(input ?? '')
  let stdout = ''
  let stderr = ''
  child.stderr.on('data', (chunk: Buffer) => (stderr += chunk.toString()))
  const firstLine = new Promise<string>((resolve) => {
    child.stdout.on('data', (chunk: Buffer) => {
      stdout += chunk.toString()
      if (stdout.includes('\n')) resolve(stdout.slice(0, stdout.indexOf('\n')))
    })
  })
  const ended = new Promise<Outcome>((resolve) => {
    child.on('close', (status) => {
      resolve({ status, stdout, stderr })
    })
  })
  const printed = (pattern: RegExp) =>
    new Promise<string>((resolve) => {
      const look = () => {
        const found = pattern.exec(stdout)?.[1]
        if (found !== undefined) resolve(found)
      }
      child.stdout.on('data', look)
      look()
    })
  return { child, ended, firstLine, printed }
}
