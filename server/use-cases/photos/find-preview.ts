import { eq } from 'drizzle-orm'
import type { AppContext } from '../../context'
import { photos } from '../../db/schema/readings'
import { notFound } from '../../errors'
import type { PreviewWidth } from '../../storage/previews'

/** The file of a preview of a photograph that the shop has. */
export async function findPreview(
  { db, storage }: AppContext,
  sha256: string,
  width: PreviewWidth,
): Promise<string> {
  const known = db.select({ sha256: photos.sha256 }).from(photos).where(eq(photos.sha256, sha256)).get()
  if (!known) throw notFound('photo')
  return storage.preview(sha256, width)
}
