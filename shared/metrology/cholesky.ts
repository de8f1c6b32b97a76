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
    // Two rows at a time: their sums don't wait for one another.
    let i = j + 1
    for (; i + 1 < n; i += 2) {
      const first = i * n
      const second = first + n
      let sumFirst = a[first + j]!
      let sumSecond = a[second + j]!
      for (let k = 0; k < j; k++) {
        const factor = a[rowJ + k]!
        sumFirst -= a[first + k]! * factor
        sumSecond -= a[second + k]! * factor
      }
      a[first + j] = sumFirst / root
      a[second + j] = sumSecond / root
    }
    if (i < n) {
      const last = i * n
      let sum = a[last + j]!
      for (let k = 0; k < j; k++) sum -= a[last + k]! * a[rowJ + k]!
      a[last + j] = sum / root
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

/** Solves L·y = b in place for many b, each a row of `rows`; four at a time, whose sums don't wait for one another. */
export function solveLowerRows(l: Float64Array, n: number, rows: Float64Array, count: number): void {
  const end = count - (count % 4)
  for (let r = 0; r < end; r += 4) {
    const b0 = r * n
    const b1 = b0 + n
    const b2 = b1 + n
    const b3 = b2 + n
    for (let i = 0; i < n; i++) {
      const row = i * n
      let s0 = rows[b0 + i]!
      let s1 = rows[b1 + i]!
      let s2 = rows[b2 + i]!
      let s3 = rows[b3 + i]!
      for (let k = 0; k < i; k++) {
        const factor = l[row + k]!
        s0 -= factor * rows[b0 + k]!
        s1 -= factor * rows[b1 + k]!
        s2 -= factor * rows[b2 + k]!
        s3 -= factor * rows[b3 + k]!
      }
      const diagonal = l[row + i]!
      rows[b0 + i] = s0 / diagonal
      rows[b1 + i] = s1 / diagonal
      rows[b2 + i] = s2 / diagonal
      rows[b3 + i] = s3 / diagonal
    }
  }
  for (let r = end; r < count; r++) solveLower(l, n, rows.subarray(r * n, (r + 1) * n))
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
    // Two earlier rows at a time, so that this row is read and written half as often. The second of a pair
    // reaches one place further than the first.
    let k = 0
    for (; k + 1 < i; k += 2) {
      const first = l[row + k]! * inverse
      const second = l[row + k + 1]! * inverse
      const rowFirst = k * n
      const rowSecond = rowFirst + n
      for (let j = 0; j <= k; j++)
        out[row + j] = out[row + j]! - first * out[rowFirst + j]! - second * out[rowSecond + j]!
      out[row + k + 1] = out[row + k + 1]! - second * out[rowSecond + k + 1]!
    }
    if (k < i) {
      const factor = l[row + k]! * inverse
      const rowK = k * n
      for (let j = 0; j <= k; j++) out[row + j] = out[row + j]! - factor * out[rowK + j]!
    }
    out[row + i] = inverse
  }
}
