import { heightRgb } from '@shared/look/height-scale'
import type { Figure } from '@shared/schemas/results'
import sharp from 'sharp'

/**
 * A height map as a picture, `sizePx` along its longer side, as photographed: low is dark, high is light, from the
 * lowest place to the highest. What isn't measured is clear.
 */
export async function drawMap(map: Figure['map'], sizePx: number): Promise<Buffer> {
  const { columns, rows } = map
  const longest = Math.max(columns, rows)
  const scale = sizePx / longest
  return sharp(colouredCells(map), { raw: { width: columns, height: rows, channels: 4 } })
    .resize({
      width: Math.max(1, Math.round(columns * scale)),
      height: Math.max(1, Math.round(rows * scale)),
      kernel: 'cubic',
      fit: 'fill',
    })
    .png()
    .toBuffer()
}

function colouredCells({ heightsNm }: Figure['map']): Buffer {
  const [low, high] = extent(heightsNm)
  const cells = Buffer.alloc(heightsNm.length * 4)
  heightsNm.forEach((height, i) => {
    if (height === null) return
    const share = high > low ? (height - low) / (high - low) : 0.5
    cells.set([...heightRgb(share), 255], i * 4)
  })
  return cells
}

function extent(heightsNm: Figure['map']['heightsNm']): [number, number] {
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (const height of heightsNm) {
    if (height === null) continue
    if (height < low) low = height
    if (height > high) high = height
  }
  return [low, high]
}
