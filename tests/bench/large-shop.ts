import type { Face, Piece } from '@shared/schemas/parts'
import type { ReadingState } from '@shared/workflow/reading-states'
import { createAnalysis } from '../../server/analysis/analysis'
import type { Actor } from '../../server/auth/actor'
import { createAuth } from '../../server/auth/auth'
import type { AppContext } from '../../server/context'
import { inTransaction, openDatabase, tendDatabase } from '../../server/db/client'
import { migrateDatabase } from '../../server/db/migrate'
import { readEnv } from '../../server/env'
import { createLogger } from '../../server/logger'
import { createPhotoStorage } from '../../server/storage/photo-storage'
import { addPerson } from '../../server/use-cases/people/add-person'
import { storePartWithFace, storePieceOf, storeReading } from './stored-rows'

export const readingCount = 20_000
const partCount = 40
const piecesEach = 50
const readingsEach = readingCount / (partCount * piecesEach)
const states: ReadingState[] = ['draft', 'sentForReview', 'sentBack', 'agreed', 'certified', 'setAside']

export interface LargeShop {
  context: AppContext
  people: Actor[]
}

/** A shop with 20,000 readings, each with its figure, of 2,000 pieces of 40 parts. */
export async function makeLargeShop(folder: string): Promise<LargeShop> {
  const env = readEnv({ NODE_ENV: 'test', LAPWING_DATA: folder, LAPWING_THREADS: '1' })
  const db = openDatabase(env.databaseFile)
  migrateDatabase(db)
  const context: AppContext = {
    env,
    db,
    auth: createAuth(db),
    storage: createPhotoStorage({ dir: folder }),
    analysis: createAnalysis({ threads: 1 }),
    logger: createLogger({ logLevel: 'silent' }),
    now: () => new Date(),
  }
  const people: Actor[] = []
  for (const name of ['First Person', 'Second Person', 'Third Person'])
    people.push(await addOne(context, name))
  inTransaction(db, (tx) => {
    let count = 0
    for (let p = 0; p < partCount; p++) {
      const face = storePartWithFace(tx, p)
      for (let i = 0; i < piecesEach; i++) {
        const piece = storePieceOf(tx, face, i)
        for (let number = 1; number <= readingsEach; number++) store(piece, face, number, count++)
      }
    }
    function store(piece: Pick<Piece, 'id'>, face: Face, number: number, at: number) {
      const takenById = people[at % people.length].id
      storeReading(tx, { piece, face, number, takenById, state: states[at % states.length], at })
    }
  })
  tendDatabase(db)
  return { context, people }
}

async function addOne(context: AppContext, name: string): Promise<Actor> {
  const email = `${name.toLowerCase().replace(' ', '.')}@example.com`
  return addPerson(context, null, { name, email, password: 'three lapped rings', roles: ['inspector'] })
}
