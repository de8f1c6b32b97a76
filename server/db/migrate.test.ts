import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { sql } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { closeDatabase, openDatabase } from './client'
import { migrateDatabase } from './migrate'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lapwing-migrate-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

describe('the database', () => {
  it('is brought up to date once, and left alone after that', () => {
    const db = openDatabase(join(folder, 'a/new/folder/shop.sqlite'))
    migrateDatabase(db)
    db.run(sql`INSERT INTO customers (id, name, created_at) VALUES ('c', 'Dunmarrow Pumps', '2026-11-02')`)
    migrateDatabase(db)
    expect(db.all(sql`SELECT name FROM customers`)).toEqual([{ name: 'Dunmarrow Pumps' }])
    closeDatabase(db)
  })

  it('keeps its log apart, its foreign keys in force, and waits for a lock', () => {
    const db = openDatabase(join(folder, 'shop.sqlite'))
    migrateDatabase(db)
    const pragma = (name: string) => db.$client.pragma(name, { simple: true })
    expect(pragma('journal_mode')).toBe('wal')
    expect(pragma('foreign_keys')).toBe(1)
    expect(pragma('busy_timeout')).toBe(5000)
    expect(() =>
      db.$client.exec(`INSERT INTO pieces (id, part_id, serial, created_at) VALUES ('p', 'none', '1', '')`),
    ).toThrow(/FOREIGN KEY/)
    closeDatabase(db)
  })

  it('of a newer program is refused before anything is touched', () => {
    const db = openDatabase(join(folder, 'shop.sqlite'))
    migrateDatabase(db)
    db.run(sql`INSERT INTO __drizzle_migrations (hash, created_at) VALUES ('later', 99999999999999)`)
    expect(() => migrateDatabase(db)).toThrow(/written by a newer Lapwing/)
    closeDatabase(db)
  })
})
