import type { Lot, NewLot } from '@shared/schemas/parts'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requireLot, requirePart } from '../../db/parts'
import { lots } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { alreadyThere } from '../../errors'

export function addLot({ db, now }: AppContext, actor: Actor, input: NewLot): Lot {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    requirePart(tx, input.partId)
    withUniqueClash(
      () =>
        tx
          .insert(lots)
          .values({ ...input, id, createdAt: at.toISOString() })
          .run(),
      () => alreadyThere('number', { key: 'lot.number.taken', params: { number: input.number } }),
    )
    recordEvent(tx, { kind: 'lot.added', subject: { type: 'lot', id }, actor, data: { ...input }, at })
    return requireLot(tx, id)
  })
}
