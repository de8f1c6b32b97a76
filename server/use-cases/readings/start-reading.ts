import { emptyMarks } from '@shared/schemas/marks'
import type { NewReading, Reading } from '@shared/schemas/readings'
import { isEditable } from '@shared/workflow/reading-states'
import { and, eq, max } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requireFace } from '../../db/parts'
import { requirePiece } from '../../db/pieces'
import { readings } from '../../db/schema/readings'
import { invalidField } from '../../errors'
import { requireReading } from './reading-record'
import { assertSetUp } from './set-up-refusals'
import { readReading } from './show-reading'

/** A new draft of a face of a piece, taken by the actor. Its marks begin with the face's edge band. */
export function startReading({ db, now }: AppContext, actor: Actor, input: NewReading): Reading {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    const piece = requirePiece(tx, input.pieceId)
    const face = requireFace(tx, input.faceId)
    if (face.partId !== piece.partId) throw invalidField('faceId', { key: 'reading.face.otherPart' })
    assertSetUp(tx, input.setUp)
    assertCorrects(tx, input)
    const number = nextNumber(tx, input)
    tx.insert(readings)
      .values({
        ...input,
        id,
        number,
        state: 'draft',
        takenById: actor.id,
        createdAt: at.toISOString(),
        updatedAt: at.toISOString(),
        marks: emptyMarks(face.edgeBandMm),
      })
      .run()
    const data = { pieceId: piece.id, faceId: face.id, number, correctsId: input.correctsId }
    recordEvent(tx, { kind: 'reading.started', subject: { type: 'reading', id }, actor, data, at })
    return readReading(tx, actor, id)
  })
}

/** Counted in the transaction that takes the number; the database's unique index stands behind it. */
function nextNumber(tx: Tx, { pieceId, faceId }: NewReading): number {
  const latest = tx
    .select({ number: max(readings.number) })
    .from(readings)
    .where(and(eq(readings.pieceId, pieceId), eq(readings.faceId, faceId)))
    .get()
  return (latest?.number ?? 0) + 1
}

function assertCorrects(tx: Tx, { correctsId, pieceId, faceId }: NewReading): void {
  if (correctsId === null) return
  const corrected = requireReading(tx, correctsId)
  if (corrected.pieceId !== pieceId || corrected.faceId !== faceId) {
    throw invalidField('correctsId', { key: 'reading.corrects.otherFace' })
  }
  if (isEditable(corrected.state)) throw invalidField('correctsId', { key: 'reading.corrects.stillOpen' })
}
