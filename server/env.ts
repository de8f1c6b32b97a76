import { availableParallelism } from 'node:os'
import { join, resolve } from 'node:path'
import { z } from 'zod'
import { StartRefusal } from './start-refusal'

const onOff = (fallback: 'on' | 'off') =>
  z
    .enum(['on', 'off'], 'must be on or off')
    .default(fallback)
    .transform((value) => value === 'on')

const wholeNumber = (least: number, most: number) => {
  const says = `must be a whole number from ${least} to ${most}`
  return z
    .string()
    .regex(/^\d+$/, says)
    .transform(Number)
    .refine((value) => value >= least && value <= most, says)
}

const variables = z
  .object({
    NODE_ENV: z
      .enum(['production', 'development', 'test'], 'must be production, development or test')
      .default('production'),
    PORT: wholeNumber(0, 65_535).default(3000),
    /** Where to listen; every address of the machine when not given. */
    HOST: z.string().min(1, 'must name an address of this machine').optional(),
    /** Folder of the database and the photographs. */
    LAPWING_DATA: z.string().min(1, 'must name a folder').default('uploads'),
    /** Who speaks TLS: nobody, this program, or a proxy before it. */
    LAPWING_TLS: z.enum(['off', 'direct', 'proxy'], 'must be off, direct or proxy').default('off'),
    LAPWING_TLS_CERT: z.string().min(1, 'must name a certificate file').optional(),
    LAPWING_TLS_KEY: z.string().min(1, 'must name a key file').optional(),
    /** Whether a new database gets the demo shop. */
    LAPWING_DEMO: onOff('on'),
    LAPWING_LOG: z
      .enum(['silent', 'error', 'warn', 'info', 'debug'], 'must be silent, error, warn, info or debug')
      .default('info'),
    /** Threads that compute figures and previews. */
    LAPWING_THREADS: wholeNumber(1, 64).default(Math.max(1, Math.min(4, availableParallelism() - 1))),
  })
  .superRefine((value, issues) => {
    if (value.LAPWING_TLS !== 'direct') return
    for (const name of ['LAPWING_TLS_CERT', 'LAPWING_TLS_KEY'] as const) {
      if (!value[name]) {
        issues.addIssue({
          code: 'custom',
          path: [name],
          message: 'must name a file when LAPWING_TLS is direct',
        })
      }
    }
  })

export interface Env {
  nodeEnv: 'production' | 'development' | 'test'
  port: number
  host: string | undefined
  dataDir: string
  databaseFile: string
  tls: 'off' | 'direct' | 'proxy'
  tlsCertFile: string | undefined
  tlsKeyFile: string | undefined
  demo: boolean
  logLevel: 'silent' | 'error' | 'warn' | 'info' | 'debug'
  threads: number
}

/** The one place that reads the environment; a wrong value is refused by name. */
export function readEnv(source: Readonly<Record<string, string | undefined>>): Env {
  const parsed = variables.safeParse(dropEmpty(source))
  if (!parsed.success) {
    throw new StartRefusal(parsed.error.issues.map((issue) => complaint(issue, source)).join('\n'))
  }
  const value = parsed.data
  const dataDir = resolve(value.LAPWING_DATA)
  return {
    nodeEnv: value.NODE_ENV,
    port: value.PORT,
    host: value.HOST,
    dataDir,
    databaseFile: join(dataDir, 'lapwing.sqlite'),
    tls: value.LAPWING_TLS,
    tlsCertFile: value.LAPWING_TLS_CERT,
    tlsKeyFile: value.LAPWING_TLS_KEY,
    demo: value.LAPWING_DEMO,
    logLevel: value.NODE_ENV === 'test' ? 'silent' : value.LAPWING_LOG,
    threads: value.LAPWING_THREADS,
  }
}

/** `PORT= npm start` means that nothing was said, not that the port is empty. */
function dropEmpty(source: Readonly<Record<string, string | undefined>>) {
  return Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ''))
}

function complaint(issue: z.core.$ZodIssue, source: Readonly<Record<string, string | undefined>>): string {
  const name = String(issue.path[0])
  const given = source[name]
  return `${name} ${issue.message}${given === undefined ? '' : `; it is "${given}"`}.`
}
