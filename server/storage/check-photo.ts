import { fileTypeFromFile } from 'file-type'
import sharp from 'sharp'
import { AppError } from '../errors'
import type { ReceivedFile } from './incoming'
import { mostPixels } from './photo-limits'
import { type PictureHeader, readPictureHeader } from './picture-header'

/** By what stands in the file; its name and what the browser says of it count nothing. */
const takenTypes = new Set(['image/jpeg', 'image/png', 'image/webp', 'image/tiff', 'image/avif'])

/** What a received file is as a photograph, or the sentence for why it can't be one. */
export async function checkPhoto(file: ReceivedFile): Promise<PictureHeader> {
  if (file.bytes === 0) throw new AppError('brokenFile', { say: { key: 'photo.empty' } })
  const type = await fileTypeFromFile(file.path)
  if (!type || !takenTypes.has(type.mime)) throw new AppError('wrongFileType')
  const header = await readPictureHeader(file.path)
  if (!header) throw new AppError('brokenFile')
  const megapixels = (header.widthPx * header.heightPx) / 1e6
  if (megapixels * 1e6 > mostPixels) {
    const params = { megapixels: Math.ceil(megapixels), most: mostPixels / 1e6 }
    throw new AppError('tooManyPixels', { say: { key: 'photo.tooManyPixels', params } })
  }
  await assertWhole(file.path)
  return header
}

/** A header is easily right on half a file: only reading it to its end shows that all of it is there. */
async function assertWhole(path: string): Promise<void> {
  try {
    await sharp(path, { limitInputPixels: mostPixels, failOn: 'error', sequentialRead: true })
      .resize({ width: 64, height: 64, fit: 'inside' })
      .raw()
      .toBuffer()
  } catch (error) {
    throw new AppError('brokenFile', { log: (error as Error).message })
  }
}
