import { createHash, randomBytes } from 'node:crypto'
import { mkdirSync, readdirSync, rmSync } from 'node:fs'
import { mkdir, open, rm } from 'node:fs/promises'
import { join } from 'node:path'
import type { Readable } from 'node:stream'

/** A whole file on disk under a temporary name. */
export interface ReceivedFile {
  path: string
  sha256: string
  bytes: number
}

/** Writes a stream to a file of its own, hashing as it goes, and waits until the disk has it. */
export async function receiveFile(folder: string, stream: Readable): Promise<ReceivedFile> {
  await mkdir(folder, { recursive: true })
  // The process in the name: a start sweeps what a process left that is no more.
  const path = join(folder, `${process.pid}-${randomBytes(12).toString('hex')}`)
  const file = await open(path, 'wx', 0o600)
  try {
    const hash = createHash('sha256')
    let bytes = 0
    for await (const chunk of stream) {
      hash.update(chunk)
      bytes += chunk.length
      await writeWhole(file, chunk)
    }
    await file.sync()
    return { path, sha256: hash.digest('hex'), bytes }
  } catch (error) {
    await rm(path, { force: true })
    throw error
  } finally {
    await file.close()
  }
}

/** A single write may take less than it was given. */
async function writeWhole(file: Awaited<ReturnType<typeof open>>, chunk: Buffer): Promise<void> {
  let done = 0
  while (done < chunk.length) {
    const { bytesWritten } = await file.write(chunk, done)
    done += bytesWritten
  }
}

/** Removes what a process that is gone had begun to receive. */
export function sweepLeftovers(folder: string): void {
  mkdirSync(folder, { recursive: true })
  for (const name of readdirSync(folder)) {
    const pid = Number(name.split('-', 1)[0])
    if (pid === process.pid || !isRunning(pid)) rmSync(join(folder, name), { force: true })
  }
}

function isRunning(pid: number): boolean {
  if (!Number.isInteger(pid) || pid <= 0) return false
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM'
  }
}
