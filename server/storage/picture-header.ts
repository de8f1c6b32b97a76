import sharp from 'sharp'

/** What a picture's header says of it, EXIF orientation applied. */
export interface PictureHeader {
  format: string
  widthPx: number
  heightPx: number
  /** Per channel, as stored. */
  bitDepth: number
  channels: number
}

/** Reads the header only; null when sharp makes nothing of the file. */
export async function readPictureHeader(file: string): Promise<PictureHeader | null> {
  try {
    // The number of pixels is judged by whoever asks, with a sentence of its own.
    const found = await sharp(file, { limitInputPixels: false }).metadata()
    return {
      format: found.format === 'heif' && found.compression === 'av1' ? 'avif' : found.format,
      widthPx: found.autoOrient.width,
      heightPx: found.autoOrient.height,
      bitDepth: found.bitsPerSample ?? depthBits[found.depth] ?? 8,
      channels: found.channels,
    }
  } catch {
    return null
  }
}

const depthBits: Readonly<Record<string, number>> = { uchar: 8, ushort: 16, float: 32 }
