import { emptyMarks } from '@shared/schemas/marks'
import type { Face } from '@shared/schemas/parts'
import type { ReadingState } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { Tx } from '../../server/db/client'
import { newId } from '../../server/db/ids'
import { customers, faces, parts, pieces } from '../../server/db/schema/parts'
import { readings } from '../../server/db/schema/readings'
import { results } from '../../server/db/schema/results'

const firstMs = Date.parse('2025-01-06T06:00:00.000Z')
const createdAt = new Date(firstMs).toISOString()

/** A part of a customer of its own, straight into the database. */
export function storePartWithFace(tx: Tx, index: number): Face {
  const customerId = newId()
  const partId = newId()
  const row = {
    id: newId(),
    partId,
    name: 'Sealing face',
    size: { shape: 'disc', diameterMm: 50 },
    tolerance: { kind: 'plain', max: { valueUm: 0.6, typed: '0.6 um' } },
    reference: 'minimumZone',
    rule: { kind: 'simpleAcceptance', guardFactor: 0 },
    edgeBandMm: 1,
    support: 'free',
    template: null,
  } satisfies Face
  tx.insert(customers)
    .values({ id: customerId, name: `Customer ${index}`, createdAt })
    .run()
  tx.insert(parts)
    .values({
      id: partId,
      customerId,
      number: `PN-${1000 + index}`,
      name: `Ring of kind ${index}`,
      createdAt,
    })
    .run()
  tx.insert(faces)
    .values({ ...row, position: 0, createdAt })
    .run()
  return row
}

export function storePieceOf(tx: Tx, face: Face, index: number): { id: string } {
  const id = newId()
  tx.insert(pieces)
    .values({ id, partId: face.partId, serial: `S-${index}`, createdAt })
    .run()
  return { id }
}

interface ReadingToStore {
  piece: { id: string }
  face: Face
  number: number
  takenById: string
  state: ReadingState
  /** Place in time: one reading a quarter of an hour. */
  at: number
}

/** A reading with its figure, as large as real ones are. */
export function storeReading(tx: Tx, { piece, face, at, ...columns }: ReadingToStore): void {
  const id = newId()
  const resultId = newId()
  const verdict = at % 7 > 3 ? 'doesNotConform' : 'conforms'
  const taken = new Date(firstMs + at * 900_000).toISOString()
  tx.insert(readings)
    .values({
      ...columns,
      ...nothingStated,
      // Its own state comes with its result: a certified reading can't be changed any more.
      state: 'draft',
      id,
      pieceId: piece.id,
      faceId: face.id,
      createdAt: taken,
      updatedAt: taken,
      marks: { ...emptyMarks(1), traces: someTraces },
    })
    .run()
  tx.insert(results)
    .values({
      id: resultId,
      readingId: id,
      marksVersion: 0,
      engineVersion: '1.0.0',
      mode: 'traced',
      outcome: 'figure',
      flatnessUm: 0.3 + (at % 7) / 10,
      minimumZoneUm: 0.3 + (at % 7) / 10,
      expandedUncertaintyUm: 0.02,
      verdict,
      computedAt: taken,
      computedById: columns.takenById,
      face,
      findings: [],
      inputs: { ...nothingStated, traced: { ...tracedOutline, traces: someTraces } },
    })
    .run()
  tx.update(readings)
    .set({ latestResultId: resultId, verdict, state: columns.state })
    .where(eq(readings.id, id))
    .run()
}

const someTraces = Array.from({ length: 10 }, (_, order) => ({
  id: `band-${order}`,
  order,
  points: Array.from({ length: 20 }, (_, k): [number, number] => [100 + 40.25 * k, 120.5 + 60 * order]),
}))

const nothingStated = {
  setUp: {
    lightSourceId: null,
    referenceFlatId: null,
    cameraSetUpId: null,
    thermometerId: null,
    viewingAngleDeg: null,
    viewingAngleUDeg: null,
    mirrored: false,
  },
  conditions: {
    airTemperatureC: null,
    partTemperatureC: null,
    soakMinutes: null,
    temperatureHalfWidthUm: null,
    meanGapUm: null,
    supportHalfWidthUm: null,
    edgePlacementUMm: null,
    repeats: null,
    note: '',
  },
}

const tracedOutline = {
  outline: { kind: 'circle' as const, cx: 500, cy: 500, r: 400 },
  size: { kind: 'round' as const, diameterMm: 50 },
  exclusions: [],
  edgeBandMm: 1,
  pressArrow: null,
  photo: null,
  mirrored: false,
  setUp: {
    wavelengthNm: 589.3,
    wavelengthRelativeU: null,
    viewingAngleDeg: 0,
    viewingAngleUDeg: null,
    edgePlacementUMm: null,
    referenceFlatFormUm: null,
    temperatureHalfWidthUm: null,
    repeats: null,
    nearCamera: null,
    supportHalfWidthUm: null,
  },
}
