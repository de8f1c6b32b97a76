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
    for (let a = 0; a < terms; a++) {
      const f0 = design[r0 + a]! * rowWeight[i]!
      const f1 = design[r1 + a]! * rowWeight[i + 1]!
      const f2 = design[r2 + a]! * rowWeight[i + 2]!
      const f3 = design[r3 + a]! * rowWeight[i + 3]!
      moment[a] =
        moment[a]! + f0 * observed[i]! + f1 * observed[i + 1]! + f2 * observed[i + 2]! + f3 * observed[i + 3]!
      const row = a * terms
      for (let b = 0; b <= a; b++) {
        gram[row + b] =
          gram[row + b]! +
          f0 * design[r0 + b]! +
          f1 * design[r1 + b]! +
          f2 * design[r2 + b]! +
          f3 * design[r3 + b]!
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
