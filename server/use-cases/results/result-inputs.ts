import { toReadingInput } from '@shared/metrology'
import type { Face } from '@shared/schemas/parts'
import type { Connection } from '../../db/client'
import { requireFace } from '../../db/parts'
import type { ResultInputs } from '../../db/schema/results'
import { invalidField } from '../../errors'
import { selectPhotos } from '../photos/select-photos'
import type { ReadingRecord } from '../readings/reading-record'
import { requireEngineSetUp } from './engine-set-up'

/** Everything that a figure of the reading comes from, as it stands now. */
export function gatherInputs(db: Connection, record: ReadingRecord): { face: Face; inputs: ResultInputs } {
  const { setUp, conditions, marks } = record
  const face = requireFace(db, record.faceId)
  const photo = selectPhotos(db, record.id).find(({ role }) => role === 'bands') ?? null
  const traced = toReadingInput({
    marks,
    size: face.size,
    photo,
    setUp: requireEngineSetUp(db, setUp, conditions),
    mirrored: setUp.mirrored,
  })
  if (!traced) throw invalidField('marks.outline', { key: 'reading.outline.missing' })
  return { face, inputs: { setUp, conditions, traced } }
}
