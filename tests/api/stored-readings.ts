import { emptyMarks } from '@shared/schemas/marks'
import type { Face, Piece } from '@shared/schemas/parts'
import type { Verdict } from '@shared/schemas/results'
import type { ReadingState } from '@shared/workflow/reading-states'
import { eq } from 'drizzle-orm'
import type { AppContext } from '../../server/context'
import { newId } from '../../server/db/ids'
import { faces } from '../../server/db/schema/parts'
import { readings } from '../../server/db/schema/readings'
import { results } from '../../server/db/schema/results'
import { addCustomer } from '../../server/use-cases/customers/add-customer'
import { addFace } from '../../server/use-cases/faces/add-face'
import { addPart } from '../../server/use-cases/parts/add-part'
import { addPiece } from '../../server/use-cases/pieces/add-piece'

const nobody = { id: '', name: 'Nobody', roles: [] }

/** A piece of a part with one face, by whoever: for tests of what is shown of readings. */
export function storePiece(
  context: AppContext,
  actorId: string,
  serial = '001',
): { piece: Piece; face: Face } {
  const actor = { ...nobody, id: actorId }
  const customer = addCustomer(context, actor, { name: 'Ostrey Valves', address: '', email: '' })
  const part = addPart(context, actor, {
    customerId: customer.id,
    number: 'OV-12',
    revision: '',
    name: 'Valve plate',
    material: '',
  })
  const face = addFace(context, actor, part.id, {
    name: 'Top',
    size: { shape: 'disc', diameterMm: 50 },
    tolerance: { kind: 'plain', max: { valueUm: 0.5, typed: '0.5' } },
    reference: 'minimumZone',
    rule: { kind: 'simpleAcceptance', guardFactor: 0 },
    edgeBandMm: 1,
    support: 'held',
    template: null,
  })
  return { piece: addPiece(context, actor, { partId: part.id, lotId: null, serial }), face }
}

interface ReadingToStore {
  pieceId: string
  faceId: string
  takenById: string
  state: ReadingState
  number: number
  /** Stores a result of this verdict with it. */
  verdict?: Verdict
}

/** A reading as it stands in the database, whatever its state; gives its id. */
export function storeReading(context: AppContext, reading: ReadingToStore): string {
  const { db, now } = context
  const { verdict, ...columns } = reading
  const id = newId()
  const at = now().toISOString()
  db.insert(readings)
    .values({ ...columns, state: 'draft', id, createdAt: at, updatedAt: at, ...blank, marks: emptyMarks() })
    .run()
  if (verdict) storeResult(context, id, reading.faceId, verdict)
  // Last, since a certified reading can't be changed any more.
  db.update(readings).set({ state: reading.state }).where(eq(readings.id, id)).run()
  return id
}

const blank = {
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

function storeResult({ db, now }: AppContext, readingId: string, faceId: string, verdict: Verdict): void {
  const id = newId()
  const {
    position: _position,
    createdAt: _createdAt,
    ...face
  } = db.select().from(faces).where(eq(faces.id, faceId)).all()[0]
  db.insert(results)
    .values({
      id,
      readingId,
      marksVersion: 1,
      engineVersion: '0.0.0',
      mode: 'traced',
      outcome: 'figure',
      flatnessUm: 0.8,
      minimumZoneUm: 0.8,
      expandedUncertaintyUm: 0.05,
      verdict,
      computedAt: now().toISOString(),
      face,
      findings: [],
      inputs: { ...blank, traced: { ...tracedNothing, size: { kind: 'round', diameterMm: 50 } } },
    })
    .run()
  db.update(readings).set({ latestResultId: id, verdict }).where(eq(readings.id, readingId)).run()
}

const tracedNothing = {
  outline: { kind: 'circle' as const, cx: 0, cy: 0, r: 1 },
  exclusions: [],
  edgeBandMm: 0,
  pressArrow: null,
  traces: [],
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
