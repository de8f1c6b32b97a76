import type { Face, NewFace } from '@shared/schemas/parts'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { requireFace } from '../../db/parts'
import { faces } from '../../db/schema/parts'
import { withUniqueClash } from '../../db/unique'
import { faceTaken } from './face-taken'

/** Readings that have left draft keep the face as they were judged by; it stands with their result. */
export function changeFace(
  { db, now }: AppContext,
  actor: Actor,
  id: string,
  change: Partial<NewFace>,
): Face {
  return inTransaction(db, (tx) => {
    const before = requireFace(tx, id)
    const changes = differences<NewFace>(before, change)
    if (!changes) return before
    withUniqueClash(
      () => tx.update(faces).set(change).where(eq(faces.id, id)).run(),
      () => faceTaken(change.name ?? before.name),
    )
    recordEvent(tx, {
      kind: 'face.changed',
      subject: { type: 'face', id },
      actor,
      data: { changes },
      at: now(),
    })
    return requireFace(tx, id)
  })
}
