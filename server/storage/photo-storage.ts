import { rm } from 'node:fs/promises'
import { join } from 'node:path'
import type { Readable } from 'node:stream'
import { keepContent, pathOfContent, removeContent } from './content-files'
import { type ReceivedFile, receiveFile, sweepLeftovers } from './incoming'
import { createPreviews, type PreviewWidth } from './previews'

export type { ReceivedFile }

/** Photographs on disk, by the SHA-256 of what is in them. The database says what belongs to what. */
export interface PhotoStorage {
  /** Writes a stream to a temporary name, and to the disk itself; not yet anybody's photograph. */
  receive(stream: Readable): Promise<ReceivedFile>
  /** Gives a received file its place for good. In one step, so that it can be the last one of a transaction. */
  keep(file: ReceivedFile): void
  /** Forgets a received file that wasn't kept; nothing happens to one that was. */
  discard(file: ReceivedFile): Promise<void>
  /** Removes a photograph and its previews. In one step, right after the transaction that let go of it. */
  remove(sha256: string): void
  pathOf(sha256: string): string
  /** The file of a preview, made when first asked for. */
  preview(sha256: string, width: PreviewWidth): Promise<string>
}

export function createPhotoStorage({ dir }: { dir: string }): PhotoStorage {
  const photos = join(dir, 'photos')
  const incoming = join(photos, 'incoming')
  sweepLeftovers(incoming)
  const pathOf = (sha256: string) => pathOfContent(photos, sha256)
  const previews = createPreviews(join(dir, 'previews'), pathOf)
  return {
    receive: (stream) => receiveFile(incoming, stream),
    keep: (file) => keepContent(photos, file),
    discard: (file) => rm(file.path, { force: true }),
    remove: (sha256) => {
      removeContent(photos, sha256)
      previews.remove(sha256)
    },
    pathOf,
    preview: previews.file,
  }
}
