import { choleskyInPlace, solveLower, solveLowerTransposed } from './cholesky'

/**
 * Weighted linear least squares by normal equations: coefficients of the columns, or null when the rows don't
 * determine them. Columns ought to be of like size (scale x and y to the face first).
 *
 * @param columns one array a function, each as long as `observed`
 */
export function solveLeastSquares(
  columns: readonly Float64Array[],
  observed: Float64Array,
  weights: Float64Array,
): Float64Array | null {
  const n = columns.length
  const gram = new Float64Array(n * n)
  const solution = new Float64Array(n)
  for (let a = 0; a < n; a++) {
    const fa = columns[a]!
    for (let i = 0; i < observed.length; i++) solution[a] = solution[a]! + weights[i]! * fa[i]! * observed[i]!
    for (let b = 0; b <= a; b++) {
      const fb = columns[b]!
      let sum = 0
      for (let i = 0; i < observed.length; i++) sum += weights[i]! * fa[i]! * fb[i]!
      gram[a * n + b] = sum
    }
  }
  if (!choleskyInPlace(gram, n)) return null
  solveLower(gram, n, solution)
  solveLowerTransposed(gram, n, solution)
  return solution
}
