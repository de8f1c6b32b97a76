import pino, { type Logger } from 'pino'
import type { Env } from './env'

export type { Logger }

/** Logs go to standard error: standard output is for what a person or a program asked to see. */
export function createLogger(env: Pick<Env, 'logLevel'>): Logger {
  return pino({ level: env.logLevel, base: undefined }, pino.destination({ dest: 2, sync: true }))
}
