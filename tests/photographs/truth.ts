import { heightUm } from './height'
import { measuredArea } from './measured-area'
import { type HeightPlaces, minimumZoneUm } from './minimum-zone'
import { bandHeightUm, faceRadiusMm, type Scene } from './scene'

/** The true figures of a scene, over its measured area. Peak and valley are both positive. */
export interface Truth {
  family: string
  leastSquaresUm: number
  peakUm: number
  valleyUm: number
  rmsUm: number
  minimumZoneUm: number
  bandUm: number
  minimumZoneBands: number
  areaMm2: number
  /** Coefficient of r² in the least squares fit of plane and r². */
  curvatureUmPerMm2: number
  convex: boolean
  /** Height of the middle over the rim of that fit, over the whole face's longer side; plus is high in the middle. */
  sagittaUm: number
}

/** Places across the face's longer side, unless asked otherwise. */
const GRID_PLACES = 400

/** Inner places of the measured area on an even grid. */
function measuredGridMm(scene: Scene, placesAcross: number): { x: Float64Array; y: Float64Array } {
  const area = measuredArea(scene.face)
  const radiusMm = faceRadiusMm(scene.face)
  const stepMm = (2 * radiusMm) / placesAcross
  const x: number[] = []
  const y: number[] = []
  for (let row = 0; row < placesAcross; row++) {
    for (let column = 0; column < placesAcross; column++) {
      const xMm = (column + 0.5) * stepMm - radiusMm
      const yMm = (row + 0.5) * stepMm - radiusMm
      if (!area.holds(xMm, yMm)) continue
      x.push(xMm)
      y.push(yMm)
    }
  }
  return { x: Float64Array.from(x), y: Float64Array.from(y) }
}

/** Solves a symmetric positive system in place by elimination. */
function solved(matrix: number[][], right: number[]): number[] {
  const size = right.length
  for (let i = 0; i < size; i++) {
    for (let row = i + 1; row < size; row++) {
      const factor = matrix[row][i] / matrix[i][i]
      for (let column = i; column < size; column++) matrix[row][column] -= factor * matrix[i][column]
      right[row] -= factor * right[i]
    }
  }
  for (let i = size - 1; i >= 0; i--) {
    for (let column = i + 1; column < size; column++) right[i] -= matrix[i][column] * right[column]
    right[i] /= matrix[i][i]
  }
  return right
}

/** Least squares over the places of 1, x, y and, with four terms, r²; x and y are taken over `lengthMm`. */
function fitted(places: HeightPlaces, terms: 3 | 4, lengthMm: number): number[] {
  const matrix = Array.from({ length: terms }, () => new Array<number>(terms).fill(0))
  const right = new Array<number>(terms).fill(0)
  const row = [1, 0, 0, 0]
  for (let place = 0; place < places.z.length; place++) {
    row[1] = places.x[place] / lengthMm
    row[2] = places.y[place] / lengthMm
    row[3] = row[1] * row[1] + row[2] * row[2]
    for (let i = 0; i < terms; i++) {
      right[i] += row[i] * places.z[place]
      for (let j = 0; j < terms; j++) matrix[i][j] += row[i] * row[j]
    }
  }
  return solved(matrix, right)
}

function withoutPlane(places: HeightPlaces, plane: readonly number[], lengthMm: number): HeightPlaces {
  const [level, alongX, alongY] = plane
  const { x, y } = places
  return {
    x,
    y,
    z: places.z.map((z, place) => z - level - (alongX * x[place] + alongY * y[place]) / lengthMm),
  }
}

function heightsAt(height: (x: number, y: number) => number, x: Float64Array, y: Float64Array): HeightPlaces {
  return { x, y, z: x.map((xMm, place) => height(xMm, y[place])) }
}

function joined(first: Float64Array, second: Float64Array): Float64Array {
  const both = new Float64Array(first.length + second.length)
  both.set(first)
  both.set(second, first.length)
  return both
}

/** Greatest and least of many values. */
export function extremes(values: Float64Array): { highest: number; lowest: number } {
  let highest = -Infinity
  let lowest = Infinity
  for (const value of values) {
    if (value > highest) highest = value
    if (value < lowest) lowest = value
  }
  return { highest, lowest }
}

/** Root of the mean of the squares. */
export function rootMeanSquare(values: Float64Array): number {
  let sum = 0
  for (const value of values) sum += value * value
  return Math.sqrt(sum / values.length)
}

/**
 * Departures of heights from their least squares plane over the scene's measured area: on the grid (each place stands for the
 * same area), and on grid and border together.
 */
export function departuresUm(
  scene: Scene,
  height: (xMm: number, yMm: number) => number,
  placesAcross = GRID_PLACES,
): { grid: HeightPlaces; all: HeightPlaces } {
  const lengthMm = faceRadiusMm(scene.face)
  const { x, y } = measuredGridMm(scene, placesAcross)
  const grid = heightsAt(height, x, y)
  const plane = fitted(grid, 3, lengthMm)
  const border = measuredArea(scene.face).borderPlacesMm()
  const borderX = Float64Array.from(border, (place) => place[0])
  const borderY = Float64Array.from(border, (place) => place[1])
  const inner = withoutPlane(grid, plane, lengthMm)
  const outer = withoutPlane(heightsAt(height, borderX, borderY), plane, lengthMm)
  const all = { x: joined(x, borderX), y: joined(y, borderY), z: joined(inner.z, outer.z) }
  return { grid: inner, all }
}

/**
 * True figures of a scene. Plane, root mean square and sphere come from the grid; extremes and minimum zone also see the
 * border, where saddles, blocks and rolled rims have theirs.
 */
export function truthOf(scene: Scene, placesAcross = GRID_PLACES): Truth {
  const { grid, all } = departuresUm(scene, heightUm(scene), placesAcross)
  const { highest, lowest } = extremes(all.z)
  const lengthMm = faceRadiusMm(scene.face)
  const curvatureUm = fitted(grid, 4, lengthMm)[3]
  const bandUm = bandHeightUm(scene)
  const zoneUm = minimumZoneUm(all)
  return {
    family: scene.family,
    leastSquaresUm: highest - lowest,
    peakUm: highest,
    valleyUm: -lowest,
    rmsUm: rootMeanSquare(grid.z),
    minimumZoneUm: zoneUm,
    bandUm,
    minimumZoneBands: zoneUm / bandUm,
    areaMm2: grid.z.length * ((2 * lengthMm) / placesAcross) ** 2,
    curvatureUmPerMm2: curvatureUm / lengthMm ** 2,
    convex: curvatureUm < 0,
    sagittaUm: -curvatureUm,
  }
}
