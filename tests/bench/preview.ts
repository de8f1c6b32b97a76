import { Readable } from 'node:stream'
import sharp from 'sharp'
import { createPhotoStorage } from '../../server/storage/photo-storage'
import { type Measurement, measurement } from './measurement'
import { percentile, timesOf } from './timing'

const rounds = 5
const warmUp = 1

/** The preview of a 12-megapixel JPEG that nobody has asked for before. */
export async function benchPreview(folder: string): Promise<Measurement> {
  const storage = createPhotoStorage({ dir: folder })
  const kept: string[] = []
  for (let i = 0; i < rounds + warmUp; i++) {
    const file = await storage.receive(Readable.from([await bandedJpeg(i)]))
    storage.keep(file)
    kept.push(file.sha256)
  }
  const times = await timesOf((round) => storage.preview(kept[round], 1280), { rounds, warmUp })
  return measurement('preview of a 12-megapixel JPEG', percentile(times, 0.5), 400)
}

/** Bands with a little grain, which is what keeps a JPEG of them large. */
function bandedJpeg(phase: number): Promise<Buffer> {
  const [width, height] = [4000, 3000]
  const data = Buffer.alloc(width * height * 3)
  let grain = 12_345 + phase
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      grain = (grain * 1_103_515_245 + 12_345) & 0x7fffffff
      const level = 128 + 90 * Math.cos((y + (x * x) / 9000) / 30 + phase) + (grain >> 16) / 3000 - 5
      data.fill(Math.max(0, Math.min(255, level)), (y * width + x) * 3, (y * width + x) * 3 + 3)
    }
  }
  return sharp(data, { raw: { width, height, channels: 3 } })
    .jpeg({ quality: 92 })
    .toBuffer()
}
