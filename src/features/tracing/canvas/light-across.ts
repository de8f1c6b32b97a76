/** A square of grey values, 0 to 255, row by row. */
export interface Patch {
  size: number
  grey: Float32Array
}

export function patchOf(image: ImageData): Patch {
  const { width: size, data } = image
  const grey = new Float32Array(size * size)
  for (let i = 0; i < grey.length; i += 1) {
    grey[i] = 0.299 * data[4 * i] + 0.587 * data[4 * i + 1] + 0.114 * data[4 * i + 2]
  }
  return { size, grey }
}

/**
 * The direction square to the bands in a patch, radians from x towards y: the larger axis of the structure tensor
 * (mean of the gradients' products).
 */
export function acrossBands({ size, grey }: Patch): number {
  let [xx, xy, yy] = [0, 0, 0]
  for (let y = 1; y < size - 1; y += 1) {
    for (let x = 1; x < size - 1; x += 1) {
      const at = y * size + x
      const gx = grey[at + 1] - grey[at - 1]
      const gy = grey[at + size] - grey[at - size]
      xx += gx * gx
      xy += gx * gy
      yy += gy * gy
    }
  }
  return 0.5 * Math.atan2(2 * xy, xx - yy)
}

/** Half the width, px, over which light is averaged along the band. */
const alongPx = 2

/** Light along a line through the middle of the patch, averaged a little to its side; `reach` px either way. */
export function lightAcross(patch: Patch, angleRad: number, reach: number, places = 61): number[] {
  const [ux, uy] = [Math.cos(angleRad), Math.sin(angleRad)]
  const middle = (patch.size - 1) / 2
  return Array.from({ length: places }, (_, i) => {
    const s = (i / (places - 1)) * 2 * reach - reach
    let sum = 0
    for (let k = -alongPx; k <= alongPx; k += 1)
      sum += sample(patch, middle + s * ux - k * uy, middle + s * uy + k * ux)
    return sum / (2 * alongPx + 1)
  })
}

function sample({ size, grey }: Patch, x: number, y: number): number {
  const cx = Math.min(size - 1.001, Math.max(0, x))
  const cy = Math.min(size - 1.001, Math.max(0, y))
  const [x0, y0] = [Math.floor(cx), Math.floor(cy)]
  const [fx, fy] = [cx - x0, cy - y0]
  const at = y0 * size + x0
  const top = grey[at] * (1 - fx) + grey[at + 1] * fx
  const foot = grey[at + size] * (1 - fx) + grey[at + size + 1] * fx
  return top * (1 - fy) + foot * fy
}
