import { copyFileSync, existsSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Role } from '@shared/access/permissions'
import type { Me } from '@shared/schemas/people'
import supertest from 'supertest'
import { afterAll, afterEach } from 'vitest'
import { type Analysis, createAnalysis } from '../../server/analysis/analysis'
import { type App, createApp } from '../../server/app'
import { createAuth } from '../../server/auth/auth'
import { createPasswords } from '../../server/auth/passwords'
import type { AppContext } from '../../server/context'
import { closeDatabase, openDatabase } from '../../server/db/client'
import { migrateDatabase } from '../../server/db/migrate'
import { type Env, readEnv } from '../../server/env'
import { createLogger } from '../../server/logger'
import { createPhotoStorage } from '../../server/storage/photo-storage'
import { addPerson } from '../../server/use-cases/people/add-person'
import { testPassword } from './test-password'

export type Agent = ReturnType<typeof supertest.agent>

export interface SignedIn {
  agent: Agent
  me: Me
}

export interface TestApp {
  app: App
  context: AppContext
  /** A browser of nobody, that says it is on our own page. */
  agent: () => Agent
  /** A new person of these roles, signed in. */
  signInAs: (...roles: Role[]) => Promise<SignedIn>
  /** Moves the server's clock on. */
  advance: (ms: number) => void
}

export { testPassword }

const startOfTime = Date.parse('2026-11-02T08:00:00.000Z')

const opened: (() => void)[] = []
let template: string | undefined
let analysis: Analysis | undefined

afterEach(() => {
  for (const close of opened.splice(0)) close()
})
afterAll(async () => {
  await analysis?.close()
  if (template) rmSync(template, { recursive: true })
})

/** The whole server side on a database of its own, without a socket. Closed after the test. */
export function startTestApp(variables: Record<string, string> = {}): TestApp {
  const folder = mkdtempSync(join(tmpdir(), 'lapwing-test-'))
  const env = readEnv({ NODE_ENV: 'test', LAPWING_DATA: folder, LAPWING_THREADS: '1', ...variables })
  copyFileSync(migratedTemplate(), env.databaseFile)
  const db = openDatabase(env.databaseFile)
  opened.push(() => {
    closeDatabase(db)
    rmSync(folder, { recursive: true })
  })

  let nowMs = startOfTime
  const context: AppContext = {
    ...sharedServices(env),
    env,
    db,
    auth: createAuth(db, createPasswords('test')),
    // A step with each look, so that what was done later is later.
    now: () => new Date(nowMs++),
  }
  const app = createApp(context)
  const agent = () => supertest.agent(app.express).set('Sec-Fetch-Site', 'same-origin')
  return {
    app,
    context,
    agent,
    signInAs: (...roles) => signInAs(context, agent(), roles),
    advance: (ms) => {
      nowMs += ms
    },
  }
}

function sharedServices(env: Env) {
  analysis ??= createAnalysis({ threads: env.threads })
  return { analysis, storage: createPhotoStorage({ dir: env.dataDir }), logger: createLogger(env) }
}

/** Migrating takes longer than copying a file that is migrated. */
function migratedTemplate(): string {
  template ??= mkdtempSync(join(tmpdir(), 'lapwing-template-'))
  const file = join(template, 'migrated.sqlite')
  if (existsSync(file)) return file
  const db = openDatabase(file)
  migrateDatabase(db)
  closeDatabase(db)
  return file
}

let peopleMade = 0

async function signInAs(context: AppContext, agent: Agent, roles: Role[]): Promise<SignedIn> {
  peopleMade += 1
  const name = `Person ${peopleMade}`
  const email = `person${peopleMade}@example.com`
  await addPerson(context, null, { name, email, password: testPassword, roles })
  const response = await agent.post('/api/session').send({ email, password: testPassword }).expect(200)
  return { agent, me: response.body }
}
