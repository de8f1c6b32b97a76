import { bandHeightUm } from '@shared/metrology'
import { useEquipment } from '@/lib/queries/equipment'

/** The band of the shop's first light in service: what "1.5 bands" on a drawing is taken to mean, seen straight on. */
export function useShopBand(): { bandUm: number; lightName: string } | null {
  const equipment = useEquipment()
  for (const { name, inService, details } of equipment.data?.rows ?? []) {
    if (inService && details.kind === 'lightSource') {
      return { bandUm: bandHeightUm(details.wavelengthNm, 0), lightName: name }
    }
  }
  return null
}
