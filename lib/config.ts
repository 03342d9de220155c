import path from 'node:path'
import { z } from 'zod'

const port = z.coerce.number().int().min(0).max(65535)
const LOCAL_HOSTS = ['127.0.0.1', 'localhost', '::1']

const Environment = z.object({
  PORT: port.default(3000),
  HOST: z.string().default('127.0.0.1'),
  APP_URL: z.url().optional(),
  TRUST_PROXY: z.stringbool().default(false),
  DATA_DIR: z.string().default('data'),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  MAX_FILE_BYTES: z.coerce
    .number()
    .int()
    .positive()
    .default(64 * 1024 * 1024),
  COMPUTE_SECONDS: z.coerce.number().positive().default(30),
  OPINION_SECONDS: z.coerce.number().positive().default(5),
  COMPUTE_MEMORY_MB: z.coerce.number().positive().default(1536),
  COMPUTE_CHILDREN: z.coerce.number().int().positive().optional(),
  SIGN_IN_ATTEMPTS: z.coerce.number().int().positive().default(10),
  MAX_PAGES: z.coerce.number().int().positive().optional(),
})

/** What the environment says, read once. */
export interface Config {
  port: number
  host: string
  /** setting up from this host needs no one-time code */
  local: boolean
  appUrl: string
  secure: boolean
  trustProxy: boolean
  dataDir: string
  databaseFile: string
  incomingDir: string
  logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug'
  maxFileBytes: number
  computeSeconds: number
  /** time of the second opinions, which keep a child busy after its answer */
  opinionSeconds: number
  computeMemoryMb: number
  computeChildren: number | undefined
  /** wrong passwords in a row before an account or an address has to wait */
  signInAttempts: number
  /** the database's page limit; undefined for none */
  maxPages: number | undefined
}

export function readConfig(environment: Record<string, string | undefined>): Config {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== ''))
  const parsed = Environment.safeParse(given)
  if (!parsed.success) throw new Error(`The environment cannot be used.\n${z.prettifyError(parsed.error)}`)
  const e = parsed.data
  const local = LOCAL_HOSTS.includes(e.HOST)
  const appUrl = (e.APP_URL ?? `http://${local ? 'localhost' : e.HOST}:${e.PORT}`).replace(/\/$/, '')
  const dataDir = path.resolve(/* turbopackIgnore: true */ e.DATA_DIR)
  return {
    port: e.PORT,
    host: e.HOST,
    local,
    appUrl,
    secure: appUrl.startsWith('https:'),
    trustProxy: e.TRUST_PROXY,
    dataDir,
    databaseFile: path.join(dataDir, 'sectionwright.sqlite'),
    incomingDir: path.join(dataDir, 'incoming'),
    logLevel: e.LOG_LEVEL,
    maxFileBytes: e.MAX_FILE_BYTES,
    computeSeconds: e.COMPUTE_SECONDS,
    opinionSeconds: e.OPINION_SECONDS,
    computeMemoryMb: e.COMPUTE_MEMORY_MB,
    computeChildren: e.COMPUTE_CHILDREN,
    signInAttempts: e.SIGN_IN_ATTEMPTS,
    maxPages: e.MAX_PAGES,
  }
}

let read: Config | undefined
export function config(): Config {
  read ??= readConfig(process.env)
  return read
}
