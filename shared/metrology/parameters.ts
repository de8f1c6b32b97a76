import { minimumZone } from './minimum-zone'
import { fitPlane, type Plane } from './plane-fit'
import type { FlatnessParameters } from './types'

export interface ParametersOfArea {
  flatness: FlatnessParameters
  /** Least squares reference plane of the area. */
  lsPlane: Plane
  /** Places of the highest and lowest departure from it. */
  peakIndex: number
  valleyIndex: number
}

/**
 * Flatness parameters of ISO 12781-1 over an area: FLTt about the least squares plane (peak plus valley), FLTp and
 * FLTv (both positive amounts), FLTq (root mean square), and the minimum zone. Weights are the area that each place
 * stands for; places of weight 0 (rims) count for extremes only.
 *
 * @throws RangeError where the places don't determine a plane
 */
export function flatnessParameters(
  xMm: Float64Array,
  yMm: Float64Array,
  heightUm: Float64Array,
  weights: Float64Array,
): ParametersOfArea {
  const lsPlane = fitPlane(xMm, yMm, heightUm, weights)
  let peakIndex = 0
  let valleyIndex = 0
  let peak = Number.NEGATIVE_INFINITY
  let valley = Number.POSITIVE_INFINITY
  let squares = 0
  let area = 0
  for (let i = 0; i < heightUm.length; i++) {
    const departure = heightUm[i]! - lsPlane.a * xMm[i]! - lsPlane.b * yMm[i]! - lsPlane.c
    if (departure > peak) {
      peak = departure
      peakIndex = i
    }
    if (departure < valley) {
      valley = departure
      valleyIndex = i
    }
    squares += weights[i]! * departure * departure
    area += weights[i]!
  }
  const flatness = {
    // The least squares plane's own pair is one of the pairs that the minimum zone chooses from.
    minimumZoneUm: Math.min(peak - valley, minimumZone(xMm, yMm, heightUm).width),
    leastSquaresUm: peak - valley,
    peakUm: peak,
    valleyUm: -valley,
    rmsUm: Math.sqrt(squares / area),
  }
  return { flatness, lsPlane, peakIndex, valleyIndex }
}
