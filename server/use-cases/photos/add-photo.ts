import type { Photo } from '@shared/schemas/readings'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { photos, readingPhotos } from '../../db/schema/readings'
import { withUniqueClash } from '../../db/unique'
import { AppError } from '../../errors'
import { checkPhoto } from '../../storage/check-photo'
import type { ReceivedFile } from '../../storage/photo-storage'
import { requireEditableReading } from '../readings/reading-record'
import { touchReading } from '../readings/touch-reading'
import { requirePhoto } from './select-photos'

export interface NewPhoto {
  file: ReceivedFile
  fileName: string
  role: Photo['role']
}

/** Adds a received photograph to the actor's reading. The file is kept or gone afterwards, never in between. */
export async function addPhoto(
  context: AppContext,
  actor: Actor,
  readingId: string,
  { file, fileName, role }: NewPhoto,
): Promise<Photo> {
  const { db, now, storage } = context
  try {
    const header = await checkPhoto(file)
    return inTransaction(db, (tx) => {
      requireEditableReading(tx, actor, readingId)
      const at = now()
      const addedAt = at.toISOString()
      const id = newId()
      tx.insert(photos)
        .values({ ...header, sha256: file.sha256, bytes: file.bytes, createdAt: addedAt })
        .onConflictDoNothing()
        .run()
      withUniqueClash(
        () =>
          tx
            .insert(readingPhotos)
            .values({ id, readingId, sha256: file.sha256, role, fileName, addedAt, addedById: actor.id })
            .run(),
        () => new AppError('alreadyThere', { say: { key: 'photo.alreadyThere' } }),
      )
      touchReading(tx, readingId, at)
      const data = { photoId: id, sha256: file.sha256, fileName, role }
      recordEvent(tx, {
        kind: 'reading.photoAdded',
        subject: { type: 'reading', id: readingId },
        actor,
        data,
        at,
      })
      // Last of all: when the file can't be put in its place, none of this has happened.
      storage.keep(file)
      return requirePhoto(tx, readingId, id)
    })
  } finally {
    await storage.discard(file)
  }
}
