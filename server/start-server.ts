import { createAnalysis } from './analysis/analysis'
import { createApp } from './app'
import { createAuth } from './auth/auth'
import type { AppContext } from './context'
import { closeDatabase, openDatabase, tendDatabase } from './db/client'
import { migrateDatabase } from './db/migrate'
import type { Env } from './env'
import { createLogger } from './logger'
import { answerErrors } from './middleware/answer-errors'
import { closeOnSignal } from './network/close-on-signal'
import { assertCanListen, createNetworkServer, listen } from './network/listen'
import { mountScreens } from './network/screens'
import { setUpNewShop } from './set-up/set-up-new-shop'
import { writeWelcome } from './set-up/welcome'
import { createPhotoStorage } from './storage/photo-storage'

const tendEveryMs = 6 * 3_600_000

/** From the environment to a listening server; the order is what each step needs of the one before. */
export async function startServer(env: Env): Promise<void> {
  await assertCanListen(env)
  const services = {
    env,
    logger: createLogger(env),
    storage: createPhotoStorage({ dir: env.dataDir }),
    analysis: createAnalysis({ threads: env.threads }),
    now: () => new Date(),
  }
  const firstAdministrator = await setUpNewShop(services)
  const db = openDatabase(env.databaseFile)
  migrateDatabase(db)
  const context: AppContext = { ...services, db, auth: createAuth(db) }

  const app = createApp(context)
  const server = createNetworkServer(env, app.express)
  const screens = await mountScreens(app.express, env, server)
  app.express.use(answerErrors(context.logger))
  await listen(server, env)
  const tending = tend(context)

  closeOnSignal(server, async () => {
    clearInterval(tending)
    await screens.close()
    await context.analysis.close()
    closeDatabase(db)
  })
  writeWelcome(context, server, firstAdministrator)
}

/** Removes sessions that have run out, and keeps the database quick. */
function tend({ auth, db, logger }: AppContext): NodeJS.Timeout {
  const work = async () => {
    try {
      await auth.lucia.deleteExpiredSessions()
      tendDatabase(db)
    } catch (error) {
      logger.error({ err: error }, 'tending the database')
    }
  }
  work()
  return setInterval(work, tendEveryMs).unref()
}
