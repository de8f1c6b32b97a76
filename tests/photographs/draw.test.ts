import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { darkBands } from './dark-bands'
import { drawPhotograph } from './draw'
import { encodePhotograph } from './encode'
import { randomScene } from './random-scenes'
import { plainScene, type Scene, type StoredFile, withPhotoWidth } from './scene'

function smallScene(): Scene {
  return withPhotoWidth(randomScene('grooved', 2), 400)
}

describe('a drawn photograph', () => {
  it('has the same bytes for the same scene', async () => {
    expect(await encodePhotograph(smallScene())).toEqual(await encodePhotograph(smallScene()))
  })

  it('is darkest on its dark bands', () => {
    const scene = plainScene('straight', 4)
    scene.surface = { ...scene.surface, dustCount: 0 }
    const { rgb, width } = drawPhotograph(scene)
    const redAt = (x: number, y: number) => rgb[3 * (Math.round(y) * width + Math.round(x))]
    const onBands = darkBands(scene).flatMap(({ points }) => points.map(([x, y]) => redAt(x, y)))
    const mean = onBands.reduce((sum, value) => sum + value, 0) / onBands.length
    expect(mean).toBeLessThan(0.2)
    expect(rgb.reduce((most, value) => Math.max(most, value), 0)).toBeGreaterThan(0.55)
  })

  it.each([2, 3, 4, 5, 6, 7, 8] as const)(
    'is shown upright from EXIF orientation %i',
    async (exifOrientation) => {
      const kept: Partial<StoredFile> = { format: 'jpeg', quality: 100, exifOrientation }
      const shown = await sharp(await encodePhotograph(smallScene(), kept))
        .autoOrient()
        .raw()
        .toBuffer({ resolveWithObject: true })
      const upright = await sharp(await encodePhotograph(smallScene(), { ...kept, exifOrientation: 1 }))
        .raw()
        .toBuffer()
      expect([shown.info.width, shown.info.height]).toEqual([400, 300])
      const off = shown.data.reduce((sum, value, i) => sum + Math.abs(value - upright[i]), 0) / upright.length
      expect(off).toBeLessThan(4)
    },
  )

  it.each([
    ['jpeg', 'uchar'],
    ['webp', 'uchar'],
    ['png8', 'uchar'],
    ['tiff8', 'uchar'],
    ['png16', 'ushort'],
  ] as const)('is kept as %s in %s values, in colour and in grey', async (format, depth) => {
    const colour = await sharp(await encodePhotograph(smallScene(), { format, colours: 'rgb' })).metadata()
    const grey = await sharp(await encodePhotograph(smallScene(), { format, colours: 'grey' })).metadata()
    expect([colour.width, colour.height, colour.depth, colour.channels]).toEqual([400, 300, depth, 3])
    expect(grey.depth).toBe(depth)
  })

  it('holds linear light in 16 bits', async () => {
    const scene = smallScene()
    const file = await encodePhotograph(scene, { format: 'png16', colours: 'rgb' })
    const { data } = await sharp(file)
      .toColourspace('rgb16')
      .raw({ depth: 'ushort' })
      .toBuffer({ resolveWithObject: true })
    const words = new Uint16Array(data.buffer, data.byteOffset, data.length / 2)
    const { rgb } = drawPhotograph(scene)
    for (let i = 0; i < words.length; i += 997) expect(words[i]).toBe(Math.round(65535 * rgb[i]))
  })
})
