import type { Figure } from '@shared/schemas/results'

export type StoredMap = Figure['map']

/** Heights on a grid with everything off the measured area filled from the nearest place, so that lines run out smoothly. */
export interface HeightField {
  columns: number
  rows: number
  heightsUm: Float64Array
  /** Share of each cell that is measured, 0 to 1. */
  coverage: Float64Array
  /** 1 where no trace is near. */
  unsupported: Uint8Array
  /** Holds the plane. */
  leastUm: number
  mostUm: number
}

export function heightField(map: StoredMap): HeightField {
  const { columns, rows, heightsNm } = map
  const heightsUm = Float64Array.from(heightsNm, (nm) => (nm ?? 0) / 1000)
  const measured = Uint8Array.from(heightsNm, (nm) => (nm === null ? 0 : 1))
  spreadOutwards(heightsUm, measured, columns, rows)
  return {
    columns,
    rows,
    heightsUm,
    coverage: Float64Array.from(measured, (flag, cell) => (map.coveragePercent?.[cell] ?? 100 * flag) / 100),
    unsupported: measured.map((flag, cell) => (flag === 1 && map.supported[cell] === 0 ? 1 : 0)),
    ...rangeOf(heightsNm),
  }
}

function rangeOf(heightsNm: StoredMap['heightsNm']): Pick<HeightField, 'leastUm' | 'mostUm'> {
  let leastNm = 0
  let mostNm = 0
  for (const nm of heightsNm) {
    if (nm === null) continue
    leastNm = Math.min(leastNm, nm)
    mostNm = Math.max(mostNm, nm)
  }
  if (leastNm === mostNm) return { leastUm: -0.001, mostUm: 0.001 }
  return { leastUm: leastNm / 1000, mostUm: mostNm / 1000 }
}

/** Ring by ring from the measured places: each place takes the height of the neighbour that reached it first. */
function spreadOutwards(heights: Float64Array, known: Uint8Array, columns: number, rows: number): void {
  const reached = known.slice()
  const queue = new Int32Array(reached.length)
  let end = 0
  for (let cell = 0; cell < reached.length; cell += 1) if (reached[cell] === 1) queue[end++] = cell
  const visit = (from: number, to: number) => {
    if (reached[to] === 1) return
    reached[to] = 1
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
  { columns, rows }: Pick<HeightField, 'columns' | 'rows'>,
  column: number,
  row: number,
): number {
  const c = Math.min(columns - 1, Math.max(0, column))
  const r = Math.min(rows - 1, Math.max(0, row))
  const c0 = Math.min(Math.max(columns - 2, 0), Math.floor(c))
  const r0 = Math.min(Math.max(rows - 2, 0), Math.floor(r))
  const c1 = Math.min(columns - 1, c0 + 1)
  const r1 = Math.min(rows - 1, r0 + 1)
  const across = c - c0
  const down = r - r0
  const top = values[r0 * columns + c0] * (1 - across) + values[r0 * columns + c1] * across
  const foot = values[r1 * columns + c0] * (1 - across) + values[r1 * columns + c1] * across
  return top * (1 - down) + foot * down
}
