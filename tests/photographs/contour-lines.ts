/** A line through a grid: places in grid units (columns, rows), the first again at the end where it closes. */
export interface GridLine {
  places: [column: number, row: number][]
  closed: boolean
}

export interface Grid {
  columns: number
  rows: number
  values: Float64Array
}

/**
 * Lines of equal value by marching squares, joined end to end.
 *
 *   a ─0─ b      Every cell side that the level crosses has a number of its own in the whole grid, so segments of
 *   3     1      neighbouring cells join without comparing places.
 *   d ─2─ c
 */
export function contourLines(grid: Grid, level: number): GridLine[] {
  const neighbours = crossedSides(grid, level)
  const lines: GridLine[] = []
  const visited = new Set<number>()
  const ends = [...neighbours].filter(([, next]) => next.length === 1).map(([side]) => side)
  for (const start of [...ends, ...neighbours.keys()]) {
    if (visited.has(start)) continue
    const sides = followed(neighbours, start, visited)
    const last = sides[sides.length - 1]
    const closed = sides.length > 2 && (neighbours.get(last)?.includes(start) ?? false)
    if (closed) sides.push(start)
    lines.push({ places: sides.map((side) => crossing(grid, level, side)), closed })
  }
  return lines
}

const topSide = (cell: number) => 2 * cell
const leftSide = (cell: number) => 2 * cell + 1

/** For every crossed side the one or two sides to which the level runs on from it. */
function crossedSides({ columns, rows, values }: Grid, level: number): Map<number, number[]> {
  const neighbours = new Map<number, number[]>()
  const link = (from: number, to: number) => {
    neighbours.set(from, [...(neighbours.get(from) ?? []), to])
    neighbours.set(to, [...(neighbours.get(to) ?? []), from])
  }
  for (let row = 0; row < rows - 1; row++) {
    for (let column = 0; column < columns - 1; column++) {
      const cell = row * columns + column
      const a = values[cell] > level
      const b = values[cell + 1] > level
      const c = values[cell + columns + 1] > level
      const d = values[cell + columns] > level
      if (a === b && b === c && c === d) continue
      const sides: number[] = []
      if (a !== b) sides.push(topSide(cell))
      if (b !== c) sides.push(leftSide(cell + 1))
      if (c !== d) sides.push(topSide(cell + columns))
      if (d !== a) sides.push(leftSide(cell))
      if (sides.length === 2) {
        link(sides[0], sides[1])
        continue
      }
      // All four sides: the cell's mean tells which corners are joined.
      const mean = (values[cell] + values[cell + 1] + values[cell + columns] + values[cell + columns + 1]) / 4
      const joinsAWithC = mean > level === a
      link(sides[0], joinsAWithC ? sides[1] : sides[3])
      link(sides[2], joinsAWithC ? sides[3] : sides[1])
    }
  }
  return neighbours
}

function followed(neighbours: Map<number, number[]>, start: number, visited: Set<number>): number[] {
  const sides: number[] = []
  let side: number | undefined = start
  while (side !== undefined) {
    visited.add(side)
    sides.push(side)
    side = neighbours.get(side)?.find((next) => !visited.has(next))
  }
  return sides
}

function crossing({ columns, values }: Grid, level: number, side: number): [number, number] {
  const cell = side >> 1
  const other = side % 2 === 0 ? cell + 1 : cell + columns
  const t = (level - values[cell]) / (values[other] - values[cell])
  const column = cell % columns
  const row = (cell - column) / columns
  return side % 2 === 0 ? [column + t, row] : [column, row + t]
}
