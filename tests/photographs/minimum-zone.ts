import { type Coefficients, lessEq, type Model, solve } from 'yalps'

/** Places as columns: x and y in mm, z in µm. */
export interface HeightPlaces {
  x: Float64Array
  y: Float64Array
  z: Float64Array
}

interface Plane {
  alongX: number
  alongY: number
  level: number
}

/** Share of the zone by which a place may still stand out when the search ends. */
const TOLERANCE_SHARE = 1e-7
const MOST_ROUNDS = 60

/**
 * Least distance between two parallel planes that hold all places, in µm: minimise 2t subject to |z − ax − by − c| ≤ t.
 * A linear programme over a few places at a time; the places that stand out most from its answer join until none does.
 * (Slopes are µm over mm, so the distance along z and square to the planes are the same.)
 */
export function minimumZoneUm(places: HeightPlaces): number {
  const scale = scaled(places)
  const chosen = new Set<number>(farthest(scale.places, { alongX: 0, alongY: 0, level: 0 }))
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { plane, half } = leastZone(scale.places, [...chosen])
    const out = farthest(scale.places, plane)
    const beyond = Math.max(...out.map((place) => Math.abs(residual(scale.places, place, plane)))) - half
    if (beyond <= TOLERANCE_SHARE) return 2 * half * scale.heightUm
    for (const place of out) chosen.add(place)
  }
  throw new Error('The minimum zone was not found.')
}

/** The same places with lengths and heights near one, as the linear programme likes them. */
function scaled(places: HeightPlaces): { places: HeightPlaces; heightUm: number } {
  let lengthMm = 0
  let heightUm = 0
  for (let i = 0; i < places.z.length; i++) {
    lengthMm = Math.max(lengthMm, Math.abs(places.x[i]), Math.abs(places.y[i]))
    heightUm = Math.max(heightUm, Math.abs(places.z[i]))
  }
  if (heightUm === 0) heightUm = 1
  return {
    heightUm,
    places: {
      x: places.x.map((value) => value / lengthMm),
      y: places.y.map((value) => value / lengthMm),
      z: places.z.map((value) => value / heightUm),
    },
  }
}

function residual({ x, y, z }: HeightPlaces, place: number, plane: Plane): number {
  return z[place] - plane.alongX * x[place] - plane.alongY * y[place] - plane.level
}

/** The highest and the lowest place over the plane in each sector round the middle: few rounds, few places. */
function farthest(places: HeightPlaces, plane: Plane): number[] {
  const sectors = 8
  const highest = new Int32Array(sectors).fill(-1)
  const lowest = new Int32Array(sectors).fill(-1)
  const high = new Float64Array(sectors).fill(-Infinity)
  const low = new Float64Array(sectors).fill(Infinity)
  for (let i = 0; i < places.z.length; i++) {
    const sector =
      (places.x[i] > 0 ? 1 : 0) +
      (places.y[i] > 0 ? 2 : 0) +
      (Math.abs(places.x[i]) > Math.abs(places.y[i]) ? 4 : 0)
    const over = residual(places, i, plane)
    if (over > high[sector]) {
      high[sector] = over
      highest[sector] = i
    }
    if (over < low[sector]) {
      low[sector] = over
      lowest[sector] = i
    }
  }
  return [...highest, ...lowest].filter((place) => place >= 0)
}

/** Unknowns of either sign are differences of two that are not negative. */
function leastZone(places: HeightPlaces, chosen: readonly number[]): { plane: Plane; half: number } {
  const constraints = new Map<string, ReturnType<typeof lessEq>>()
  const columns: Record<string, [string, number][]> = { ax: [], bx: [], ay: [], by: [], al: [], bl: [] }
  const halfColumn: [string, number][] = [['half', 1]]
  for (const place of chosen) {
    for (const side of [1, -1]) {
      const key = `${place}:${side}`
      constraints.set(key, lessEq(-side * places.z[place]))
      columns.ax.push([key, -side * places.x[place]])
      columns.bx.push([key, side * places.x[place]])
      columns.ay.push([key, -side * places.y[place]])
      columns.by.push([key, side * places.y[place]])
      columns.al.push([key, -side])
      columns.bl.push([key, side])
      halfColumn.push([key, -1])
    }
  }
  const variables = new Map<string, Coefficients>([...Object.entries(columns), ['half', halfColumn]])
  const model: Model = { direction: 'minimize', objective: 'half', constraints, variables }
  const solution = solve(model, { precision: 1e-11 })
  if (solution.status !== 'optimal') throw new Error(`The minimum zone's programme is ${solution.status}.`)
  const value = new Map(solution.variables)
  const difference = (plus: string, minus: string) => (value.get(plus) ?? 0) - (value.get(minus) ?? 0)
  const plane = {
    alongX: difference('ax', 'bx'),
    alongY: difference('ay', 'by'),
    level: difference('al', 'bl'),
  }
  return { plane, half: solution.result }
}
