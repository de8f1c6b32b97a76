import type { NewPart, Part } from '@shared/schemas/parts'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requirePart } from '../../db/parts'
import { parts } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { assertCustomer, partTaken } from './part-refusals'

export function addPart({ db, now }: AppContext, actor: Actor, input: NewPart): Part {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    assertCustomer(tx, input.customerId)
    withUniqueClash(
      () =>
        tx
          .insert(parts)
          .values({ ...input, id, createdAt: at.toISOString() })
          .run(),
      () => partTaken(input),
    )
    recordEvent(tx, { kind: 'part.added', subject: { type: 'part', id }, actor, data: { ...input }, at })
    return requirePart(tx, id)
  })
}
