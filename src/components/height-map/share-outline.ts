import { contours } from 'd3-contour'

interface GridSize {
  columns: number
  rows: number
}

/** So that an outline that touches the grid's edge closes. */
const pad = 1

/** Where the share of cells, 0 to 1, passes one half, as a path in canvas pixels; null where it never does. */
export function shareOutline(
  shares: ArrayLike<number>,
  { columns, rows }: GridSize,
  cellPx: number,
): Path2D | null {
  const width = columns + 2 * pad
  const height = rows + 2 * pad
  const padded = new Array<number>(width * height).fill(0)
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      padded[(row + pad) * width + column + pad] = shares[row * columns + column]
    }
  }
  const [outline] = contours().size([width, height]).thresholds([0.5])(padded)
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
