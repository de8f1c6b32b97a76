import type { Photo } from '@shared/schemas/readings'
import { and, asc, eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { photos, readingPhotos } from '../../db/schema/readings'
import { notFound } from '../../errors'

const photoColumns = {
  id: readingPhotos.id,
  sha256: readingPhotos.sha256,
  role: readingPhotos.role,
  fileName: readingPhotos.fileName,
  widthPx: photos.widthPx,
  heightPx: photos.heightPx,
  bitDepth: photos.bitDepth,
  format: photos.format,
  bytes: photos.bytes,
}

/** Photographs of a reading, in the order in which they were added. */
export function selectPhotos(db: Connection, readingId: string): Photo[] {
  return db
    .select(photoColumns)
    .from(readingPhotos)
    .innerJoin(photos, eq(photos.sha256, readingPhotos.sha256))
    .where(eq(readingPhotos.readingId, readingId))
    .orderBy(asc(readingPhotos.addedAt), asc(readingPhotos.id))
    .all()
}

export function requirePhoto(db: Connection, readingId: string, photoId: string): Photo {
  const [photo] = db
    .select(photoColumns)
    .from(readingPhotos)
    .innerJoin(photos, eq(photos.sha256, readingPhotos.sha256))
    .where(and(eq(readingPhotos.readingId, readingId), eq(readingPhotos.id, photoId)))
    .all()
  if (!photo) throw notFound('photo')
  return photo
}
