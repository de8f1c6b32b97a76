/** Symmetric positive definite systems in row-major Float64Array, lower triangle used. */

/**
 * Factors A = L·Lᵀ in place (lower triangle). Returns false, with A half overwritten, when a pivot isn't
 * positive relative to its own diagonal: the system then doesn't determine every unknown.
 */
export function choleskyInPlace(a: Float64Array, n: number): boolean {
  for (let j = 0; j < n; j++) {
    const rowJ = j * n
    const diagonal = a[rowJ + j]!
    let pivot = diagonal
    for (let k = 0; k < j; k++) pivot -= a[rowJ + k]! * a[rowJ + k]!
    if (!(pivot > 1e-13 * diagonal)) return false
    const root = Math.sqrt(pivot)
    a[rowJ + j] = root
    for (let i = j + 1; i < n; i++) {
      const rowI = i * n
      let sum = a[rowI + j]!
      for (let k = 0; k < j; k++) sum -= a[rowI + k]! * a[rowJ + k]!
      a[rowI + j] = sum / root
    }
  }
  return true
}

/** Solves L·y = b in place. */
export function solveLower(l: Float64Array, n: number, b: Float64Array): void {
  for (let i = 0; i < n; i++) {
    const row = i * n
    let sum = b[i]!
    for (let k = 0; k < i; k++) sum -= l[row + k]! * b[k]!
    b[i] = sum / l[row + i]!
  }
}

/** Solves Lᵀ·x = y in place, by columns so that memory is read along rows of L. */
export function solveLowerTransposed(l: Float64Array, n: number, y: Float64Array): void {
  for (let i = n - 1; i >= 0; i--) {
    const row = i * n
    const value = y[i]! / l[row + i]!
    y[i] = value
    for (let k = 0; k < i; k++) y[k] = y[k]! - l[row + k]! * value
  }
}

/** Inverse of the lower triangular factor, written into `out` (row-major, upper part zero). */
export function invertLower(l: Float64Array, n: number, out: Float64Array): void {
  out.fill(0)
  for (let i = 0; i < n; i++) {
    const row = i * n
    const inverse = 1 / l[row + i]!
    for (let k = 0; k < i; k++) {
      const factor = l[row + k]! * inverse
      const rowK = k * n
      for (let j = 0; j <= k; j++) out[row + j] = out[row + j]! - factor * out[rowK + j]!
    }
    out[row + i] = inverse
  }
}
