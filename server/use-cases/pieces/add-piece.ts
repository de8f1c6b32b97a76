import type { NewPiece, Part, Piece } from '@shared/schemas/parts'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requireLot, requirePart } from '../../db/parts'
import { requirePiece } from '../../db/pieces'
import { pieces } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { type AppError, alreadyThere, invalidField } from '../../errors'

export function addPiece({ db, now }: AppContext, actor: Actor, input: NewPiece): Piece {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    const part = requirePart(tx, input.partId)
    if (input.lotId !== null) assertLotOfPart(tx, input.lotId, part)
    withUniqueClash(
      () =>
        tx
          .insert(pieces)
          .values({ ...input, id, createdAt: at.toISOString() })
          .run(),
      () => pieceTaken(input.serial, part),
    )
    recordEvent(tx, { kind: 'piece.added', subject: { type: 'piece', id }, actor, data: { ...input }, at })
    return requirePiece(tx, id)
  })
}

function assertLotOfPart(tx: Tx, lotId: string, part: Part): void {
  if (requireLot(tx, lotId).partId !== part.id) throw invalidField('lotId', { key: 'lot.otherPart' })
}

function pieceTaken(serial: string, part: Part): AppError {
  return alreadyThere('serial', { key: 'piece.serial.taken', params: { serial, partNumber: part.number } })
}
