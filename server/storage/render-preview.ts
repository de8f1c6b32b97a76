import sharp from 'sharp'
import { mostPixels } from './photo-limits'

const quality = { reduced: 82, full: 92 }

/**
 * A JPEG of the photograph, turned as EXIF says, in sRGB or grey. sharp works in threads of its own, and passes on
 * nothing of the file but its picture: no place, no camera, no date.
 */
export async function renderPreview(photo: string, target: string, width: number | 'full'): Promise<void> {
  const picture = sharp(photo, { limitInputPixels: mostPixels, failOn: 'error', sequentialRead: true })
  const turned = picture.autoOrient()
  const sized = width === 'full' ? turned : turned.resize({ width, withoutEnlargement: true })
  await sized
    .flatten({ background: '#ffffff' })
    .jpeg({ quality: width === 'full' ? quality.full : quality.reduced })
    .toFile(target)
}
