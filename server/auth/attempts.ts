import { and, desc, eq, gt, lt, type SQL } from 'drizzle-orm'
import { type Db, inTransaction, type Tx } from '../db/client'
import { signInAttempts } from '../db/schema/people'
import { AppError } from '../errors'

/*
 * How often a sign-in may fail within the window:
 *   one account from one address      pairLimit
 *   one account from strange addresses accountLimit  (many machines guessing at one person)
 *   one strange address, any account   addressLimit  (one machine guessing at many people)
 * An address from which the account signed in lately isn't strange to it. So a guesser can shut out neither
 * a person at their own bench, nor a shop whose people all come from one address.
 */
const pairLimit = 5
const accountLimit = 20
const addressLimit = 50
const windowMs = 15 * 60_000
const knownForMs = 30 * 24 * 3_600_000

export interface Attempt {
  account: string
  address: string
  at: Date
}

/** Counts the attempt as failed until `succeedAttempt`, so that guesses sent side by side count too. */
export function beginAttempt(db: Db, attempt: Attempt): void {
  inTransaction(db, (tx) => {
    refuseTooMany(tx, attempt)
    tx.insert(signInAttempts)
      .values({ ...attempt, at: attempt.at.toISOString() })
      .run()
  })
}

export function succeedAttempt(db: Db, attempt: Attempt): void {
  inTransaction(db, (tx) => {
    tx.delete(signInAttempts).where(ofPair(attempt)).run()
    tx.delete(signInAttempts)
      .where(lt(signInAttempts.at, before(attempt, knownForMs)))
      .run()
    tx.insert(signInAttempts)
      .values({ ...attempt, at: attempt.at.toISOString(), succeeded: true })
      .run()
  })
}

/** With a new password from the administrator a person may try at once. */
export function forgetAttempts(tx: Tx, account: string): void {
  tx.delete(signInAttempts).where(eq(signInAttempts.account, account)).run()
}

function refuseTooMany(tx: Tx, attempt: Attempt): void {
  refuseFrom(tx, attempt, ofPair(attempt), pairLimit)
  if (isKnownPair(tx, attempt)) return
  refuseFrom(tx, attempt, eq(signInAttempts.account, attempt.account), accountLimit)
  refuseFrom(tx, attempt, eq(signInAttempts.address, attempt.address), addressLimit)
}

function refuseFrom(tx: Tx, attempt: Attempt, of: SQL | undefined, limit: number): void {
  const oldestThatCounts = tx
    .select({ at: signInAttempts.at })
    .from(signInAttempts)
    .where(and(of, eq(signInAttempts.succeeded, false), gt(signInAttempts.at, before(attempt, windowMs))))
    .orderBy(desc(signInAttempts.at))
    .limit(1)
    .offset(limit - 1)
    .get()
  if (!oldestThatCounts) return
  const waitMs = Date.parse(oldestThatCounts.at) + windowMs - attempt.at.getTime()
  throw new AppError('tooManyAttempts', {
    say: { key: 'tooManyAttempts', params: { minutes: Math.ceil(waitMs / 60_000) } },
    retryAfterS: Math.ceil(waitMs / 1000),
  })
}

function isKnownPair(tx: Tx, attempt: Attempt): boolean {
  const succeeded = tx
    .select({ id: signInAttempts.id })
    .from(signInAttempts)
    .where(
      and(
        ofPair(attempt),
        eq(signInAttempts.succeeded, true),
        gt(signInAttempts.at, before(attempt, knownForMs)),
      ),
    )
    .limit(1)
    .get()
  return succeeded !== undefined
}

function ofPair({ account, address }: Attempt): SQL | undefined {
  return and(eq(signInAttempts.account, account), eq(signInAttempts.address, address))
}

function before({ at }: Attempt, ms: number): string {
  return new Date(at.getTime() - ms).toISOString()
}
