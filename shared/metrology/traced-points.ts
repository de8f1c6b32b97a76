/**
 * Clicks on dark bands as the fit wants them. `order` is the gap in whole bands; the fit is of the gap, in
 * bands, so that a click's own error is (px off the band) × (slope of the gap, bands per px).
 */
export interface TracedPoints {
  readonly count: number
  readonly xMm: Float64Array
  readonly yMm: Float64Array
  /** The same places one pixel on along the photograph's x, and along its y: for the slope per pixel. */
  readonly xMmRight: Float64Array
  readonly yMmRight: Float64Array
  readonly xMmDown: Float64Array
  readonly yMmDown: Float64Array
  readonly order: Float64Array
  readonly traceOf: Int32Array
}

/** Clicks evenly out of all, `count` of them; all of them where they are fewer. */
export function thinned(points: TracedPoints, count: number): TracedPoints {
  if (points.count <= count) return points
  return pickClicks(
    points,
    Int32Array.from({ length: count }, (_, i) => Math.floor((i * points.count) / count)),
  )
}

/** The named clicks only, in the order named. */
export function pickClicks(points: TracedPoints, picked: ArrayLike<number>): TracedPoints {
  const of = (values: Float64Array) => Float64Array.from(picked, (i) => values[i]!)
  return {
    count: picked.length,
    xMm: of(points.xMm),
    yMm: of(points.yMm),
    xMmRight: of(points.xMmRight),
    yMmRight: of(points.yMmRight),
    xMmDown: of(points.xMmDown),
    yMmDown: of(points.yMmDown),
    order: of(points.order),
    traceOf: Int32Array.from(picked, (i) => points.traceOf[i]!),
  }
}
