import type { NewEquipment } from '@shared/schemas/equipment'
import { emptyMarks, type Marks, type Trace } from '@shared/schemas/marks'
import type { Conditions, NewReading, Reading, ReadingSetUp } from '@shared/schemas/readings'
import { addEquipment } from '../../server/use-cases/equipment/add-equipment'
import { storePiece } from './stored-readings'
import { type SignedIn, startTestApp, type TestApp } from './support'

const lampNm = 589.3
/** Height of one band under the lamp of these tests, seen from above. */
export const lampBandUm = lampNm / 2000

export const blankSetUp: ReadingSetUp = {
  lightSourceId: null,
  referenceFlatId: null,
  cameraSetUpId: null,
  thermometerId: null,
  viewingAngleDeg: 0,
  viewingAngleUDeg: null,
  mirrored: false,
}

export const blankConditions: Conditions = {
  airTemperatureC: null,
  partTemperatureC: null,
  soakMinutes: null,
  temperatureHalfWidthUm: null,
  meanGapUm: null,
  supportHalfWidthUm: null,
  edgePlacementUMm: null,
  repeats: null,
  note: '',
}

export interface Bench extends TestApp {
  inspector: SignedIn
  pieceId: string
  faceId: string
  partId: string
  lightSourceId: string
}

/** An inspector at work: a piece with one round face of 50 mm (at most 0.5 µm), and a sodium lamp. */
export async function startAtBench(): Promise<Bench> {
  const test = startTestApp()
  const inspector = await test.signInAs('inspector')
  const { piece, face } = storePiece(test.context, inspector.me.id)
  const lamp = addEquipmentTo(test, inspector, {
    name: 'Sodium lamp',
    description: '',
    details: { kind: 'lightSource', wavelengthNm: lampNm, relativeU: 0.0005, lamp: 'sodium' },
    inService: true,
    calibration: null,
  })
  return {
    ...test,
    inspector,
    pieceId: piece.id,
    faceId: face.id,
    partId: piece.partId,
    lightSourceId: lamp.id,
  }
}

export function addEquipmentTo({ context }: TestApp, { me }: SignedIn, equipment: NewEquipment) {
  return addEquipment(context, { id: me.id, name: me.name, roles: [] }, equipment)
}

export function newReading({ pieceId, faceId, lightSourceId }: Bench) {
  return { pieceId, faceId, setUp: { ...blankSetUp, lightSourceId }, conditions: blankConditions }
}

/** A new draft by the inspector, or by whoever is given. */
export async function takeReading(
  bench: Bench,
  by: SignedIn = bench.inspector,
  more: Partial<NewReading> = {},
): Promise<Reading> {
  const response = await by.agent
    .post('/api/readings')
    .send({ ...newReading(bench), ...more })
    .expect(201)
  return response.body
}

const radiusPx = 400
const middlePx = 500
const spacingPx = 80

/**
 * Bands on a cylinder: straight ones bowed by so many bands at the rim. The face rises from its middle line to both
 * sides when the orders rise along the press arrow, so it is hollow.
 */
export function bowedMarks(bowBands: number, orders = [-4, -3, -2, -1, 0, 1, 2, 3, 4]): Marks {
  return {
    ...emptyMarks(1),
    outline: { kind: 'circle', cx: middlePx, cy: middlePx, r: radiusPx },
    pressArrow: { x: middlePx, y: middlePx, dx: 0, dy: 1 },
    traces: orders.map((order) => bowedTrace(order, bowBands)),
  }
}

function bowedTrace(order: number, bowBands: number): Trace {
  const points: Trace['points'] = []
  for (let x = -radiusPx; x <= radiusPx; x += 20) {
    const y = (order + bowBands * (x / radiusPx) ** 2) * spacingPx
    if (Math.hypot(x, y) < radiusPx - 6) points.push([middlePx + x, middlePx + y])
  }
  return { id: `band${order}`, order, points }
}

/** Saves marks on top of those that are there. */
export async function mark(
  bench: Bench,
  reading: Reading,
  marks: Marks,
  version = 0,
  by: SignedIn = bench.inspector,
): Promise<void> {
  await by.agent.put(`/api/readings/${reading.id}/marks`).send({ basedOnVersion: version, marks }).expect(200)
}

/** A reading with bands on it and its figure computed. */
export async function takeMeasuredReading(
  bench: Bench,
  bowBands = 1,
  by: SignedIn = bench.inspector,
  more: Partial<NewReading> = {},
): Promise<Reading> {
  const reading = await takeReading(bench, by, more)
  await mark(bench, reading, bowedMarks(bowBands), 0, by)
  await by.agent.post(`/api/readings/${reading.id}/compute`).expect(200)
  return (await by.agent.get(`/api/readings/${reading.id}`).expect(200)).body
}
