/** The pair of parallel planes of least distance that hold all places: ISO 1101's default association. */
export interface MinimumZone {
  /** Distance of the planes, in the unit of z. */
  readonly width: number
  /** Middle plane z = a x + b y + c. */
  readonly plane: { readonly a: number; readonly b: number; readonly c: number }
  /** The four places that hold the planes apart (fewer count where some coincide in effect). */
  readonly contacts: readonly number[]
  /** How far the width may still be from the least, relative: 0 but for rounding when converged. */
  readonly remainder: number
  readonly iterations: number
}

export interface MinimumZoneSolver {
  /**
   * @param zs one value a place
   * @param start contacts of a like problem, to begin from
   */
  solve(zs: ArrayLike<number>, start?: readonly number[]): MinimumZone
}

const MOST_EXCHANGES = 400
/** Places are moved apart by this share of their extent while contacts are chosen, so that rows and columns of a
 *  grid make no ties; the width of the planes found is then taken over the true places. */
const JITTER = 1e-7
const CLOSE_ENOUGH = 1e-10
/** A result nearer to the least width than this isn't tried again from another start. */
const WELL_CONVERGED = 1e-6
/** References thinner than this (twice their area over the extent's square) settle no plane. */
const THINNEST = 1e-9

/**
 * Solves minimum zones over the same places again and again. The method is the single exchange on references
 * of four places (Stiefel; the dual simplex method for: minimise t with |z − a x − b y − c| ≤ t): a reference
 * has a plane from which its places depart by equal amounts with signs that can't be bettered; the place that
 * departs most enters, and the one of four exchanges that raises the reference's departure is taken. It ends
 * exactly, with the departure of the worst place equal to that of the reference.
 *
 * @throws RangeError for fewer than three places, arrays of unlike length, or places on one line
 */
export function createMinimumZoneSolver(xs: ArrayLike<number>, ys: ArrayLike<number>): MinimumZoneSolver {
  const count = xs.length
  if (ys.length !== count) throw new RangeError('minimum zone: xs and ys differ in length')
  if (count < 3) throw new RangeError('minimum zone: at least three places are needed')
  const { exactU, exactV, u, v, cx, cy, extent } = scaledPlaces(xs, ys)
  const spread = spreadReference(u, v)
  const rest = new Float64Array(count)

  return {
    solve(zs, start) {
      if (zs.length !== count) throw new RangeError('minimum zone: as many heights as places are needed')
      if (count === 3) return throughThree(exactU, exactV, zs, cx, cy, extent)
      if (spread.length === 0) throw new RangeError('minimum zone: the places lie on one line')
      // A plane near the final one is taken off first: what is left is small, and so are rounding and jitter in it.
      const near = planeThrough(
        spread.slice(0, 3) as [number, number, number],
        spread.slice(0, 3).map((i) => zs[i]!) as [number, number, number],
        exactU,
        exactV,
      )!
      for (let i = 0; i < count; i++) rest[i] = zs[i]! - near.a * exactU[i]! - near.b * exactV[i]! - near.c
      const starts = [() => start ?? [], () => spread, () => highsAndLows(rest, u, v)]
      let best: MinimumZone | null = null
      for (const first of starts) {
        const reference = level(first(), u, v, rest)
        if (!reference) continue
        const found = ascend(reference, u, v, exactU, exactV, rest, cx, cy, extent)
        if (!best || found.width < best.width) best = found
        if (best.remainder < WELL_CONVERGED) break
      }
      if (!best) throw new RangeError('minimum zone: the places lie on one line')
      const { plane } = best
      const a = plane.a + near.a / extent
      const b = plane.b + near.b / extent
      return {
        ...best,
        plane: { a, b, c: plane.c + near.c - (near.a * cx) / extent - (near.b * cy) / extent },
      }
    },
  }
}

/** Exchanges places while that raises the reference's departure, then takes the plane over the true places. */
function ascend(
  start: Reference,
  u: Float64Array,
  v: Float64Array,
  exactU: Float64Array,
  exactV: Float64Array,
  zs: Float64Array,
  cx: number,
  cy: number,
  extent: number,
): MinimumZone {
  let reference = start
  let iterations = 0
  let worst = worstOf(reference, u, v, zs)
  while (iterations < MOST_EXCHANGES && worst.departure > reference.departure * (1 + CLOSE_ENOUGH)) {
    const better = exchange(reference, worst.index, u, v, zs)
    if (!better) break
    reference = better
    worst = worstOf(reference, u, v, zs)
    iterations++
  }
  // The contacts are known; their plane over the true places is the exact one, unless three of them are in line.
  const jittered = finish(reference, iterations, exactU, exactV, zs, cx, cy, extent)
  const exact = level(reference.places, exactU, exactV, zs)
  if (!exact) return jittered
  const finished = finish(exact, iterations, exactU, exactV, zs, cx, cy, extent)
  return finished.width <= jittered.width ? finished : jittered
}

/** The two highest and two lowest of places well apart: another place to begin from. */
function highsAndLows(zs: Float64Array, u: Float64Array, v: Float64Array): number[] {
  const pick = (sign: number, not: readonly number[]): number => {
    let best = -1
    for (let i = 0; i < zs.length; i++) {
      if (not.some((k) => Math.hypot(u[i]! - u[k]!, v[i]! - v[k]!) < 0.3)) continue
      if (best < 0 || sign * zs[i]! > sign * zs[best]!) best = i
    }
    return best
  }
  const picked: number[] = []
  for (const sign of [1, -1, 1, -1]) {
    const i = pick(sign, picked)
    if (i >= 0) picked.push(i)
  }
  return picked
}

/** The minimum zone of one set of places. */
export function minimumZone(
  xs: ArrayLike<number>,
  ys: ArrayLike<number>,
  zs: ArrayLike<number>,
): MinimumZone {
  return createMinimumZoneSolver(xs, ys).solve(zs)
}

function scaledPlaces(xs: ArrayLike<number>, ys: ArrayLike<number>) {
  let [left, right, top, bottom] = [xs[0]!, xs[0]!, ys[0]!, ys[0]!]
  for (let i = 1; i < xs.length; i++) {
    left = Math.min(left, xs[i]!)
    right = Math.max(right, xs[i]!)
    top = Math.min(top, ys[i]!)
    bottom = Math.max(bottom, ys[i]!)
  }
  const cx = (left + right) / 2
  const cy = (top + bottom) / 2
  const extent = Math.max(right - left, bottom - top) / 2 || 1
  const exactU = Float64Array.from(xs, (x) => (x - cx) / extent)
  const exactV = Float64Array.from(ys, (y) => (y - cy) / extent)
  // A fixed sequence without pattern (multiples of irrational numbers, wrapped).
  const u = exactU.map((value, i) => value + JITTER * (((i + 1) * 0.6180339887498949) % 1))
  const v = exactV.map((value, i) => value + JITTER * (((i + 1) * 0.7548776662466927) % 1))
  return { exactU, exactV, u, v, cx, cy, extent }
}

/** Four places well apart: two that are far from one another, one far from their line, and one beyond it. */
function spreadReference(u: Float64Array, v: Float64Array): number[] {
  const farthest = (measure: (i: number) => number, not: readonly number[]): number => {
    let best = -1
    for (let i = 0; i < u.length; i++) {
      if (!not.includes(i) && (best < 0 || measure(i) > measure(best))) best = i
    }
    return best
  }
  const a = farthest((i) => u[i]! + v[i]!, [])
  const b = farthest((i) => Math.hypot(u[i]! - u[a]!, v[i]! - v[a]!), [a])
  const side = (i: number) => (u[b]! - u[a]!) * (v[i]! - v[a]!) - (v[b]! - v[a]!) * (u[i]! - u[a]!)
  const c = farthest((i) => Math.abs(side(i)), [a, b])
  if (Math.abs(side(c)) < 1e-6) return []
  const sign = Math.sign(side(c))
  const d = farthest((i) => -sign * side(i), [a, b, c])
  return [a, b, c, d]
}

interface Reference {
  places: number[]
  /** Equal departure of its places from its plane, and the plane. */
  departure: number
  a: number
  b: number
  c: number
}

/**
 * The plane from which four places depart by equal amounts, with the signs of the weights λ that solve
 * Σ λ = Σ λu = Σ λv = 0: departure = |Σ λz| ÷ Σ |λ|. Null when three of them settle no plane.
 */
function level(
  places: readonly number[],
  u: Float64Array,
  v: Float64Array,
  zs: ArrayLike<number>,
): Reference | null {
  if (places.length !== 4) return null
  const [p, q, r, s] = places as [number, number, number, number]
  const lambda = [
    triangle(q, r, s, u, v),
    -triangle(p, r, s, u, v),
    triangle(p, q, s, u, v),
    -triangle(p, q, r, u, v),
  ]
  const total = Math.abs(lambda[0]!) + Math.abs(lambda[1]!) + Math.abs(lambda[2]!) + Math.abs(lambda[3]!)
  if (!(total > THINNEST)) return null
  let sum = 0
  for (let k = 0; k < 4; k++) sum += lambda[k]! * zs[places[k]!]!
  const signed = sum / total
  // The plane goes through the three places of the widest triangle, each shifted by its signed departure.
  let left = 0
  for (let k = 1; k < 4; k++) if (Math.abs(lambda[k]!) > Math.abs(lambda[left]!)) left = k
  const three = places.filter((_, k) => k !== left)
  const shifted = three.map((i) => zs[i]! - Math.sign(lambda[places.indexOf(i)]!) * signed)
  const plane = planeThrough(three as [number, number, number], shifted as [number, number, number], u, v)
  return plane && { places: [...places], departure: Math.abs(signed), ...plane }
}

/** Twice the signed area of the triangle of three places. */
function triangle(p: number, q: number, r: number, u: Float64Array, v: Float64Array): number {
  return (u[q]! - u[p]!) * (v[r]! - v[p]!) - (v[q]! - v[p]!) * (u[r]! - u[p]!)
}

function planeThrough(
  [p, q, r]: [number, number, number],
  [zp, zq, zr]: [number, number, number],
  u: Float64Array,
  v: Float64Array,
): { a: number; b: number; c: number } | null {
  const determinant = triangle(p, q, r, u, v)
  if (Math.abs(determinant) < 1e-15) return null
  const a = ((zq - zp) * (v[r]! - v[p]!) - (zr - zp) * (v[q]! - v[p]!)) / determinant
  const b = ((zr - zp) * (u[q]! - u[p]!) - (zq - zp) * (u[r]! - u[p]!)) / determinant
  return { a, b, c: zp - a * u[p]! - b * v[p]! }
}

function worstOf(
  { a, b, c }: Reference,
  u: Float64Array,
  v: Float64Array,
  zs: ArrayLike<number>,
): { index: number; departure: number } {
  let index = 0
  let departure = -1
  for (let i = 0; i < u.length; i++) {
    const d = Math.abs(zs[i]! - a * u[i]! - b * v[i]! - c)
    if (d > departure) {
      departure = d
      index = i
    }
  }
  return { index, departure }
}

/** The exchange of one place for another that raises the reference's departure most; null when none does. */
function exchange(
  reference: Reference,
  entering: number,
  u: Float64Array,
  v: Float64Array,
  zs: ArrayLike<number>,
): Reference | null {
  let best: Reference | null = null
  for (let k = 0; k < 4; k++) {
    const places = reference.places.slice()
    places[k] = entering
    const candidate = level(places, u, v, zs)
    if (candidate && (!best || candidate.departure > best.departure)) best = candidate
  }
  return best && best.departure > reference.departure ? best : null
}

function throughThree(
  u: Float64Array,
  v: Float64Array,
  zs: ArrayLike<number>,
  cx: number,
  cy: number,
  extent: number,
): MinimumZone {
  const plane = planeThrough([0, 1, 2], [zs[0]!, zs[1]!, zs[2]!], u, v)
  if (!plane) throw new RangeError('minimum zone: the places lie on one line')
  const reference = { places: [0, 1, 2], departure: 0, ...plane }
  return { ...finish(reference, 0, u, v, zs, cx, cy, extent), width: 0, remainder: 0 }
}

function finish(
  reference: Reference,
  iterations: number,
  u: Float64Array,
  v: Float64Array,
  zs: ArrayLike<number>,
  cx: number,
  cy: number,
  extent: number,
): MinimumZone {
  const a = reference.a / extent
  const b = reference.b / extent
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (let i = 0; i < u.length; i++) {
    const rest = zs[i]! - reference.a * u[i]! - reference.b * v[i]!
    low = Math.min(low, rest)
    high = Math.max(high, rest)
  }
  const width = high - low
  return {
    width,
    plane: { a, b, c: (low + high) / 2 - a * cx - b * cy },
    contacts: reference.places,
    remainder: width > 0 ? Math.max(0, 1 - (2 * reference.departure) / width) : 0,
    iterations,
  }
}
