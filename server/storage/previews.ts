import { randomBytes } from 'node:crypto'
import { existsSync, rmSync } from 'node:fs'
import { mkdir, rename, rm } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { limitedTo } from './limited'
import { renderPreview } from './render-preview'
import { singleFlight } from './single-flight'

export const previewWidths = [160, 640, 1280, 2048, 'full'] as const
export type PreviewWidth = (typeof previewWidths)[number]

export interface Previews {
  file(sha256: string, width: PreviewWidth): Promise<string>
  remove(sha256: string): void
}

/** A large photograph takes a few hundred MB while it is open, so only so many are at once. */
const renderedAtOnce = 2

/** Previews on disk, each made once, by the first who asks, while the others wait for the same one. */
export function createPreviews(folder: string, pathOf: (sha256: string) => string): Previews {
  const inTurn = limitedTo(renderedAtOnce)
  const once = singleFlight<string>()
  const fileOf = (sha256: string, width: PreviewWidth) =>
    join(folder, sha256.slice(0, 2), `${sha256}-${width}.jpg`)

  return {
    file: async (sha256, width) => {
      const target = fileOf(sha256, width)
      if (existsSync(target)) return target
      return once(target, () => inTurn(() => make(pathOf(sha256), target, width)))
    },
    remove: (sha256) => {
      for (const width of previewWidths) rmSync(fileOf(sha256, width), { force: true })
    },
  }
}

async function make(photo: string, target: string, width: PreviewWidth): Promise<string> {
  await mkdir(dirname(target), { recursive: true })
  const building = `${target}.${randomBytes(6).toString('hex')}`
  try {
    await renderPreview(photo, building, width)
    await rename(building, target)
  } finally {
    await rm(building, { force: true })
  }
  return target
}
