import { contours } from 'd3-contour'

interface GridSize {
  columns: number
  rows: number
}

/** Room for the blur, and so that an outline that touches the grid's edge closes. */
const pad = 6
const passes = 2
/** Binomial weights: steps of the grid become a curve, straight edges stay where they are. */
const weights = [1 / 16, 4 / 16, 6 / 16, 4 / 16, 1 / 16]

/**
 * The outline of the places where `mask` is 1, as a path in canvas pixels; null where there are none. `smooth`
 * rounds the grid's steps off, and loses places of a step or less.
 */
export function maskOutline(
  mask: Uint8Array,
  { columns, rows }: GridSize,
  cellPx: number,
  smooth: boolean,
): Path2D | null {
  const width = columns + 2 * pad
  const height = rows + 2 * pad
  const padded = new Float64Array(width * height)
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      padded[(row + pad) * width + column + pad] = mask[row * columns + column]
    }
  }
  let values: Float64Array = padded
  for (let pass = 0; smooth && pass < passes; pass += 1) {
    values = blurred(blurred(values, width, height, 1), width, height, width)
  }
  const [outline] = contours().size([width, height]).thresholds([0.5])(Array.from(values))
  if (outline.coordinates.length === 0) return null
  const path = new Path2D()
  for (const polygon of outline.coordinates) {
    for (const ring of polygon) {
      ring.forEach(([x, y], i) => {
        const xPx = (x - pad) * cellPx
        const yPx = (y - pad) * cellPx
        if (i === 0) path.moveTo(xPx, yPx)
        else path.lineTo(xPx, yPx)
      })
      path.closePath()
    }
  }
  return path
}

/** Along rows for a `stride` of 1, down columns for the width. The padding is wide enough to leave its edge at 0. */
function blurred(values: Float64Array, width: number, height: number, stride: number): Float64Array {
  const out = new Float64Array(values.length)
  for (let row = 2; row < height - 2; row += 1) {
    for (let column = 2; column < width - 2; column += 1) {
      const at = row * width + column
      let sum = 0
      for (let k = -2; k <= 2; k += 1) sum += weights[k + 2] * values[at + k * stride]
      out[at] = sum
    }
  }
  return out
}
