import type { Figure } from '../schemas/results'

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

/**
 * A stored map ready to be drawn: heights in µm at every place of its grid, and which share of each cell is measured.
 * A map without a measured place has heights of 0 and a range about them.
 */
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

/** So many rings beyond the rim go on as steeply as the surface arrives there: what is seen near the rim is between them. */
const slopedRings = 3

function spreadOutwards(heights: Float64Array, measured: Uint8Array, columns: number, rows: number): void {
  const reached = measured.slice()
  let edge = Array.from(reached.keys()).filter((cell) => reached[cell] === 1)
  for (let ring = 0; edge.length > 0; ring += 1) {
    const next = new Set<number>()
    for (const cell of edge) {
      for (const to of neighbours(cell, columns, rows)) if (reached[to] === 0) next.add(to)
    }
    const isSloped = ring < slopedRings
    const found = Array.from(next, (cell) => continued(heights, reached, cell, columns, rows, isSloped))
    edge = Array.from(next)
    edge.forEach((cell, i) => {
      heights[cell] = found[i]
      reached[cell] = 1
    })
  }
}

function neighbours(cell: number, columns: number, rows: number): number[] {
  const column = cell % columns
  return [
    ...(column > 0 ? [cell - 1] : []),
    ...(column < columns - 1 ? [cell + 1] : []),
    ...(cell >= columns ? [cell - columns] : []),
    ...(cell < columns * (rows - 1) ? [cell + columns] : []),
  ]
}

/** Mean of what the reached neighbours say: each carried on by its slope from the one behind it, where that is known. */
function continued(
  heights: Float64Array,
  reached: Uint8Array,
  cell: number,
  columns: number,
  rows: number,
  isSloped: boolean,
): number {
  let sum = 0
  let count = 0
  for (const near of neighbours(cell, columns, rows)) {
    if (reached[near] === 0) continue
    const behind = 2 * near - cell
    const isKnown = isSloped && neighbours(near, columns, rows).includes(behind) && reached[behind] === 1
    sum += isKnown ? 2 * heights[near] - heights[behind] : heights[near]
    count += 1
  }
  return sum / count
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
