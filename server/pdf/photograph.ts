import sharp from 'sharp'

export interface PagePicture {
  /** Data URL. */
  source: string
  widthPx: number
  heightPx: number
}

/** Sharp at 300 dots an inch over the width that the page gives it, with as much again for what is cut off. */
const mostPx = 1400
const quality = 82

/** The stored photograph as the page holds it: turned as EXIF says, reduced, nothing but its picture. */
export async function photographForPage(photo: Buffer): Promise<PagePicture> {
  const { data, info } = await sharp(photo)
    .autoOrient()
    .resize({ width: mostPx, height: mostPx, fit: 'inside', withoutEnlargement: true })
    .flatten({ background: '#ffffff' })
    .toColourspace('srgb')
    .jpeg({ quality })
    .toBuffer({ resolveWithObject: true })
  return {
    source: `data:image/jpeg;base64,${data.toString('base64')}`,
    widthPx: info.width,
    heightPx: info.height,
  }
}
