/**
 * Plane projective maps as nine numbers, row by row:
 *
 *   x' = (h0 x + h1 y + h2) / (h6 x + h7 y + h8)
 *   y' = (h3 x + h4 y + h5) / (h6 x + h7 y + h8)
 */
export type Homography = Readonly<Float64Array>
export type Place = readonly [number, number]

/** Where a homography takes a place. Places on its horizon give infinities. */
export function applyHomography(h: Homography, x: number, y: number): Place {
  const w = h[6]! * x + h[7]! * y + h[8]!
  return [(h[0]! * x + h[1]! * y + h[2]!) / w, (h[3]! * x + h[4]! * y + h[5]!) / w]
}

/** The map that undoes another, or null for one that flattens the plane. */
export function invertHomography(h: Homography): Homography | null {
  const [a, b, c, d, e, f, g, k, l] = h as unknown as [
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
    number,
  ]
  const cofactors = [
    e * l - f * k,
    c * k - b * l,
    b * f - c * e,
    f * g - d * l,
    a * l - c * g,
    c * d - a * f,
    d * k - e * g,
    b * g - a * k,
    a * e - b * d,
  ]
  const determinant = a * cofactors[0]! + b * cofactors[3]! + c * cofactors[6]!
  const size = Math.max(...h.map(Math.abs))
  if (!(Math.abs(determinant) > 1e-14 * size ** 3)) return null
  return Float64Array.from(cofactors, (v) => v / determinant)
}

/** The map that does `first`, then `second`. */
export function composeHomographies(second: Homography, first: Homography): Homography {
  const out = new Float64Array(9)
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 3; j++) {
      for (let k = 0; k < 3; k++) out[3 * i + j] = out[3 * i + j]! + second[3 * i + k]! * first[3 * k + j]!
    }
  }
  return out
}

/** Turn and shift: x' = c x − s y + tx, y' = s x + c y + ty. */
export function rigidMap(angleRad: number, tx: number, ty: number): Homography {
  const c = Math.cos(angleRad)
  const s = Math.sin(angleRad)
  return Float64Array.of(c, -s, tx, s, c, ty, 0, 0, 1)
}

/**
 * The homography that takes four places to four others (direct linear solution, Hartley and Zisserman,
 * Multiple View Geometry, 4.1), or null when three of either lie on a line.
 */
export function homographyFromFourPoints(from: readonly Place[], to: readonly Place[]): Homography | null {
  if (from.length !== 4 || to.length !== 4)
    throw new RangeError('homographyFromFourPoints takes four places each')
  if (hasThreeOnALine(from) || hasThreeOnALine(to)) return null
  const rows: number[][] = []
  for (let k = 0; k < 4; k++) {
    const [x, y] = from[k]!
    const [u, v] = to[k]!
    rows.push([x, y, 1, 0, 0, 0, -u * x, -u * y, u], [0, 0, 0, x, y, 1, -v * x, -v * y, v])
  }
  const solution = eliminate(rows)
  return solution ? Float64Array.of(...solution, 1) : null
}

function hasThreeOnALine(places: readonly Place[]): boolean {
  const size = Math.max(...places.flatMap((p) => places.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1]))))
  for (let skip = 0; skip < 4; skip++) {
    const [a, b, c] = places.filter((_, i) => i !== skip) as [Place, Place, Place]
    const doubleArea = (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0])
    if (Math.abs(doubleArea) < 1e-6 * size * size) return true
  }
  return false
}

/** Gauss and Jordan's elimination with row exchange over [A | b]; null when A is singular. */
export function eliminate(rows: number[][]): number[] | null {
  const n = rows.length
  for (let c = 0; c < n; c++) {
    let pivot = c
    for (let r = c + 1; r < n; r++) if (Math.abs(rows[r]![c]!) > Math.abs(rows[pivot]![c]!)) pivot = r
    if (Math.abs(rows[pivot]![c]!) < 1e-14) return null
    const row = rows[pivot]!
    rows[pivot] = rows[c]!
    rows[c] = row
    for (let r = 0; r < n; r++) {
      if (r === c) continue
      const factor = rows[r]![c]! / row[c]!
      if (factor === 0) continue
      for (let k = c; k <= n; k++) rows[r]![k] = rows[r]![k]! - factor * row[k]!
    }
  }
  return rows.map((row, i) => row[n]! / row[i]!)
}
