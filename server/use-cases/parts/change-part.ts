import type { NewPart, Part } from '@shared/schemas/parts'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { requirePart } from '../../db/parts'
import { parts } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { assertCustomer, partTaken } from './part-refusals'

export function changePart(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  change: Partial<NewPart>,
): Part {
  return inTransaction(db, (tx) => {
    const before = requirePart(tx, id)
    const changes = differences<NewPart>(before, change)
    if (!changes) return before
    if (change.customerId !== undefined) assertCustomer(tx, change.customerId)
    withUniqueClash(
      () => tx.update(parts).set(change).where(eq(parts.id, id)).run(),
      () => partTaken({ ...before, ...change }),
    )
    recordEvent(tx, {
      kind: 'part.changed',
      subject: { type: 'part', id },
      actor,
      data: { changes },
      at: now(),
    })
    return requirePart(tx, id)
  })
}
