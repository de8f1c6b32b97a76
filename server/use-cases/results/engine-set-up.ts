import type { SetUp } from '@shared/metrology'
import type { EquipmentDetails, EquipmentKind } from '@shared/schemas/equipment'
import type { Conditions, ReadingSetUp } from '@shared/schemas/readings'
import { eq } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { equipment } from '../../db/schema/equipment'
import { invalidField } from '../../errors'

/** What is known of the set-up, out of the equipment as it is entered now. */
export function engineSetUp(db: Connection, setUp: ReadingSetUp, conditions: Conditions): SetUp {
  const light = detailsOf(db, setUp.lightSourceId, 'lightSource')
  if (!light) throw invalidField('setUp.lightSourceId', { key: 'reading.lightSource.missing' })
  const flat = detailsOf(db, setUp.referenceFlatId, 'referenceFlat')
  const camera = detailsOf(db, setUp.cameraSetUpId, 'cameraSetUp')
  return {
    wavelengthNm: light.wavelengthNm,
    wavelengthRelativeU: light.relativeU,
    ...viewingAngle(setUp, camera),
    edgePlacementUMm: null,
    referenceFlatFormUm: flat?.formUm ?? null,
    temperatureHalfWidthUm: conditions.temperatureHalfWidthUm,
    repeats: null,
    nearCamera: nearCamera(conditions, camera),
    supportHalfWidthUm: conditions.supportHalfWidthUm,
  }
}

type DetailsOf<Kind extends EquipmentKind> = Extract<EquipmentDetails, { kind: Kind }>
type CameraSetUp = DetailsOf<'cameraSetUp'> | null

/** A typed angle has the uncertainty typed with it; the camera set-up's own comes with its own. */
function viewingAngle(
  setUp: ReadingSetUp,
  camera: CameraSetUp,
): Pick<SetUp, 'viewingAngleDeg' | 'viewingAngleUDeg'> {
  if (setUp.viewingAngleDeg === null && camera) {
    const { viewingAngleDeg, viewingAngleUDeg } = camera
    return { viewingAngleDeg, viewingAngleUDeg }
  }
  return { viewingAngleDeg: setUp.viewingAngleDeg ?? 0, viewingAngleUDeg: setUp.viewingAngleUDeg }
}

function nearCamera({ meanGapUm }: Conditions, camera: CameraSetUp): SetUp['nearCamera'] {
  if (meanGapUm === null || !camera || camera.distanceMm === null) return null
  return { meanGapUm, distanceMm: camera.distanceMm }
}

function detailsOf<Kind extends EquipmentKind>(
  db: Connection,
  id: string | null,
  kind: Kind,
): DetailsOf<Kind> | null {
  if (id === null) return null
  const found = db.select({ details: equipment.details }).from(equipment).where(eq(equipment.id, id)).get()
  return found?.details.kind === kind ? (found.details as DetailsOf<Kind>) : null
}
