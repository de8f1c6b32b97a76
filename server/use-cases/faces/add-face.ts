import type { Face, NewFace } from '@shared/schemas/parts'
import { count, eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requireFace, requirePart } from '../../db/parts'
import { faces } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { faceTaken } from './face-taken'

export function addFace({ db, now }: AppContext, actor: Actor, partId: string, input: NewFace): Face {
  const id = newId()
  return inTransaction(db, (tx) => {
    const at = now()
    requirePart(tx, partId)
    const row = { ...input, id, partId, position: countFaces(tx, partId), createdAt: at.toISOString() }
    withUniqueClash(
      () => tx.insert(faces).values(row).run(),
      () => faceTaken(input.name),
    )
    recordEvent(tx, {
      kind: 'face.added',
      subject: { type: 'face', id },
      actor,
      data: { partId, ...input },
      at,
    })
    return requireFace(tx, id)
  })
}

function countFaces(tx: Tx, partId: string): number {
  return tx.select({ faces: count() }).from(faces).where(eq(faces.partId, partId)).get()?.faces ?? 0
}
