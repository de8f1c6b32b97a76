import { heightUm } from './height'
import type { HeightPlaces } from './minimum-zone'
import type { ScenePair } from './random-pair'
import { faceRadiusMm } from './scene'
import { departuresUm, extremes, rootMeanSquare } from './truth'

/** What lapping changed, true: after less before on the measured area, its own least squares plane off. */
export interface PairTruth {
  before: string
  after: string
  turnedDeg: number
  changePeakToValleyUm: number
  changeRmsUm: number
  centreWentDown: boolean
}

/** Share of the radius that counts as the middle. */
const MIDDLE_SHARE = 0.5

function meanOfMiddle({ x, y, z }: HeightPlaces, radiusMm: number): number {
  let sum = 0
  let count = 0
  for (let place = 0; place < z.length; place++) {
    if (Math.hypot(x[place], y[place]) > MIDDLE_SHARE * radiusMm) continue
    sum += z[place]
    count++
  }
  return sum / count
}

/** True change of a pair. The centre went down if the inner half fell against the whole. */
export function pairTruthOf(pair: ScenePair): PairTruth {
  const before = heightUm(pair.before)
  const after = heightUm(pair.after)
  const { grid, all } = departuresUm(pair.before, (x, y) => after(x, y) - before(x, y))
  const { highest, lowest } = extremes(all.z)
  return {
    before: pair.before.name,
    after: pair.after.name,
    turnedDeg: pair.turnedDeg,
    changePeakToValleyUm: highest - lowest,
    changeRmsUm: rootMeanSquare(grid.z),
    centreWentDown: meanOfMiddle(grid, faceRadiusMm(pair.before.face)) < 0,
  }
}
