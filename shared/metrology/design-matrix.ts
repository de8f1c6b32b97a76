import type { SurfaceBasis } from './surface-basis'

/** The picked functions of the basis at places, row by row. */
export function designMatrix(
  basis: SurfaceBasis,
  picked: Int32Array,
  count: number,
  xMm: ArrayLike<number>,
  yMm: ArrayLike<number>,
): Float64Array {
  const terms = picked.length
  const out = new Float64Array(count * terms)
  const whole = new Float64Array(basis.size)
  for (let i = 0; i < count; i++) {
    basis.evaluate(xMm[i]!, yMm[i]!, whole, 0)
    const row = i * terms
    for (let a = 0; a < terms; a++) out[row + a] = whole[picked[a]!]!
  }
  return out
}

/** A row-major matrix of the named columns only. */
export function pickColumns(
  matrix: Float64Array,
  rows: number,
  columns: number,
  kept: ArrayLike<number>,
): Float64Array {
  const out = new Float64Array(rows * kept.length)
  let at = 0
  for (let i = 0; i < rows; i++) {
    const row = i * columns
    for (let k = 0; k < kept.length; k++) out[at++] = matrix[row + kept[k]!]!
  }
  return out
}

/** Product of row `i` with a vector. */
export function rowDot(matrix: Float64Array, vector: Float64Array, columns: number, i: number): number {
  let sum = 0
  const row = i * columns
  for (let a = 0; a < columns; a++) sum += matrix[row + a]! * vector[a]!
  return sum
}

/** Product of a row-major matrix with a vector, one value a row; four rows at a time, so that sums don't wait for one another. */
export function linearCombination(
  matrix: Float64Array,
  vector: Float64Array,
  columns: number,
  rows: number,
): Float64Array {
  const out = new Float64Array(rows)
  const end = rows - (rows % 4)
  for (let i = 0; i < end; i += 4) {
    const r0 = i * columns
    const r1 = r0 + columns
    const r2 = r1 + columns
    const r3 = r2 + columns
    let s0 = 0
    let s1 = 0
    let s2 = 0
    let s3 = 0
    for (let a = 0; a < columns; a++) {
      const v = vector[a]!
      s0 += matrix[r0 + a]! * v
      s1 += matrix[r1 + a]! * v
      s2 += matrix[r2 + a]! * v
      s3 += matrix[r3 + a]! * v
    }
    out[i] = s0
    out[i + 1] = s1
    out[i + 2] = s2
    out[i + 3] = s3
  }
  for (let i = end; i < rows; i++) out[i] = rowDot(matrix, vector, columns, i)
  return out
}

/**
 * Gram matrix (lower triangle, into `gram`) and moments (into `moment`) of weighted rows, four rows at a time
 * to spare memory traffic.
 */
export function accumulateNormalEquations(
  design: Float64Array,
  observed: Float64Array,
  rowWeight: Float64Array,
  count: number,
  terms: number,
  gram: Float64Array,
  moment: Float64Array,
): void {
  gram.fill(0, 0, terms * terms)
  moment.fill(0, 0, terms)
  const end = count - (count % 4)
  for (let i = 0; i < end; i += 4) {
    const r0 = i * terms
    const r1 = r0 + terms
    const r2 = r1 + terms
    const r3 = r2 + terms
    const y0 = observed[i]!
    const y1 = observed[i + 1]!
    const y2 = observed[i + 2]!
    const y3 = observed[i + 3]!
    for (let a = 0; a < terms; a += 2) {
      // Two functions at a time, so that every value read serves twice; the last of an odd count goes alone.
      const pair = a + 1 < terms ? 1 : 0
      const f0 = design[r0 + a]! * rowWeight[i]!
      const f1 = design[r1 + a]! * rowWeight[i + 1]!
      const f2 = design[r2 + a]! * rowWeight[i + 2]!
      const f3 = design[r3 + a]! * rowWeight[i + 3]!
      const g0 = pair * design[r0 + a + pair]! * rowWeight[i]!
      const g1 = pair * design[r1 + a + pair]! * rowWeight[i + 1]!
      const g2 = pair * design[r2 + a + pair]! * rowWeight[i + 2]!
      const g3 = pair * design[r3 + a + pair]! * rowWeight[i + 3]!
      moment[a] = moment[a]! + f0 * y0 + f1 * y1 + f2 * y2 + f3 * y3
      if (pair) moment[a + 1] = moment[a + 1]! + g0 * y0 + g1 * y1 + g2 * y2 + g3 * y3
      const row = a * terms
      const next = row + pair * terms
      for (let b = 0; b <= a; b++) {
        const d0 = design[r0 + b]!
        const d1 = design[r1 + b]!
        const d2 = design[r2 + b]!
        const d3 = design[r3 + b]!
        gram[row + b] = gram[row + b]! + f0 * d0 + f1 * d1 + f2 * d2 + f3 * d3
        gram[next + b] = gram[next + b]! + g0 * d0 + g1 * d1 + g2 * d2 + g3 * d3
      }
      if (pair) {
        const d = next + a + 1
        gram[d] =
          gram[d]! +
          g0 * design[r0 + a + 1]! +
          g1 * design[r1 + a + 1]! +
          g2 * design[r2 + a + 1]! +
          g3 * design[r3 + a + 1]!
      }
    }
  }
  for (let i = end; i < count; i++) {
    const r = i * terms
    for (let a = 0; a < terms; a++) {
      const f = design[r + a]! * rowWeight[i]!
      moment[a] = moment[a]! + f * observed[i]!
      const row = a * terms
      for (let b = 0; b <= a; b++) gram[row + b] = gram[row + b]! + f * design[r + b]!
    }
  }
}
