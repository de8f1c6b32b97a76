import { describe, expect, it } from 'vitest'
import { choleskyInPlace, invertLower, solveLower, solveLowerRows, solveLowerTransposed } from './cholesky'
import { seededNormal } from './seeded-normal.fixture'

/** AAᵀ + n·1 of seeded numbers: symmetric and positive definite. */
function positiveDefinite(n: number): Float64Array {
  const normals = seededNormal(n, 1)
  const a = Float64Array.from({ length: n * n }, () => normals()[0])
  const out = new Float64Array(n * n)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      let sum = i === j ? n : 0
      for (let k = 0; k < n; k++) sum += a[i * n + k]! * a[j * n + k]!
      out[i * n + j] = sum
    }
  }
  return out
}

function factorOf(matrix: Float64Array, n: number): Float64Array {
  const l = matrix.slice()
  expect(choleskyInPlace(l, n)).toBe(true)
  for (let i = 0; i < n; i++) l.fill(0, i * n + i + 1, (i + 1) * n)
  return l
}

// Odd and even sizes, since rows are taken in twos and fours.
describe.each([1, 2, 5, 8, 13])('a factor of size %i', (n) => {
  const matrix = positiveDefinite(n)
  const l = factorOf(matrix, n)

  it('gives the matrix back when multiplied by its transpose', () => {
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        let sum = 0
        for (let k = 0; k < n; k++) sum += l[i * n + k]! * l[j * n + k]!
        expect(sum).toBeCloseTo(matrix[i * n + j]!, 9)
      }
    }
  })

  it('times its inverse is one', () => {
    const inverse = new Float64Array(n * n)
    invertLower(l, n, inverse)
    for (let i = 0; i < n; i++) {
      for (let j = 0; j < n; j++) {
        let sum = 0
        for (let k = 0; k < n; k++) sum += l[i * n + k]! * inverse[k * n + j]!
        expect(sum).toBeCloseTo(i === j ? 1 : 0, 10)
      }
    }
  })

  it('solves the system by going down and back up', () => {
    const x = Float64Array.from({ length: n }, (_, i) => i + 1)
    const b = Float64Array.from({ length: n }, (_, i) =>
      x.reduce((sum, value, j) => sum + matrix[i * n + j]! * value, 0),
    )
    solveLower(l, n, b)
    solveLowerTransposed(l, n, b)
    for (let i = 0; i < n; i++) expect(b[i]).toBeCloseTo(x[i]!, 9)
  })

  it('solves many rows just as one by one', () => {
    const rows = Float64Array.from({ length: 7 * n }, (_, i) => Math.sin(i))
    const together = rows.slice()
    solveLowerRows(l, n, together, 7)
    for (let r = 0; r < 7; r++) {
      const alone = rows.slice(r * n, (r + 1) * n)
      solveLower(l, n, alone)
      for (let i = 0; i < n; i++) expect(together[r * n + i]).toBeCloseTo(alone[i]!, 12)
    }
  })
})

describe('a matrix that determines too little', () => {
  it('has no factor', () => {
    expect(choleskyInPlace(Float64Array.of(1, 1, 1, 1), 2)).toBe(false)
    expect(choleskyInPlace(Float64Array.of(1, 2, 2, 1), 2)).toBe(false)
  })
})
