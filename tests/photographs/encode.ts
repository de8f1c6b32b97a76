import sharp, { type Sharp } from 'sharp'
import { brightestChannel, type DrawnPhotograph, drawPhotograph } from './draw'
import type { Scene, StoredFile } from './scene'

/** Pixels as they lie in the file: before the viewer turns them by the EXIF orientation. */
interface StoredPixels {
  width: number
  height: number
  channels: 1 | 3
  values: Float32Array
}

const GAMMA_STEPS = 1 << 14

/** sRGB code of each step of linear light, after a phone's contrast curve of the given strength. */
function srgbCodes(toneCurve: number): Uint8Array {
  return Uint8Array.from({ length: GAMMA_STEPS + 1 }, (_, step) => {
    const linear = step / GAMMA_STEPS
    const encoded = linear <= 0.0031308 ? 12.92 * linear : 1.055 * linear ** (1 / 2.4) - 0.055
    const contrasty = encoded * encoded * (3 - 2 * encoded)
    return Math.round(255 * (encoded + toneCurve * (contrasty - encoded)))
  })
}

/**
 * Where the pixel that a viewer shows at (x, y) of a width × height picture lies in the file, for each EXIF orientation; from 5 on
 * the file's width is the picture's height.
 */
const storedPlaces: Record<
  StoredFile['exifOrientation'],
  (x: number, y: number, width: number, height: number) => readonly [number, number]
> = {
  1: (x, y) => [x, y],
  2: (x, y, width) => [width - 1 - x, y],
  3: (x, y, width, height) => [width - 1 - x, height - 1 - y],
  4: (x, y, _, height) => [x, height - 1 - y],
  5: (x, y) => [y, x],
  6: (x, y, width) => [y, width - 1 - x],
  7: (x, y, width, height) => [height - 1 - y, width - 1 - x],
  8: (x, y, _, height) => [height - 1 - y, x],
}

function turnedForFile(photo: DrawnPhotograph, { exifOrientation }: StoredFile): DrawnPhotograph {
  if (exifOrientation === 1) return photo
  const isOnItsSide = exifOrientation >= 5
  const { width, height } = photo
  const storedWidth = isOnItsSide ? height : width
  const rgb = new Float32Array(photo.rgb.length)
  const storedPlace = storedPlaces[exifOrientation]
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const [storedX, storedY] = storedPlace(x, y, width, height)
      const from = 3 * (y * width + x)
      const to = 3 * (storedY * storedWidth + storedX)
      for (let channel = 0; channel < 3; channel++) rgb[to + channel] = photo.rgb[from + channel]
    }
  }
  return { width: storedWidth, height: isOnItsSide ? width : height, rgb }
}

function storedPixels(photo: DrawnPhotograph, scene: Scene): StoredPixels {
  const { width, height, rgb } = turnedForFile(photo, scene.file)
  if (scene.file.colours === 'rgb') return { width, height, channels: 3, values: rgb }
  const channel = brightestChannel(scene.lamp)
  const values = new Float32Array(width * height)
  for (let i = 0; i < values.length; i++) values[i] = rgb[3 * i + channel]
  return { width, height, channels: 1, values }
}

function eightBits({ width, height, channels, values }: StoredPixels, scene: Scene): Sharp {
  const codes = srgbCodes(scene.sensor.toneCurve)
  const bytes = new Uint8Array(values.length)
  for (let i = 0; i < values.length; i++) bytes[i] = codes[Math.round(values[i] * GAMMA_STEPS)]
  return sharp(bytes, { raw: { width, height, channels } })
}

function sixteenBits({ width, height, channels, values }: StoredPixels): Sharp {
  const words = new Uint16Array(values.length)
  for (let i = 0; i < values.length; i++) words[i] = Math.round(values[i] * 65535)
  return sharp(words, { raw: { width, height, channels } }).toColourspace(channels === 1 ? 'grey16' : 'rgb16')
}

function inFormat(pixels: StoredPixels, scene: Scene): Sharp {
  const { format, quality } = scene.file
  switch (format) {
    case 'jpeg':
      return eightBits(pixels, scene).jpeg({ quality })
    case 'webp':
      return eightBits(pixels, scene).webp({ quality })
    case 'png8':
      return eightBits(pixels, scene).png({ compressionLevel: 4 })
    case 'tiff8':
      return eightBits(pixels, scene).tiff({ compression: 'lzw' })
    case 'png16':
      return sixteenBits(pixels).png({ compressionLevel: 4 })
    default:
      throw new Error(`No photograph is kept as ${format satisfies never}.`)
  }
}

/**
 * The file of a scene's photograph, as the scene says it is kept; `kept` overrides parts of that. Orientations other than 1 are
 * written into the file's EXIF data, its pixels turned so that a viewer shows the scene upright.
 */
export async function encodePhotograph(scene: Scene, kept: Partial<StoredFile> = {}): Promise<Buffer> {
  const asKept: Scene = { ...scene, file: { ...scene.file, ...kept } }
  const pixels = storedPixels(drawPhotograph(asKept), asKept)
  const file = inFormat(pixels, asKept)
  const { exifOrientation } = asKept.file
  if (exifOrientation !== 1) file.withMetadata({ orientation: exifOrientation })
  return file.toBuffer()
}
