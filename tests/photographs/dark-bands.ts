import { type PhotoGeometry, type PlacePx, photoGeometry } from './camera'
import { contourLines, type Grid } from './contour-lines'
import { gapBands } from './gap'
import { measuredArea } from './measured-area'
import { faceRadiusMm, type Scene } from './scene'

/** Centre line of one piece of a dark band: gap = order × band, up to the whole bands that nobody sees. */
export interface DarkBand {
  order: number
  points: PlacePx[]
  closed: boolean
}

/** The gap in bands over photo places, with what is needed to follow it. */
interface BandField {
  gapAt(xPx: number, yPx: number): number
  isMeasured(xPx: number, yPx: number): boolean
  geometry: PhotoGeometry
}

/** Cells of the grid on which the lines are found first, over the photo's longer side. */
const CELLS = 400

function bandField(scene: Scene): BandField {
  const geometry = photoGeometry(scene)
  const gap = gapBands(scene)
  const area = measuredArea(scene.face)
  return {
    geometry,
    gapAt: (xPx, yPx) => gap(...geometry.partFromPhoto(xPx, yPx)),
    isMeasured: (xPx, yPx) => area.holds(...geometry.partFromPhoto(xPx, yPx)),
  }
}

/** Slope of the gap, bands per pixel. */
function slopeAt(field: BandField, xPx: number, yPx: number): [number, number] {
  const step = 1e-3
  return [
    (field.gapAt(xPx + step, yPx) - field.gapAt(xPx - step, yPx)) / (2 * step),
    (field.gapAt(xPx, yPx + step) - field.gapAt(xPx, yPx - step)) / (2 * step),
  ]
}

/** Moves a place that is near a dark band onto it, along the slope. */
function ontoBand(field: BandField, place: PlacePx, level: number): PlacePx {
  let [x, y] = place
  for (let step = 0; step < 8; step++) {
    const off = field.gapAt(x, y) - level
    if (Math.abs(off) < 1e-10) break
    const [slopeX, slopeY] = slopeAt(field, x, y)
    const steepness2 = slopeX * slopeX + slopeY * slopeY
    const longest = 4 / Math.sqrt(steepness2)
    const share = Math.max(-longest, Math.min(longest, off)) / steepness2
    x -= share * slopeX
    y -= share * slopeY
  }
  return [x, y]
}

/** The photo's part that holds the face, with a margin of two cells. */
function faceBox(scene: Scene, geometry: PhotoGeometry, cellPx: number) {
  const radiusMm = faceRadiusMm(scene.face)
  const [halfX, halfY] =
    scene.face.shape === 'block' ? [scene.face.sizeMm[0] / 2, scene.face.sizeMm[1] / 2] : [radiusMm, radiusMm]
  const border = Array.from({ length: 360 }, (_, index) => {
    const angle = (index * Math.PI) / 180
    if (scene.face.shape !== 'block') return [halfX * Math.cos(angle), halfY * Math.sin(angle)] as const
    return [halfX * Math.sign(Math.cos(angle + 1e-3)), halfY * Math.sign(Math.sin(angle + 1e-3))] as const
  }).map(([x, y]) => geometry.photoFromPart(x, y))
  const xs = border.map((place) => place[0])
  const ys = border.map((place) => place[1])
  const left = Math.min(...xs) - 2 * cellPx
  const top = Math.min(...ys) - 2 * cellPx
  return {
    left,
    top,
    columns: Math.ceil((Math.max(...xs) + 2 * cellPx - left) / cellPx) + 1,
    rows: Math.ceil((Math.max(...ys) + 2 * cellPx - top) / cellPx) + 1,
  }
}

/** Where the line between a measured and an unmeasured place of a band leaves the measured area. */
function borderPlace(field: BandField, inside: PlacePx, outside: PlacePx, level: number): PlacePx {
  let kept = inside
  let beyond = outside
  for (let step = 0; step < 30; step++) {
    const middle = ontoBand(field, [(kept[0] + beyond[0]) / 2, (kept[1] + beyond[1]) / 2], level)
    if (field.isMeasured(...middle)) kept = middle
    else beyond = middle
  }
  return kept
}

/** Starts a closed line at a place off the measured area, so that no piece runs across its seam. */
function fromOutside(points: PlacePx[], measured: boolean[]): { points: PlacePx[]; measured: boolean[] } {
  const start = measured.indexOf(false)
  const count = points.length - 1
  const turned = Array.from({ length: count + 1 }, (_, index) => (start + index) % count)
  return { points: turned.map((index) => points[index]), measured: turned.map((index) => measured[index]) }
}

/** Cuts one line of equal gap into its pieces on the measured area. */
function measuredPieces(field: BandField, line: PlacePx[], closed: boolean, level: number) {
  let points = line
  let measured = points.map((place) => field.isMeasured(...place))
  if (measured.every(Boolean)) return [{ points, closed }]
  if (closed && measured.includes(true)) ({ points, measured } = fromOutside(points, measured))
  const pieces: { points: PlacePx[]; closed: boolean }[] = []
  let piece: PlacePx[] = []
  for (let i = 0; i < points.length; i++) {
    if (measured[i]) {
      if (i > 0 && !measured[i - 1]) piece.push(borderPlace(field, points[i], points[i - 1], level))
      piece.push(points[i])
      continue
    }
    if (i > 0 && measured[i - 1]) {
      piece.push(borderPlace(field, points[i - 1], points[i], level))
      pieces.push({ points: piece, closed: false })
    }
    piece = []
  }
  if (piece.length > 1) pieces.push({ points: piece, closed: false })
  return pieces
}

/** The gap on a grid over the face, coarse: enough to find each band once. */
function coarseGap(scene: Scene, field: BandField) {
  const cellPx = Math.max(scene.camera.widthPx, scene.camera.heightPx) / CELLS
  const { left, top, columns, rows } = faceBox(scene, field.geometry, cellPx)
  const values = new Float64Array(columns * rows)
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      values[row * columns + column] = field.gapAt(left + column * cellPx, top + row * cellPx)
    }
  }
  const placeOf = ([column, row]: readonly [number, number]): PlacePx => [
    left + column * cellPx,
    top + row * cellPx,
  ]
  return { grid: { columns, rows, values } satisfies Grid, placeOf }
}

/** Whole numbers between the least and the greatest of many values. */
function wholeLevels(values: Float64Array): number[] {
  const lowest = values.reduce((least, value) => Math.min(least, value), Infinity)
  const highest = values.reduce((most, value) => Math.max(most, value), -Infinity)
  const first = Math.ceil(lowest)
  return Array.from({ length: Math.max(0, Math.floor(highest) - first + 1) }, (_, index) => first + index)
}

function bandsAtLevel(field: BandField, { grid, placeOf }: ReturnType<typeof coarseGap>, level: number) {
  return contourLines(grid, level).flatMap(({ places, closed }) => {
    const line = places.map((place) => ontoBand(field, placeOf(place), level))
    return measuredPieces(field, line, closed, level).map((piece) => ({ order: level, ...piece }))
  })
}

/**
 * Exact centre lines of all dark bands on the measured area, a point every few pixels, each on its band to 1e-9. Orders count
 * from 0 at the least gap and rise with the gap.
 */
export function darkBands(scene: Scene): DarkBand[] {
  const field = bandField(scene)
  const coarse = coarseGap(scene, field)
  const bands = wholeLevels(coarse.grid.values).flatMap((level) => bandsAtLevel(field, coarse, level))
  const first = bands.reduce((least, band) => Math.min(least, band.order), Infinity)
  return bands.map((band) => ({ ...band, order: band.order - first }))
}

/** Follows a scene's bands: puts a place onto the dark band that is nearest in gap. */
export function nearestBandPlace(scene: Scene): (place: PlacePx) => PlacePx {
  const field = bandField(scene)
  return (place) => ontoBand(field, place, Math.round(field.gapAt(...place)))
}

/** Distance of the gap from a whole number of bands at a photo place, in bands. */
export function bandResidual(scene: Scene): (xPx: number, yPx: number) => number {
  const field = bandField(scene)
  return (xPx, yPx) => {
    const gap = field.gapAt(xPx, yPx)
    return gap - Math.round(gap)
  }
}

/** Direction in the photo in which the gap widens at a photo place, as a unit vector. */
export function widening(scene: Scene): (xPx: number, yPx: number) => PlacePx {
  const field = bandField(scene)
  return (xPx, yPx) => {
    const [slopeX, slopeY] = slopeAt(field, xPx, yPx)
    const steepness = Math.hypot(slopeX, slopeY)
    return [slopeX / steepness, slopeY / steepness]
  }
}
