import { existsSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { BackupError } from '../backup/backup-error'
import { EnvironmentError, readEnv } from '../env'

const inProject = (path: string) => fileURLToPath(new URL(`../../${path}`, import.meta.url))

/** Where database and files are, from the environment that the server reads. */
export interface Places {
  readonly databaseFile: string
  readonly dataFolder: string
  readonly programVersion: string
}

/** @throws BackupError that names the variable at fault. */
export function readPlaces(): Places {
  const file = inProject('.env')
  if (existsSync(file)) process.loadEnvFile(file)
  try {
    const { databaseFile, dataFolder } = readEnv(process.env)
    return { databaseFile, dataFolder, programVersion: readVersion() }
  } catch (error) {
    if (error instanceof EnvironmentError) throw new BackupError(error.message)
    throw error
  }
}

function readVersion(): string {
  const text = readFileSync(inProject('package.json'), 'utf8')
  return (JSON.parse(text) as { version: string }).version
}

/** Runs a command to its end: a refusal is its reason on standard error and exit status 1. */
export async function runCommand(run: () => Promise<string>): Promise<void> {
  try {
    process.stdout.write(`${await run()}\n`)
  } catch (error) {
    if (!(error instanceof BackupError)) throw error
    process.stderr.write(`${error.message}\n`)
    process.exitCode = 1
  }
}
