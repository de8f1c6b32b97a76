/*
 * Issues a certificate and is killed on the way: `killed-issue.ts FOLDER READING PERSON TABLE` dies, by SIGKILL, at the
 * moment when a row has been written into TABLE, within the transaction and before its commit.
 */
import { createAnalysis } from '../../server/analysis/analysis'
import { createAuth } from '../../server/auth/auth'
import { createPasswords } from '../../server/auth/passwords'
import { openDatabase } from '../../server/db/client'
import { readEnv } from '../../server/env'
import { createLogger } from '../../server/logger'
import { createPhotoStorage } from '../../server/storage/photo-storage'
import { issueCertificate } from '../../server/use-cases/certificates/issue-certificate'
import { testPassword } from './test-password'

const [folder, readingId, personId, table] = process.argv.slice(2)
const env = readEnv({ NODE_ENV: 'test', LAPWING_DATA: folder, LAPWING_THREADS: '1' })
const db = openDatabase(env.databaseFile)
db.$client.function('die', () => process.kill(process.pid, 'SIGKILL') && 0)
db.$client.exec(`CREATE TEMP TRIGGER dies AFTER INSERT ON main.${table} BEGIN SELECT die(); END`)

await issueCertificate(
  {
    env,
    db,
    auth: createAuth(db, createPasswords('test')),
    storage: createPhotoStorage({ dir: folder }),
    analysis: createAnalysis({ threads: 1 }),
    logger: createLogger(env),
    now: () => new Date('2026-11-02T12:00:00.000Z'),
  },
  { id: personId, name: 'Person', roles: ['qa'] },
  readingId,
  { password: testPassword, received: '', replacesId: null },
  { address: 'here', origin: 'http://localhost' },
)
