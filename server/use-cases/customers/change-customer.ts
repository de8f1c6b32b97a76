import type { Customer, NewCustomer } from '@shared/schemas/parts'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { requireCustomer } from '../../db/customers'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { customers } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { customerTaken } from './customer-taken'

export function changeCustomer(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  change: Partial<NewCustomer>,
): Customer {
  return inTransaction(db, (tx) => {
    const before = requireCustomer(tx, id)
    const changes = differences(before, change)
    if (!changes) return before
    withUniqueClash(
      () => tx.update(customers).set(change).where(eq(customers.id, id)).run(),
      () => customerTaken(change.name ?? before.name),
    )
    recordEvent(tx, {
      kind: 'customer.changed',
      subject: { type: 'customer', id },
      actor,
      data: { changes },
      at: now(),
    })
    return requireCustomer(tx, id)
  })
}
