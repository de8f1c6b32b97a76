import { existsSync, mkdirSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { afterEach, describe, expect, it } from 'vitest'
import { createPhotoStorage } from './photo-storage'

const folders: string[] = []
function newFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'lapwing-storage-'))
  folders.push(folder)
  return folder
}
afterEach(() => {
  for (const folder of folders.splice(0)) rmSync(folder, { recursive: true })
})

describe('the photo storage', () => {
  it('leaves nothing of a stream that broke off', async () => {
    const dir = newFolder()
    const storage = createPhotoStorage({ dir })
    const broken = Readable.from(
      (async function* () {
        yield Buffer.from('the first half')
        throw new Error('the tablet went to sleep')
      })(),
    )
    await expect(storage.receive(broken)).rejects.toThrow('the tablet went to sleep')
    expect(readdirSync(join(dir, 'photos', 'incoming'))).toEqual([])
  })

  it('keeps the same content once, and forgets what isn’t kept', async () => {
    const dir = newFolder()
    const storage = createPhotoStorage({ dir })
    const [first, second, third] = await Promise.all(
      ['bands', 'bands', 'none'].map((text) => storage.receive(Readable.from([Buffer.from(text)]))),
    )
    storage.keep(first)
    storage.keep(second)
    await storage.discard(second)
    await storage.discard(third)
    expect(existsSync(storage.pathOf(first.sha256))).toBe(true)
    expect(existsSync(storage.pathOf(third.sha256))).toBe(false)
    expect(readdirSync(join(dir, 'photos', 'incoming'))).toEqual([])
  })

  it('sweeps at the start what a process that is gone had begun, and nothing that one is at', () => {
    const dir = newFolder()
    const incoming = join(dir, 'photos', 'incoming')
    mkdirSync(incoming, { recursive: true })
    const ofAnother = `${process.ppid}-busy`
    for (const name of ['999999999-lost', `${process.pid}-before`, 'nameless', ofAnother]) {
      writeFileSync(join(incoming, name), 'half a photograph')
    }
    createPhotoStorage({ dir })
    expect(readdirSync(incoming)).toEqual([ofAnother])
  })

  it('knows photographs by their sum only, so that no name leads out of its folder', () => {
    const storage = createPhotoStorage({ dir: newFolder() })
    expect(() => storage.pathOf('../../etc/passwd')).toThrow(RangeError)
  })
})
