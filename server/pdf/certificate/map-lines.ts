import { type HeightField, heightField } from '@shared/look/height-field'
import { niceStep } from '@shared/look/rule-scale'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { contours } from 'd3-contour'
import { linePath, type Point } from './paths'
import { trueRim } from './true-rim'

/** Lines of a map in cells of its grid, from the grid's top left corner. */
type Lines = readonly (readonly Point[])[]

/** All lines of a map, found once however often the page is composed. */
export interface MapSurface {
  field: HeightField
  /** Where half of a cell is measured; none on a map of nothing. */
  rim: Lines
  unsupported: Lines
  contours: readonly { valueUm: number; isPlane: boolean; lines: Lines }[]
}

/** A grid's rim lies no farther than this from the true one, but at a corner. */
const rimReachCells = 0.75

export interface GridPlace {
  x: number
  y: number
  /** Units per cell. */
  cell: number
}

export function mapSurface(snapshot: CertificateSnapshot): MapSurface {
  const { map } = snapshot.figure
  const field = heightField(map)
  const onRim = onTrueRim(snapshot)
  return {
    field,
    rim: outlineOf(field.coverage, field).map((line) => line.map(onRim)),
    unsupported: field.unsupported.includes(1) ? outlineOf(field.unsupported, field) : [],
    contours: contoursOf(field),
  }
}

/** Cells to mm and back. */
function onTrueRim(snapshot: CertificateSnapshot): (place: Point) => Point {
  const { x0Mm, y0Mm, stepMm } = snapshot.figure.map
  const snap = trueRim(snapshot, rimReachCells * stepMm)
  return ([column, row]) => {
    const [xMm, yMm] = snap([x0Mm + (column - 0.5) * stepMm, y0Mm + (row - 0.5) * stepMm])
    return [(xMm - x0Mm) / stepMm + 0.5, (yMm - y0Mm) / stepMm + 0.5]
  }
}

/** Path of lines that stand on the sheet at a place. */
export function linesPath(lines: Lines, { x, y, cell }: GridPlace, closed = false): string {
  return lines
    .map((line) =>
      linePath(
        line.map(([column, row]): Point => [x + column * cell, y + row * cell]),
        closed,
      ),
    )
    .join('')
}

/** About twelve contours over the heights, in steps of 1, 2 or 5. */
function contoursOf(field: HeightField): MapSurface['contours'] {
  const { leastUm, mostUm, columns, rows } = field
  const step = niceStep((mostUm - leastUm) / 12)
  const first = Math.ceil(leastUm / step)
  const last = Math.floor(mostUm / step)
  const levels = Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * step)
  const onEdge = ([x, y]: number[]) => x <= 0 || y <= 0 || x >= columns || y >= rows
  return contours()
    .size([columns, rows])
    .thresholds(levels)(withoutSteps(field))
    .map(({ value, coordinates }) => ({
      valueUm: value,
      isPlane: Math.abs(value) < step / 2,
      lines: coordinates.flat().flatMap((ring) => partsOff(ring, onEdge)),
    }))
}

/** The heights are kept in whole nanometres, and lines of gentle slopes would follow those steps: a quarter of each neighbour's. */
function withoutSteps({ heightsUm, columns, rows }: HeightField): number[] {
  const at = (values: ArrayLike<number>, y: number, x: number) =>
    values[Math.min(rows - 1, Math.max(0, y)) * columns + Math.min(columns - 1, Math.max(0, x))]
  const along = Array.from(heightsUm, (um, cell) => {
    const [y, x] = [Math.floor(cell / columns), cell % columns]
    return um / 2 + (at(heightsUm, y, x - 1) + at(heightsUm, y, x + 1)) / 4
  })
  return along.map((um, cell) => {
    const [y, x] = [Math.floor(cell / columns), cell % columns]
    return um / 2 + (at(along, y - 1, x) + at(along, y + 1, x)) / 4
  })
}

/** d3-contour closes its rings along the grid's edge; those stretches are no contour. */
function partsOff(ring: number[][], onEdge: (place: number[]) => boolean): Point[][] {
  const parts: Point[][] = [[]]
  ring.forEach((place, i) => {
    if (i > 0 && onEdge(place) && onEdge(ring[i - 1])) parts.push([])
    parts[parts.length - 1].push([place[0], place[1]])
  })
  return parts.filter(({ length }) => length > 1)
}

/** So that an outline that touches the grid's edge closes. */
const pad = 1

/** Where the share of cells, 0 to 1, passes one half. */
function outlineOf(shares: ArrayLike<number>, { columns, rows }: HeightField): Point[][] {
  const width = columns + 2 * pad
  const height = rows + 2 * pad
  const padded = new Array<number>(width * height).fill(0)
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      padded[(row + pad) * width + column + pad] = shares[row * columns + column]
    }
  }
  const [outline] = contours().size([width, height]).thresholds([0.5])(padded)
  return outline.coordinates
    .flat()
    .map((ring) => ring.slice(0, -1).map(([x, y]): Point => [x - pad, y - pad]))
}
