/** z = a x + b y + c. */
export interface Plane {
  readonly a: number
  readonly b: number
  readonly c: number
}

/** Square of the ratio of the places' smaller spread to their larger below which they count as one line. */
const LINE_RATIO = 1e-12

/**
 * Weighted least squares plane, from centred sums so that places far from the origin lose no digits.
 *
 * @throws RangeError where places of weight above 0 don't determine a plane (fewer than three, or on a line)
 */
export function fitPlane(
  xs: ArrayLike<number>,
  ys: ArrayLike<number>,
  zs: ArrayLike<number>,
  weights: ArrayLike<number>,
): Plane {
  let [w, mx, my, mz] = [0, 0, 0, 0]
  for (let i = 0; i < zs.length; i++) {
    w += weights[i]!
    mx += weights[i]! * xs[i]!
    my += weights[i]! * ys[i]!
    mz += weights[i]! * zs[i]!
  }
  mx /= w
  my /= w
  mz /= w
  let [xx, xy, yy, xz, yz] = [0, 0, 0, 0, 0]
  for (let i = 0; i < zs.length; i++) {
    const x = xs[i]! - mx
    const y = ys[i]! - my
    const z = zs[i]! - mz
    xx += weights[i]! * x * x
    xy += weights[i]! * x * y
    yy += weights[i]! * y * y
    xz += weights[i]! * x * z
    yz += weights[i]! * y * z
  }
  const determinant = xx * yy - xy * xy
  if (!(determinant > LINE_RATIO * (xx + yy) ** 2)) {
    throw new RangeError('plane fit: the places do not determine a plane')
  }
  const a = (xz * yy - yz * xy) / determinant
  const b = (yz * xx - xz * xy) / determinant
  return { a, b, c: mz - a * mx - b * my }
}
