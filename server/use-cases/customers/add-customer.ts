import type { Customer, NewCustomer } from '@shared/schemas/parts'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { requireCustomer } from '../../db/customers'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { customers } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { customerTaken } from './customer-taken'

export function addCustomer({ db, now }: AppContext, actor: Actor, input: NewCustomer): Customer {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    withUniqueClash(
      () =>
        tx
          .insert(customers)
          .values({ ...input, id, createdAt: at.toISOString() })
          .run(),
      () => customerTaken(input.name),
    )
    recordEvent(tx, {
      kind: 'customer.added',
      subject: { type: 'customer', id },
      actor,
      data: { ...input },
      at,
    })
    return requireCustomer(tx, id)
  })
}
