import type { MapGrid } from './measured-area'
import type { TracedPoints } from './traced-points'

/**
 * Which places of the map the traces support: those no farther than one band spacing from a click, the spacing
 * being that at the click (1 ÷ slope of the gap there). The nearest click of every cell is found by sweeping
 * the grid to and fro, exact to a cell.
 *
 * @param spacingMm band spacing at each click, mm
 */
export function supportedPlaces(grid: MapGrid, points: TracedPoints, spacingMm: Float64Array): Uint8Array {
  const { columns, rows, stepMm, x0Mm, y0Mm } = grid
  const nearest = new Int32Array(columns * rows).fill(-1)
  const distance = new Float64Array(columns * rows).fill(Number.POSITIVE_INFINITY)
  // A click counts by how far inside its own spacing a place lies: distance ÷ spacing.
  const offer = (cell: number, click: number) => {
    const x = x0Mm + (cell % columns) * stepMm
    const y = y0Mm + Math.floor(cell / columns) * stepMm
    const dx = x - points.xMm[click]!
    const dy = y - points.yMm[click]!
    const d = Math.sqrt(dx * dx + dy * dy) / spacingMm[click]!
    if (d >= distance[cell]!) return
    distance[cell] = d
    nearest[cell] = click
  }
  for (let i = 0; i < points.count; i++) {
    const c = Math.round((points.xMm[i]! - x0Mm) / stepMm)
    const r = Math.round((points.yMm[i]! - y0Mm) / stepMm)
    if (c >= 0 && c < columns && r >= 0 && r < rows) offer(r * columns + c, i)
  }
  const spread = (cell: number, from: number) => {
    if (nearest[from]! >= 0) offer(cell, nearest[from]!)
  }
  for (let sweep = 0; sweep < 2; sweep++) {
    for (let r = 0; r < rows; r++) {
      for (let c = 0; c < columns; c++) {
        const cell = r * columns + c
        if (c > 0) spread(cell, cell - 1)
        if (r > 0) spread(cell, cell - columns)
        if (r > 0 && c > 0) spread(cell, cell - columns - 1)
        if (r > 0 && c + 1 < columns) spread(cell, cell - columns + 1)
      }
    }
    for (let r = rows - 1; r >= 0; r--) {
      for (let c = columns - 1; c >= 0; c--) {
        const cell = r * columns + c
        if (c + 1 < columns) spread(cell, cell + 1)
        if (r + 1 < rows) spread(cell, cell + columns)
        if (r + 1 < rows && c + 1 < columns) spread(cell, cell + columns + 1)
        if (r + 1 < rows && c > 0) spread(cell, cell + columns - 1)
      }
    }
  }
  const supported = new Uint8Array(columns * rows)
  // Half a cell more, since places are known to a cell only.
  for (const cell of grid.index) {
    const click = nearest[cell]!
    if (click >= 0 && distance[cell]! <= 1 + (0.71 * stepMm) / spacingMm[click]!) supported[cell] = 1
  }
  return supported
}
