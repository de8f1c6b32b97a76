import type { EquipmentDetails, EquipmentKind } from '../schemas/equipment'
import type { Conditions, ReadingSetUp } from '../schemas/readings'
import type { SetUp } from './types'

type DetailsOf<Kind extends EquipmentKind> = Extract<EquipmentDetails, { kind: Kind }>

/** Gives the details of equipment by its id, or null when there is none of that id. */
export type FindEquipment = (id: string) => EquipmentDetails | null

/**
 * What the engine needs of a reading's set-up, out of what the inspector stated and what the equipment's records
 * say; what neither states stays null, "not stated". An angle typed for the reading has the uncertainty typed
 * with it; the camera set-up's own angle comes with its own. Null without a light source, since a band then has
 * no height.
 */
export function engineSetUp(
  { setUp, conditions }: { setUp: ReadingSetUp; conditions: Conditions },
  find: FindEquipment,
): SetUp | null {
  const light = detailsOf(find, setUp.lightSourceId, 'lightSource')
  if (!light) return null
  const flat = detailsOf(find, setUp.referenceFlatId, 'referenceFlat')
  const camera = detailsOf(find, setUp.cameraSetUpId, 'cameraSetUp')
  const fromCamera = setUp.viewingAngleDeg === null && camera !== null
  return {
    wavelengthNm: light.wavelengthNm,
    wavelengthRelativeU: light.relativeU,
    viewingAngleDeg: fromCamera ? camera.viewingAngleDeg : (setUp.viewingAngleDeg ?? 0),
    viewingAngleUDeg: fromCamera ? camera.viewingAngleUDeg : setUp.viewingAngleUDeg,
    edgePlacementUMm: conditions.edgePlacementUMm ?? null,
    referenceFlatFormUm: flat?.formUm ?? null,
    temperatureHalfWidthUm: conditions.temperatureHalfWidthUm,
    repeats: conditions.repeats ?? null,
    nearCamera: nearCamera(conditions.meanGapUm, camera?.distanceMm ?? null),
    supportHalfWidthUm: conditions.supportHalfWidthUm,
  }
}

function nearCamera(meanGapUm: number | null, distanceMm: number | null): SetUp['nearCamera'] {
  return meanGapUm === null || distanceMm === null ? null : { meanGapUm, distanceMm }
}

function detailsOf<Kind extends EquipmentKind>(
  find: FindEquipment,
  id: string | null,
  kind: Kind,
): DetailsOf<Kind> | null {
  const details = id === null ? null : find(id)
  return details?.kind === kind ? (details as DetailsOf<Kind>) : null
}
