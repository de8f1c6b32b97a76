import type { Figure } from '@shared/schemas/results'

export type StoredMap = Figure['map']

/** Heights on a grid with everything off the measured area filled from the nearest place, so that lines run out smoothly. */
export interface HeightGridFilled {
  columns: number
  rows: number
  heightsUm: Float64Array
  /** Share of each cell that is measured, 0 to 1. */
  coverage: Float64Array
  /** 1 where no trace is near. */
  unsupported: Uint8Array
  leastUm: number
  mostUm: number
}

export function fillGrid(map: StoredMap): HeightGridFilled {
  const { columns, rows } = map
  const count = columns * rows
  const heightsUm = new Float64Array(count)
  const measured = new Uint8Array(count)
  const unsupported = new Uint8Array(count)
  let leastUm = Number.POSITIVE_INFINITY
  let mostUm = Number.NEGATIVE_INFINITY
  for (let cell = 0; cell < count; cell += 1) {
    const nm = map.heightsNm[cell]
    if (nm === null || nm === undefined) continue
    heightsUm[cell] = nm / 1000
    measured[cell] = 1
    unsupported[cell] = map.supported[cell] === 0 ? 1 : 0
    leastUm = Math.min(leastUm, nm / 1000)
    mostUm = Math.max(mostUm, nm / 1000)
  }
  spreadOutwards(heightsUm, measured, columns, rows)
  const coverage = Float64Array.from(map.heightsNm, (nm, cell) =>
    map.coveragePercent ? map.coveragePercent[cell] / 100 : nm === null ? 0 : 1,
  )
  const isEmpty = leastUm > mostUm
  return {
    columns,
    rows,
    heightsUm,
    coverage,
    unsupported,
    leastUm: isEmpty ? 0 : leastUm,
    mostUm: isEmpty ? 0 : mostUm,
  }
}

/** Ring by ring from the measured places: each place takes the height of the neighbour that reached it first. */
function spreadOutwards(heights: Float64Array, measured: Uint8Array, columns: number, rows: number): void {
  const known = measured.slice()
  const queue = new Int32Array(known.length)
  let end = 0
  for (let cell = 0; cell < known.length; cell += 1) if (known[cell] === 1) queue[end++] = cell
  const visit = (from: number, to: number) => {
    if (known[to] === 1) return
    known[to] = 1
    heights[to] = heights[from]
    queue[end++] = to
  }
  for (let head = 0; head < end; head += 1) {
    const cell = queue[head]
    const column = cell % columns
    if (column > 0) visit(cell, cell - 1)
    if (column < columns - 1) visit(cell, cell + 1)
    if (cell >= columns) visit(cell, cell - columns)
    if (cell < columns * (rows - 1)) visit(cell, cell + columns)
  }
}

/** Value at a place between grid places; beyond the rim of the grid the nearest counts. */
export function sampleGrid(
  values: ArrayLike<number>,
  columns: number,
  rows: number,
  column: number,
  row: number,
): number {
  const c = Math.min(columns - 1, Math.max(0, column))
  const r = Math.min(rows - 1, Math.max(0, row))
  const c0 = Math.min(Math.max(columns - 2, 0), Math.floor(c))
  const r0 = Math.min(Math.max(rows - 2, 0), Math.floor(r))
  const c1 = Math.min(columns - 1, c0 + 1)
  const r1 = Math.min(rows - 1, r0 + 1)
  const fc = c - c0
  const fr = r - r0
  const top = values[r0 * columns + c0] * (1 - fc) + values[r0 * columns + c1] * fc
  const foot = values[r1 * columns + c0] * (1 - fc) + values[r1 * columns + c1] * fc
  return top * (1 - fr) + foot * fr
}
