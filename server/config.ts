import { randomBytes } from 'node:crypto'
import { chmodSync, existsSync, readFileSync, writeFileSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { z } from 'zod'
import { isLoopbackName, withoutBrackets } from '#server/loopback.ts'
import { makeFolder } from '#server/make-folder.ts'
import { projectRoot } from '#server/root.ts'
import { StartError } from '#server/start-error.ts'

/** Fewest characters of a secret in production. */
const secretLength = 32

const portSentence = 'PORT must be a whole number from 0 to 65535.'
const proxySentence = 'TRUST_PROXY must be the number of proxies in front, 0 to 10.'
const modeSentence = 'NODE_ENV must be production, development, test or demo, or not be set.'

/** A whole number from 0 to `greatest`, refused with the sentence `error`. */
const whole = (error: string, greatest: number) =>
  z.coerce.number({ error }).int({ error }).min(0, { error }).max(greatest, { error })

const environmentSchema = z.object({
  // A misspelt "production" must not end in a demo.
  NODE_ENV: z.enum(['production', 'development', 'test', 'demo'], { error: modeSentence }).default('demo'),
  HOST: z.string().trim().transform(withoutBrackets).default('127.0.0.1'),
  PORT: whole(portSentence, 65535).default(4173),
  DATABASE_FILE: z.string().trim().default('data/sinewright.sqlite'),
  SESSION_SECRET: z.string().optional(),
  LOG_LEVEL: z
    .enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'], {
      error: 'LOG_LEVEL must be one of fatal, error, warn, info, debug, trace, silent.',
    })
    .default('info'),
  TRUST_PROXY: whole(proxySentence, 10).default(0),
})

/** Everything that the environment decides, read once at the start of the process. */
export interface Config {
  /** `demo`: loopback only, invented data, demo accounts. */
  mode: 'demo' | 'production'
  host: string
  port: number
  /** Absolute path. */
  databaseFile: string
  sessionSecret: string
  logLevel: z.infer<typeof environmentSchema>['LOG_LEVEL']
  /** Proxies in front whose X-Forwarded-* headers are believed. */
  trustProxy: number
  /** Folder of the built client. */
  clientDirectory: string
  /** bcrypt cost: 2^cost rounds. */
  bcryptCost: number
  /** Requests that one address may make. */
  rates: { failedSignInsPerQuarterHour: number; requestsPerMinute: number }
}

/**
 * Environment → configuration. An empty variable counts as one that is not set.
 * @throws StartError with a sentence for each variable that cannot be used
 */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value?.trim()))
  const parsed = environmentSchema.safeParse(given)
  if (!parsed.success) throw new StartError(parsed.error.issues.map((issue) => issue.message).join(' '))
  const { data } = parsed
  const mode = data.NODE_ENV === 'production' ? 'production' : 'demo'
  if (mode === 'demo' && !isLoopbackName(data.HOST))
    throw new StartError(
      `The demo listens on this machine only: HOST must be 127.0.0.1, ::1 or localhost, not ${data.HOST}. Set NODE_ENV=production for a real installation.`,
    )
  if (mode === 'demo' && data.TRUST_PROXY > 0)
    throw new StartError(
      'The demo takes no proxy in front: leave TRUST_PROXY out. Set NODE_ENV=production for a real installation.',
    )
  const databaseFile = resolve(projectRoot, data.DATABASE_FILE)
  return {
    mode,
    host: data.HOST,
    port: data.PORT,
    databaseFile,
    sessionSecret: mode === 'demo' ? demoSecret(databaseFile) : requireSecret(data.SESSION_SECRET),
    logLevel: data.LOG_LEVEL,
    trustProxy: data.TRUST_PROXY,
    clientDirectory: join(projectRoot, 'dist', 'client'),
    bcryptCost: 12,
    rates: { failedSignInsPerQuarterHour: 50, requestsPerMinute: 2400 },
  }
}

/** @throws StartError when it is missing or too short */
function requireSecret(secret: string | undefined): string {
  if (secret && secret.length >= secretLength) return secret
  throw new StartError(
    `In production SESSION_SECRET must be set to a random text of at least ${secretLength} characters, such as the output of "openssl rand -hex 32".`,
  )
}

/** The demo's own secret: made once and kept beside the database, readable by its owner alone. */
function demoSecret(databaseFile: string): string {
  const file = `${databaseFile}.secret`
  try {
    if (existsSync(file)) {
      chmodSync(file, 0o600)
      const kept = readFileSync(file, 'utf8').trim()
      // Anything else was not made here, or was damaged.
      if (/^[0-9a-f]{64}$/.test(kept)) return kept
    }
    const secret = randomBytes(32).toString('hex')
    makeFolder(dirname(file))
    writeFileSync(file, `${secret}\n`, { mode: 0o600 })
    return secret
  } catch (error) {
    throw new StartError(
      `The folder of the database cannot be written (${file}: ${(error as NodeJS.ErrnoException).code}): choose another DATABASE_FILE.`,
    )
  }
}
