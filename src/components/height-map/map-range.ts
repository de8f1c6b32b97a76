import type { StoredMap } from '@shared/look/height-field'
import { niceStep } from '@shared/look/rule-scale'
import type { MapRange } from './draw-height-map'

/** One scale for several maps, so that they can be compared; it always holds the plane. */
export function commonRange(maps: readonly StoredMap[]): MapRange {
  let leastNm = 0
  let mostNm = 0
  for (const map of maps) {
    for (const nm of map.heightsNm) {
      if (nm === null) continue
      if (nm < leastNm) leastNm = nm
      if (nm > mostNm) mostNm = nm
    }
  }
  return leastNm === mostNm
    ? { leastUm: -0.001, mostUm: 0.001 }
    : { leastUm: leastNm / 1000, mostUm: mostNm / 1000 }
}

/** About twelve contours over the scale, in steps of 1, 2 or 5. */
export function contourStepUm(range: MapRange): number {
  return niceStep((range.mostUm - range.leastUm) / 12)
}
