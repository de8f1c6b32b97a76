import type { SetUp } from '@shared/metrology'
import type { Equipment, EquipmentDetails, EquipmentKind } from '@shared/schemas/equipment'
import type { Reading } from '@shared/schemas/readings'

type DetailsOf<Kind extends EquipmentKind> = Extract<EquipmentDetails, { kind: Kind }>

/** What is known of the set-up, for the figure shown while marking; null without a light source. */
export function engineSetUp(
  { setUp, conditions }: Pick<Reading, 'setUp' | 'conditions'>,
  equipment: readonly Equipment[],
): SetUp | null {
  const light = detailsOf(equipment, setUp.lightSourceId, 'lightSource')
  if (!light) return null
  const flat = detailsOf(equipment, setUp.referenceFlatId, 'referenceFlat')
  const camera = detailsOf(equipment, setUp.cameraSetUpId, 'cameraSetUp')
  const fromCamera = setUp.viewingAngleDeg === null && camera !== null
  const { meanGapUm } = conditions
  const distanceMm = camera?.distanceMm ?? null
  return {
    wavelengthNm: light.wavelengthNm,
    wavelengthRelativeU: light.relativeU,
    viewingAngleDeg: fromCamera ? camera.viewingAngleDeg : (setUp.viewingAngleDeg ?? 0),
    viewingAngleUDeg: fromCamera ? camera.viewingAngleUDeg : setUp.viewingAngleUDeg,
    edgePlacementUMm: null,
    referenceFlatFormUm: flat?.formUm ?? null,
    temperatureHalfWidthUm: conditions.temperatureHalfWidthUm,
    repeats: null,
    nearCamera: meanGapUm === null || distanceMm === null ? null : { meanGapUm, distanceMm },
    supportHalfWidthUm: conditions.supportHalfWidthUm,
  }
}

function detailsOf<Kind extends EquipmentKind>(
  equipment: readonly Equipment[],
  id: string | null,
  kind: Kind,
): DetailsOf<Kind> | null {
  const details = equipment.find((item) => item.id === id)?.details
  return details?.kind === kind ? (details as DetailsOf<Kind>) : null
}
