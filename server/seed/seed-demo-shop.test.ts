import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { asc } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { truthOf } from '../../tests/photographs/truth'
import { createAnalysis } from '../analysis/analysis'
import { createAuth } from '../auth/auth'
import { createPasswords } from '../auth/passwords'
import { closeDatabase, type Db, openDatabase } from '../db/client'
import { verifyChain } from '../db/events'
import { migrateDatabase } from '../db/migrate'
import { selectReadingRows } from '../db/reading-rows'
import { certificates } from '../db/schema/certificates'
import { events } from '../db/schema/events'
import { dispositions, reviewRemarks } from '../db/schema/reviews'
import { readEnv } from '../env'
import { createLogger } from '../logger'
import { createPhotoStorage } from '../storage/photo-storage'
import { demoReadings } from './demo-readings'
import { demoScene } from './demo-scene'
import { seedDemoShop } from './seed-demo-shop'

const patienceMs = 180_000
const today = '2026-11-02T08:00:00.000Z'
const folders: string[] = []
const analysis = createAnalysis({ threads: 1 })
let first: Db
let second: Db

beforeAll(async () => {
  first = await seeded()
  second = await seeded()
}, patienceMs)
afterAll(async () => {
  for (const db of [first, second]) if (db) closeDatabase(db)
  for (const folder of folders) rmSync(folder, { recursive: true })
  await analysis.close()
})

async function seeded(): Promise<Db> {
  const folder = mkdtempSync(join(tmpdir(), 'lapwing-seed-'))
  folders.push(folder)
  const env = readEnv({ NODE_ENV: 'test', LAPWING_DATA: folder })
  const db = openDatabase(env.databaseFile)
  migrateDatabase(db)
  await seedDemoShop({
    env,
    db,
    auth: createAuth(db, createPasswords('test')),
    storage: createPhotoStorage({ dir: folder }),
    analysis,
    logger: createLogger(env),
    now: () => new Date(today),
  })
  return db
}

/** Oldest first, as the demo readings stand in their list. */
function readingsOf(db: Db) {
  return selectReadingRows(db, { limit: 200 }).sort((a, b) => a.createdAt.localeCompare(b.createdAt))
}

function contentOf(db: Db) {
  return readingsOf(db).map(({ serial, number, state, createdAt, photoSha256, result }) => ({
    serial,
    number,
    state,
    createdAt,
    photoSha256,
    flatnessUm: result?.flatnessUm,
    expandedUncertaintyUm: result?.expandedUncertaintyUm,
    verdict: result?.verdict,
  }))
}

describe('the demo shop', () => {
  it('has readings in every state, each with its photograph', () => {
    const rows = readingsOf(first)
    expect(rows.map(({ serial }) => serial)).toEqual(demoReadings.map(({ serial }) => serial))
    expect(new Set(rows.map(({ state }) => state))).toEqual(
      new Set(['draft', 'sentForReview', 'sentBack', 'agreed', 'certified', 'setAside']),
    )
    expect(new Set(rows.map(({ serial }) => serial)).size).toBeGreaterThanOrEqual(12)
    expect(rows.every(({ photoSha256 }) => photoSha256 !== null)).toBe(true)
  })

  it('has drafts without a figure and one with it, and remarks pinned to places, open and closed', () => {
    const drafts = readingsOf(first).filter(({ state }) => state === 'draft')
    expect(drafts.filter(({ result }) => result === null).length).toBeGreaterThanOrEqual(2)
    expect(drafts.filter(({ result }) => result !== null)).toHaveLength(1)
    const pinned = { place: { x: expect.any(Number), y: expect.any(Number) } }
    const remarks = first.select().from(reviewRemarks).orderBy(asc(reviewRemarks.createdAt)).all()
    expect(remarks).toMatchObject([
      { ...pinned, closedAt: expect.any(String) },
      { ...pinned, closedAt: null },
    ])
  })

  it('has certificates that stand, that were replaced and that were withdrawn, numbered without a gap', () => {
    const rows = first.select().from(certificates).orderBy(asc(certificates.count)).all()
    expect(rows.map(({ count, state }) => [count, state])).toEqual([
      [1, 'issued'],
      [2, 'withdrawn'],
      [3, 'replaced'],
      [4, 'issued'],
    ])
    expect(first.select().from(dispositions).all()).toMatchObject([{ kind: 'rework' }])
  })

  it('has a lot that is half done: certified, agreed, begun and not begun', () => {
    const lot = readingsOf(first).filter(({ partNumber }) => partNumber === 'SR-40')
    expect(new Set(lot.map(({ state }) => state))).toEqual(new Set(['certified', 'agreed', 'draft']))
    expect(new Set(lot.map(({ serial }) => serial)).size).toBeLessThan(5)
  })

  it('has figures that conform, that do not, and that prove neither', () => {
    const verdicts = readingsOf(first).flatMap(({ result }) => result?.verdict ?? [])
    expect(new Set(verdicts)).toEqual(new Set(['conforms', 'doesNotConform', 'neitherProven']))
  })

  it('reads every face within its uncertainty of what was drawn', { timeout: patienceMs }, () => {
    readingsOf(first).forEach(({ result, serial, number }, i) => {
      if (!result) return
      const errorUm = Number(result.flatnessUm) - truthOf(demoScene(demoReadings[i])).minimumZoneUm
      const uUm = Number(result.expandedUncertaintyUm)
      expect(Math.abs(errorUm), `${serial}, reading ${number}`).toBeLessThan(uUm)
    })
  })

  it('has a disc that is lapped flatter from day to day', () => {
    const series = readingsOf(first).filter(({ serial }) => serial === 'LD-60-21')
    expect(series.map(({ state }) => state)).toEqual(['agreed', 'agreed', 'certified'])
    const figuresUm = series.map(({ result }) => Number(result?.flatnessUm))
    expect(figuresUm).toEqual([...figuresUm].sort((a, b) => b - a))
    expect(figuresUm[2]).toBeLessThan(figuresUm[0] / 2)
  })

  it('keeps a whole trail, in the order of time and before today', () => {
    expect(verifyChain(first)).toMatchObject({ intact: true })
    const times = first.select({ at: events.at }).from(events).orderBy(asc(events.seq)).all()
    const inOrder = times.map(({ at }) => at)
    expect(inOrder).toEqual([...inOrder].sort())
    expect(inOrder[inOrder.length - 1] < today).toBe(true)
  })

  it('is the same each time', () => {
    expect(contentOf(second)).toEqual(contentOf(first))
  })
})
