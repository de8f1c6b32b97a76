import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { recordEvent } from '../../db/events'
import { photos, readingPhotos } from '../../db/schema/readings'
import { requireEditableReading } from '../readings/reading-record'
import { touchReading } from '../readings/touch-reading'
import { requirePhoto } from './select-photos'

/** Takes a photograph off the actor's reading; the file goes when no other reading has it. */
export function removePhoto(
  { db, now, storage }: AppContext,
  actor: Actor,
  readingId: string,
  photoId: string,
): void {
  const { sha256, unused } = inTransaction(db, (tx) => {
    requireEditableReading(tx, actor, readingId)
    const photo = requirePhoto(tx, readingId, photoId)
    const at = now()
    tx.delete(readingPhotos).where(eq(readingPhotos.id, photoId)).run()
    touchReading(tx, readingId, at)
    const { fileName, role } = photo
    const data = { photoId, sha256: photo.sha256, fileName, role }
    recordEvent(tx, {
      kind: 'reading.photoRemoved',
      subject: { type: 'reading', id: readingId },
      actor,
      data,
      at,
    })
    return { sha256: photo.sha256, unused: forgetIfUnused(tx, photo.sha256) }
  })
  // At once, and not later: the same photograph may be on its way in again.
  if (unused) storage.remove(sha256)
}

function forgetIfUnused(tx: Tx, sha256: string): boolean {
  const used = tx
    .select({ id: readingPhotos.id })
    .from(readingPhotos)
    .where(eq(readingPhotos.sha256, sha256))
    .get()
  if (used) return false
  tx.delete(photos).where(eq(photos.sha256, sha256)).run()
  return true
}
