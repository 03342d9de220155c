import pino from 'pino'
import { config } from './config'

let logger: pino.Logger | undefined

/** JSON on stdout. Never bodies, names from files, e-mails or tokens. */
export function log(): pino.Logger {
  logger ??= pino({ level: config().logLevel })
  return logger
}
