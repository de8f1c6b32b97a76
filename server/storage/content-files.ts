import { closeSync, fsyncSync, mkdirSync, openSync, renameSync, rmSync } from 'node:fs'
import { dirname, join } from 'node:path'
import type { ReceivedFile } from './incoming'

/** Two levels of folders, so that none holds more than a few hundred names. */
export function pathOfContent(folder: string, sha256: string): string {
  if (!/^[0-9a-f]{64}$/.test(sha256)) throw new RangeError('not a SHA-256')
  return join(folder, sha256.slice(0, 2), sha256.slice(2, 4), sha256)
}

/** Renames a received file to its content's name. The same content twice is one file. */
export function keepContent(folder: string, file: ReceivedFile): void {
  const target = pathOfContent(folder, file.sha256)
  mkdirSync(dirname(target), { recursive: true })
  renameSync(file.path, target)
  syncFolder(dirname(target))
}

export function removeContent(folder: string, sha256: string): void {
  rmSync(pathOfContent(folder, sha256), { force: true })
}

/** The name itself must survive a pulled plug as well as the bytes. */
function syncFolder(path: string): void {
  const folder = openSync(path, 'r')
  try {
    fsyncSync(folder)
  } finally {
    closeSync(folder)
  }
}
