import type { PartFrame } from '../geometry/part-frame'
import type { Shape } from '../schemas/shapes'
import { acrossMmOf } from './face-basis'
import {
  connectedParts,
  forEachRimPixel,
  pixelCount,
  polygonSpans,
  type RowSpans,
  rowOf,
  spansHold,
  spansLess,
} from './row-spans'
import type { TracedReading } from './types'

type Place = readonly [number, number]
type Places = readonly Place[]

/** The measured area of one photograph: the pixels inside the outline, less edge band, less leave-outs. */
export interface MeasuredArea {
  readonly pixels: RowSpans
  readonly frame: PartFrame
  readonly areaMm2: number
  /** Number of pixels in each land, a land being what a groove doesn't cut through; largest first. */
  readonly landPixels: readonly number[]
}

/** Corners of the polygon that stands for a circle: its sides stay within 0.01 px of a circle of 500 px. */
const CIRCLE_CORNERS = 720
/** Lands smaller than this share of the area are crumbs at a leave-out's corner, not lands. */
const CRUMB_SHARE = 0.01

/** The measured area of a reading (`metrology`: face outline, less the edge band, less leave-outs). */
export function measuredArea(
  reading: Pick<TracedReading, 'outline' | 'size' | 'exclusions' | 'edgeBandMm'>,
  frame: PartFrame,
): MeasuredArea {
  let pixels = polygonSpans(toPhoto(insetOutlineMm(reading, frame), frame))
  for (const shape of reading.exclusions) {
    pixels = spansLess(pixels, polygonSpans(exclusionCorners(shape, reading.edgeBandMm, frame)))
  }
  const { pixels: landPixels } = connectedParts(pixels)
  const total = pixelCount(pixels)
  return {
    pixels,
    frame,
    areaMm2: areaOf(pixels, frame),
    landPixels: landPixels.filter((n) => n > CRUMB_SHARE * total).sort((a, b) => b - a),
  }
}

/** Whether a place of the photograph is measured. */
export function isMeasured(area: MeasuredArea, xPx: number, yPx: number): boolean {
  return spansHold(area.pixels, xPx, yPx)
}

function toPhoto(cornersMm: Places, frame: PartFrame): Places {
  return cornersMm.map(([x, y]) => frame.toPx(x, y))
}

function insetOutlineMm(
  { outline, size, edgeBandMm }: Pick<TracedReading, 'outline' | 'size' | 'edgeBandMm'>,
  frame: PartFrame,
): Places {
  if (outline.kind === 'polygon') {
    return insetPolygon(
      outline.points.map(([x, y]) => frame.toMm(x, y)),
      edgeBandMm,
    )
  }
  return circleCorners(0, 0, acrossMmOf({ size }) / 2 - edgeBandMm)
}

function circleCorners(cx: number, cy: number, radius: number): Places {
  if (radius <= 0) return []
  return Array.from({ length: CIRCLE_CORNERS }, (_, k) => {
    const angle = (2 * Math.PI * (k + 0.5)) / CIRCLE_CORNERS
    return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)] as const
  })
}

/** A bore's edge band lies round it; a slot or port (polygon) has none. */
function exclusionCorners(shape: Shape, edgeBandMm: number, frame: PartFrame): Places {
  if (shape.kind === 'polygon') return shape.points
  return toPhoto(
    insetPolygon(
      roundCorners(shape).map(([x, y]) => frame.toMm(x, y)),
      -edgeBandMm,
    ),
    frame,
  )
}

function roundCorners(shape: Exclude<Shape, { kind: 'polygon' }>): Places {
  if (shape.kind === 'circle') return circleCorners(shape.cx, shape.cy, shape.r)
  const turn = (shape.rotationDeg * Math.PI) / 180
  return circleCorners(0, 0, 1).map(([u, v]) => {
    const x = shape.rx * u
    const y = shape.ry * v
    return [
      shape.cx + x * Math.cos(turn) - y * Math.sin(turn),
      shape.cy + x * Math.sin(turn) + y * Math.cos(turn),
    ]
  })
}

/**
 * The polygon with every side moved inwards by a distance (outwards when negative), corners mitred; no corners when
 * nothing is left of it.
 */
export function insetPolygon(corners: Places, distance: number): Places {
  if (distance === 0) return corners
  const n = corners.length
  const inward = Math.sign(signedArea(corners)) || 1
  const inset = corners.map((corner, i) => {
    const [ax, ay] = unit(corners[(i + n - 1) % n]!, corner)
    const [bx, by] = unit(corner, corners[(i + 1) % n]!)
    // Sum of the two unit normals, scaled so that its part along either normal is the distance.
    const nx = -(ay + by) * inward
    const ny = (ax + bx) * inward
    const scale = distance / Math.max(0.1, 1 + ax * bx + ay * by)
    return [corner[0] + nx * scale, corner[1] + ny * scale] as const
  })
  return isTurnedInsideOut(corners, inset) ? [] : inset
}

/** Sides moved past one another: the winding turns over, or every side runs the other way. */
function isTurnedInsideOut(before: Places, after: Places): boolean {
  if (signedArea(before) * signedArea(after) <= 0) return true
  return before.every((corner, i) => {
    const k = (i + 1) % before.length
    const [ax, ay] = unit(corner, before[k]!)
    const [bx, by] = unit(after[i]!, after[k]!)
    return ax * bx + ay * by < 0
  })
}

function signedArea(corners: Places): number {
  let doubled = 0
  for (let i = 0, j = corners.length - 1; i < corners.length; j = i++) {
    doubled += corners[j]![0] * corners[i]![1] - corners[i]![0] * corners[j]![1]
  }
  return doubled / 2
}

function unit(from: readonly [number, number], to: readonly [number, number]): readonly [number, number] {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1
  return [(to[0] - from[0]) / length, (to[1] - from[1]) / length]
}

/** A homography keeps straight lines straight, so that a row of pixels is a quadrangle on the part as well. */
function areaOf(pixels: RowSpans, frame: PartFrame): number {
  let area = 0
  pixels.rows.forEach((spans, i) => {
    const y = pixels.firstRow + i
    for (let k = 0; k < spans.length; k += 2) {
      const [left, right] = [spans[k]! - 0.5, spans[k + 1]! + 0.5]
      area += quadrangleArea(
        frame.toMm(left, y - 0.5),
        frame.toMm(right, y - 0.5),
        frame.toMm(right, y + 0.5),
        frame.toMm(left, y + 0.5),
      )
    }
  })
  return area
}

/** Half the cross product of its diagonals. */
function quadrangleArea(a: Place, b: Place, c: Place, d: Place): number {
  return Math.abs((c[0] - a[0]) * (d[1] - b[1]) - (c[1] - a[1]) * (d[0] - b[0])) / 2
}

/**
 * Places at which the figures are taken: an even grid of pixels that stand for the area (their weights are
 * mm²), then pixels along every rim of it (weight 0), since the extremes of saddles and blocks sit there and a
 * coarse grid loses 0.01 to 0.02 band.
 */
export interface MeasuredPlaces {
  readonly count: number
  readonly interiorCount: number
  readonly xPx: Float64Array
  readonly yPx: Float64Array
  readonly xMm: Float64Array
  readonly yMm: Float64Array
  readonly weightMm2: Float64Array
}

const INTERIOR_PLACES = 1600
const RIM_PLACES = 4000

/** Grid and rim places of the area; empty when nothing is measured. */
export function measuredPlaces(area: MeasuredArea): MeasuredPlaces {
  const { pixels, frame } = area
  const xs: number[] = []
  const ys: number[] = []
  const step = Math.max(1, Math.round(Math.sqrt(pixelCount(pixels) / INTERIOR_PLACES)))
  // Anchored to the area itself, so that a face shifted in the photograph is sampled alike.
  const half = step >> 1
  const left = pixels.rows.reduce(
    (least, spans) => Math.min(least, spans[0] ?? least),
    Number.POSITIVE_INFINITY,
  )
  pixels.rows.forEach((spans, i) => {
    const y = pixels.firstRow + i
    if (i % step !== half) return
    for (let k = 0; k < spans.length; k += 2) {
      const first = spans[k]! + ((((left + half - spans[k]!) % step) + step) % step)
      for (let x = first; x <= spans[k + 1]!; x += step) {
        xs.push(x)
        ys.push(y)
      }
    }
  })
  const interiorCount = xs.length
  const rim: [number, number][] = []
  forEachRimPixel(pixels, (x, y) => rim.push([x, y]))
  const stride = Math.max(1, rim.length / RIM_PLACES)
  for (let k = 0; k < rim.length; k += stride) {
    const [x, y] = rim[Math.floor(k)]!
    xs.push(x)
    ys.push(y)
  }
  return placesAt(xs, ys, interiorCount, step, frame)
}

function placesAt(
  xs: number[],
  ys: number[],
  interiorCount: number,
  step: number,
  frame: PartFrame,
): MeasuredPlaces {
  const count = xs.length
  const xMm = new Float64Array(count)
  const yMm = new Float64Array(count)
  const weightMm2 = new Float64Array(count)
  for (let i = 0; i < count; i++) {
    const [x, y] = frame.toMm(xs[i]!, ys[i]!)
    xMm[i] = x
    yMm[i] = y
    if (i < interiorCount) weightMm2[i] = (step * frame.mmPerPx(xs[i]!, ys[i]!)) ** 2
  }
  return { count, interiorCount, xPx: Float64Array.from(xs), yPx: Float64Array.from(ys), xMm, yMm, weightMm2 }
}

/** An even grid in the part frame for the height map, with the places of it that are measured. */
export interface MapGrid {
  readonly columns: number
  readonly rows: number
  readonly x0Mm: number
  readonly y0Mm: number
  readonly stepMm: number
  /** Grid indices of the measured places, and their places. */
  readonly index: Int32Array
  readonly xMm: Float64Array
  readonly yMm: Float64Array
  /** Share of every cell that is measured, 0 to 1: its contour at one half is the rim, finer than the grid. */
  readonly coverage: Float32Array
}

/**
 * A grid of `across` places over the longer side of the measured area. Its outermost places lie half a step beyond
 * the area, so that a straight rim runs between two rows of cells and not through one.
 */
export function mapGrid(area: MeasuredArea, across = 96): MapGrid {
  const [areaLeft, areaTop, right, bottom] = extentMm(area)
  const stepMm = Math.max(right - areaLeft, bottom - areaTop) / (across - 2)
  const columns = Math.max(1, Math.ceil((right - areaLeft) / stepMm - 1e-9) + 2)
  const rows = Math.max(1, Math.ceil((bottom - areaTop) / stepMm - 1e-9) + 2)
  const left = areaLeft - stepMm / 2
  const top = areaTop - stepMm / 2
  const index: number[] = []
  const xs: number[] = []
  const ys: number[] = []
  for (let r = 0; r < rows; r++) {
    for (let c = 0; c < columns; c++) {
      const x = left + c * stepMm
      const y = top + r * stepMm
      const [px, py] = area.frame.toPx(x, y)
      if (!spansHold(area.pixels, px, py)) continue
      index.push(r * columns + c)
      xs.push(x)
      ys.push(y)
    }
  }
  const isHeld = (x: number, y: number) => spansHold(area.pixels, ...area.frame.toPx(x, y))
  return {
    coverage: cellCoverage({ columns, rows, x0Mm: left, y0Mm: top, stepMm }, index, isHeld),
    columns,
    rows,
    x0Mm: left,
    y0Mm: top,
    stepMm,
    index: Int32Array.from(index),
    xMm: Float64Array.from(xs),
    yMm: Float64Array.from(ys),
  }
}

/** Places across a cell that are asked for its share. */
const COVERAGE_PLACES = 5

/** Cells whose neighbours are all measured, or none of them, are whole or empty; only the others are looked into. */
function cellCoverage(
  { columns, rows, x0Mm, y0Mm, stepMm }: Pick<MapGrid, 'columns' | 'rows' | 'x0Mm' | 'y0Mm' | 'stepMm'>,
  index: readonly number[],
  isHeld: (xMm: number, yMm: number) => boolean,
): Float32Array {
  const held = new Uint8Array(columns * rows)
  for (const cell of index) held[cell] = 1
  const coverage = new Float32Array(columns * rows)
  for (let r = 0; r < rows; r++) {
    for (let c = 0; c < columns; c++) {
      const about = heldAbout(held, columns, rows, c, r)
      coverage[r * columns + c] =
        about === 0 || about === 9
          ? about / 9
          : shareHeld(x0Mm + c * stepMm, y0Mm + r * stepMm, stepMm, isHeld)
    }
  }
  return coverage
}

/** How many of a cell and its eight neighbours are measured; beyond the grid none is. */
function heldAbout(held: Uint8Array, columns: number, rows: number, c: number, r: number): number {
  let count = 0
  for (let y = Math.max(0, r - 1); y <= Math.min(rows - 1, r + 1); y++) {
    for (let x = Math.max(0, c - 1); x <= Math.min(columns - 1, c + 1); x++) count += held[y * columns + x]!
  }
  return count
}

function shareHeld(
  xMm: number,
  yMm: number,
  stepMm: number,
  isHeld: (xMm: number, yMm: number) => boolean,
): number {
  let count = 0
  for (let i = 0; i < COVERAGE_PLACES; i++) {
    for (let j = 0; j < COVERAGE_PLACES; j++) {
      const dx = ((i + 0.5) / COVERAGE_PLACES - 0.5) * stepMm
      const dy = ((j + 0.5) / COVERAGE_PLACES - 0.5) * stepMm
      if (isHeld(xMm + dx, yMm + dy)) count++
    }
  }
  return count / COVERAGE_PLACES ** 2
}

function extentMm({ pixels, frame }: MeasuredArea): [number, number, number, number] {
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity]
  for (let i = 0; i < pixels.rows.length; i++) {
    const y = pixels.firstRow + i
    const spans = rowOf(pixels, y)
    for (const xPx of spans) {
      const [x, yMm] = frame.toMm(xPx, y)
      left = Math.min(left, x)
      right = Math.max(right, x)
      top = Math.min(top, yMm)
      bottom = Math.max(bottom, yMm)
    }
  }
  return [left, top, right, bottom]
}
