import { isIP } from 'node:net'
import { dirname } from 'node:path'
import { z } from 'zod'
import type { Mode } from '../shared/schemas/health'

/** The environment does not say what the server needs: each line names a variable. */
export class EnvironmentError extends Error {
  override readonly name = 'EnvironmentError'
}

const LOG_LEVELS = ['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent'] as const
const SHORTEST_SECRET = 32

/** Known to everybody, as the passwords of the demonstration are. */
const DEMO_SECRET = 'secret of the demonstration, known to everybody'

/** Stands on mail that never leaves. */
const OUTBOX_SENDER = 'Toehold <toehold@localhost.invalid>'

/** Variables whose value no message repeats. */
const HOLDS_A_PASSWORD = new Set(['SMTP_URL', 'SESSION_SECRET'])

const portRule = 'must be a whole number from 0 to 65535'

const environmentSchema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  PORT: z
    .string()
    .regex(/^\d{1,5}$/, portRule)
    .transform(Number)
    .pipe(z.number().max(65_535, portRule))
    .default(3000),
  HOST: z.string().optional(),
  DATABASE_FILE: z.string().default('data/toehold.sqlite'),
  DATA_DIR: z.string().optional(),
  LOG_LEVEL: z.enum(LOG_LEVELS).optional(),
  APP_URL: z.url({ protocol: /^https?$/, message: 'must be an http or https address' }).optional(),
  SESSION_SECRET: z.string().optional(),
  SMTP_URL: z.url({ protocol: /^smtps?$/, message: 'must be an smtp or smtps address' }).optional(),
  DEMO_SHEETS: z.enum(['yes', 'no']).optional(),
  MAIL_FROM: z
    .string()
    .regex(/^[^\r\n]*[^\s@<]+@[^\s@>]+>?$/, 'must hold an address for mail')
    .optional(),
  TRUSTED_PROXIES: z
    .string()
    .refine(areProxies, 'must be addresses or networks with commas between them')
    .default('loopback'),
})

export interface Env {
  readonly mode: Mode
  readonly port: number
  /** Whether the demonstration begins with its sheets; they take some seconds to make. */
  readonly hasDemoSheets: boolean
  /** Interface to listen on; left out: all. */
  readonly host: string | undefined
  readonly databaseFile: string
  /** Folder of project files; left out: the one of the database. */
  readonly dataFolder: string
  readonly logLevel: (typeof LOG_LEVELS)[number]
  /** Address at which people reach the program. */
  readonly appUrl: string
  /** Hashes sessions, links and attempts; only production insists on one of its own. */
  readonly sessionSecret: string
  /** Server that takes mail; left out: mail stays in the local outbox. */
  readonly smtpUrl: string | undefined
  /** Sender of mail. */
  readonly mailFrom: string
  /** Proxies whose word on where a request comes from counts, as Express takes them. */
  readonly trustedProxies: string
}

/**
 * Reads the environment, once. An empty variable counts as absent, as in a copied `.env.example`.
 *
 * @throws EnvironmentError that names every variable at fault.
 */
export function readEnv(source: Record<string, string | undefined>): Env {
  const given = Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''))
  const parsed = environmentSchema.safeParse(given)
  if (!parsed.success) throw new EnvironmentError(describeIssues(parsed.error, given))

  const variables = parsed.data
  const mode: Mode = variables.NODE_ENV === 'production' ? 'production' : 'demonstration'
  if (mode === 'production') assertProduction(variables)
  if (variables.SMTP_URL && !variables.MAIL_FROM) {
    throw new EnvironmentError('MAIL_FROM: mail over SMTP_URL needs the address of its sender')
  }
  const demoSheets = variables.DEMO_SHEETS ?? (variables.NODE_ENV === 'test' ? 'no' : 'yes')
  return {
    mode,
    hasDemoSheets: mode === 'demonstration' && demoSheets === 'yes',
    port: variables.PORT,
    host: variables.HOST,
    databaseFile: variables.DATABASE_FILE,
    dataFolder: variables.DATA_DIR ?? dirname(variables.DATABASE_FILE),
    logLevel: variables.LOG_LEVEL ?? quietEnough(variables.NODE_ENV),
    appUrl: variables.APP_URL ?? `http://localhost:${variables.PORT}`,
    sessionSecret: variables.SESSION_SECRET ?? DEMO_SECRET,
    smtpUrl: variables.SMTP_URL,
    mailFrom: variables.MAIL_FROM ?? OUTBOX_SENDER,
    trustedProxies: variables.TRUSTED_PROXIES,
  }
}

/** Addresses, networks in the form address/bits, or the names that Express has for usual ones. */
function areProxies(text: string): boolean {
  return text.split(',').every((part) => {
    const [address = '', bits] = part.trim().split('/')
    if (bits === undefined && ['loopback', 'linklocal', 'uniquelocal'].includes(address))
      return true
    const family = isIP(address)
    if (family === 0 || bits === undefined) return family !== 0
    return /^\d{1,3}$/.test(bits) && Number(bits) <= (family === 4 ? 32 : 128)
  })
}

type Variables = z.output<typeof environmentSchema>

function describeIssues(error: z.ZodError, given: Record<string, string | undefined>): string {
  return error.issues
    .map((issue) => {
      const name = String(issue.path[0])
      const rule =
        issue.code === 'invalid_value' ? `must be one of ${issue.values.join(', ')}` : issue.message
      const value = HOLDS_A_PASSWORD.has(name) ? 'what is set' : `"${given[name] ?? ''}"`
      return `${name}: ${value} is not allowed; it ${rule}`
    })
    .join('\n')
}

function assertProduction({ APP_URL, SESSION_SECRET }: Variables): void {
  const missing = []
  if (!APP_URL) {
    missing.push('APP_URL: production needs the address at which people reach the program')
  }
  if ((SESSION_SECRET?.length ?? 0) < SHORTEST_SECRET) {
    missing.push(
      `SESSION_SECRET: production needs a secret of ${SHORTEST_SECRET} characters or more`,
    )
  }
  if (missing.length > 0) throw new EnvironmentError(missing.join('\n'))
}

/** Demonstration logs only what went wrong, so that the address stays in sight. */
function quietEnough(nodeEnv: Variables['NODE_ENV']): Env['logLevel'] {
  return nodeEnv === 'production' ? 'info' : nodeEnv === 'test' ? 'silent' : 'warn'
}
