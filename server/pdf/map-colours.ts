import { heightField, type StoredMap, sampleGrid } from '@shared/look/height-field'
import { heightRgb } from '@shared/look/height-scale'
import sharp from 'sharp'
import type { PagePicture } from './photograph'

/** Along the longer side: 300 dots an inch in print. */
const longestPx = 620

/**
 * The colours of a height map over its whole grid, filled beyond the rim: the page keeps it within the rim's own
 * line, which stays sharp.
 */
export async function drawMapColours(map: StoredMap): Promise<PagePicture> {
  const field = heightField(map)
  const scale = longestPx / Math.max(field.columns, field.rows)
  const widthPx = Math.max(1, Math.round(field.columns * scale))
  const heightPx = Math.max(1, Math.round(field.rows * scale))
  const span = field.mostUm - field.leastUm
  const colours = Buffer.alloc(widthPx * heightPx * 3)
  for (let y = 0, at = 0; y < heightPx; y += 1) {
    const row = ((y + 0.5) / heightPx) * field.rows - 0.5
    for (let x = 0; x < widthPx; x += 1, at += 3) {
      const column = ((x + 0.5) / widthPx) * field.columns - 0.5
      const um = sampleGrid(field.heightsUm, field, column, row)
      const [r, g, b] = heightRgb((um - field.leastUm) / span)
      colours[at] = r
      colours[at + 1] = g
      colours[at + 2] = b
    }
  }
  const png = await sharp(colours, { raw: { width: widthPx, height: heightPx, channels: 3 } })
    .png({ compressionLevel: 9, adaptiveFiltering: true })
    .toBuffer()
  return { source: `data:image/png;base64,${png.toString('base64')}`, widthPx, heightPx }
}
