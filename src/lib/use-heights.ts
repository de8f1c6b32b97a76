import { formatHeight, type HeightUnit } from '@shared/units/height'
import { useDisplayUnit } from './settings'

/** Heights in the shop's unit. A shop that reads in bands needs to know how high one is: without it µm stand. */
export function useHeights(bandUm?: number | null) {
  const wanted = useDisplayUnit()
  const band = bandUm ?? undefined
  const unit: HeightUnit & ReturnType<typeof useDisplayUnit> =
    wanted === 'bands' && band === undefined ? 'um' : wanted
  return {
    unit,
    band,
    plain: (um: number) => formatHeight(um, unit, { bandUm: band }),
    signed: (um: number) => formatHeight(um, unit, { bandUm: band, signed: true }),
  }
}
