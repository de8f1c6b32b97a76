import type { Role } from '@shared/access/permissions'
import { sql } from 'drizzle-orm'
import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

export const people = sqliteTable(
  'people',
  {
    id: text('id').primaryKey(),
    name: text('name').notNull(),
    /** Lower case, as `emailSchema` leaves it. */
    email: text('email').notNull(),
    passwordHash: text('password_hash').notNull(),
    active: integer('active', { mode: 'boolean' }).notNull().default(true),
    createdAt: text('created_at').notNull(),
  },
  (table) => [uniqueIndex('people_email').on(table.email)],
)

export const personRoles = sqliteTable(
  'person_roles',
  {
    personId: text('person_id')
      .notNull()
      .references(() => people.id),
    role: text('role').$type<Role>().notNull(),
  },
  (table) => [primaryKey({ columns: [table.personId, table.role] })],
)

/** `id` is the SHA-256 of what the cookie carries: a stolen database file signs nobody in. */
export const sessions = sqliteTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: text('user_id')
      .notNull()
      .references(() => people.id),
    /** Unix seconds, as lucia's adapter writes it. */
    expiresAt: integer('expires_at').notNull(),
  },
  (table) => [index('sessions_user').on(table.userId), index('sessions_expiry').on(table.expiresAt)],
)

export const signInAttempts = sqliteTable(
  'sign_in_attempts',
  {
    id: integer('id').primaryKey(),
    at: text('at').notNull(),
    /** The e-mail address that was typed, known or not. */
    account: text('account').notNull(),
    address: text('address').notNull(),
    succeeded: integer('succeeded', { mode: 'boolean' }).notNull().default(false),
  },
  (table) => [
    index('sign_in_attempts_account').on(table.account, table.at),
    index('sign_in_attempts_address').on(table.address, table.at),
    index('sign_in_attempts_known').on(table.account, table.address, table.at).where(sql`succeeded = 1`),
  ],
)
