import type { Analysis } from './analysis/analysis'
import type { Auth } from './auth/auth'
import type { Db } from './db/client'
import type { Env } from './env'
import type { Logger } from './logger'
import type { PhotoStorage } from './storage/photo-storage'

/** What routes and use-cases work with. Made once, in `index.ts` or by a test. */
export interface AppContext {
  env: Env
  db: Db
  auth: Auth
  storage: PhotoStorage
  analysis: Analysis
  logger: Logger
  /** The time; tests hold it still. */
  now: () => Date
}
