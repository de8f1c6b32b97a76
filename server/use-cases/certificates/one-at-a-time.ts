import type { Db } from '../../db/client'

const lanes = new WeakMap<Db, Promise<unknown>>()

/**
 * Jobs on a database one after the other: printing certificates side by side would print all but one of them for a
 * number that another takes. Other processes are held off by the number being read again when it is stored.
 */
export function oneAtATime<T>(db: Db, job: () => Promise<T>): Promise<T> {
  const before = lanes.get(db) ?? Promise.resolve()
  const mine = before.then(job, job)
  lanes.set(
    db,
    mine.catch(() => undefined),
  )
  return mine
}
