import { Readable } from 'node:stream'
import type { Equipment } from '@shared/schemas/equipment'
import type { Marks } from '@shared/schemas/marks'
import type { Piece } from '@shared/schemas/parts'
import type { Conditions, ReadingSetUp } from '@shared/schemas/readings'
import { encodePhotograph } from '../../tests/photographs/encode'
import type { Scene } from '../../tests/photographs/scene'
import type { Actor } from '../auth/actor'
import type { AppContext } from '../context'
import { addPhoto } from '../use-cases/photos/add-photo'
import { saveMarks } from '../use-cases/readings/save-marks'
import { sendReading } from '../use-cases/readings/send-reading'
import { startReading } from '../use-cases/readings/start-reading'
import { computeResult } from '../use-cases/results/compute-result'
import type { DemoClock } from './demo-clock'
import { demoMarks, partlyTraced } from './demo-marks'
import { type DemoProgress, type DemoReading, demoReadings } from './demo-readings'
import { type DemoReview, reviewDemoReading } from './demo-reviews'
import { demoScene } from './demo-scene'
import type { AgreedReading } from './seed-certificates'

const minutesToPhotograph = 4
const minutesToTrace = 25
const minutesToSend = 5
const minutesToReview = 95

/** Who and what there is to take readings with. */
export interface DemoShop {
  people: readonly Actor[]
  equipment: readonly Equipment[]
  pieces: readonly (Piece & { faceId: string })[]
}

/** Drawn photographs, traced and computed as an inspector would, one after the other; those that were agreed to. */
export async function seedReadings(
  context: AppContext,
  clock: DemoClock,
  shop: DemoShop,
): Promise<AgreedReading[]> {
  const latestOfPiece = new Map<string, string>()
  const agreed: AgreedReading[] = []
  for (const demo of demoReadings) {
    clock.moveTo(demo.daysAgo, demo.time)
    const correctsId = demo.corrects ? (latestOfPiece.get(demo.serial) ?? null) : null
    const id = await seedReading(context, clock, shop, demo, correctsId)
    latestOfPiece.set(demo.serial, id)
    const { serial } = demo
    if (demo.progress.kind === 'agreed') agreed.push({ id, serial, pieceId: requirePieceOf(shop, demo).id })
  }
  return agreed
}

async function seedReading(
  context: AppContext,
  clock: DemoClock,
  shop: DemoShop,
  demo: DemoReading,
  correctsId: string | null,
): Promise<string> {
  const actor = requireNamed(shop.people, demo.takenBy)
  const { id: pieceId, faceId } = requirePieceOf(shop, demo)
  const setUp = setUpOf(shop, demo)
  const { id } = startReading(context, actor, {
    pieceId,
    faceId,
    setUp,
    conditions: conditionsOf(demo),
    correctsId,
    lappedSince: demo.lappedSince ?? false,
  })

  const scene = demoScene(demo)
  clock.pass(minutesToPhotograph)
  await photograph(context, actor, id, scene)
  if (demo.progress.kind === 'photographed') return id

  const whole = demoMarks(scene)
  const marks = demo.progress.kind === 'partlyTraced' ? partlyTraced(whole) : whole
  clock.pass(minutesToTrace)
  saveMarks(context, actor, id, { basedOnVersion: 0, marks })
  if (demo.progress.kind === 'partlyTraced') return id

  await computeResult(context, actor, id)
  if (demo.progress.kind === 'computed') return id

  clock.pass(minutesToSend)
  sendReading(context, actor, id)
  const review = reviewOf(demo.progress, marks)
  if (review) {
    clock.pass(minutesToReview)
    const reviewer = requireNamed(shop.people, 'Tobias Fenwright')
    reviewDemoReading(context, { reviewer, taker: actor }, id, review)
  }
  return id
}

async function photograph(context: AppContext, actor: Actor, id: string, scene: Scene): Promise<void> {
  const file = await context.storage.receive(Readable.from([await encodePhotograph(scene)]))
  await addPhoto(context, actor, id, { file, fileName: `${scene.name}.jpg`, role: 'bands' })
}

function reviewOf(progress: DemoProgress, marks: Marks): DemoReview | null {
  switch (progress.kind) {
    case 'agreed':
      return progress.remark
        ? {
            kind: 'agreed',
            remark: { ...progress.remark, place: middleOfTrace(marks, progress.remark.onTrace) },
          }
        : { kind: 'agreed' }
    case 'setAside':
      return progress
    case 'sentBack': {
      const { kind, reason, remark, onTrace } = progress
      return { kind, reason, remark: { text: remark, place: middleOfTrace(marks, onTrace) } }
    }
    default:
      return null
  }
}

function middleOfTrace({ traces }: Marks, index: number): { x: number; y: number } {
  const { points } = traces[index]
  const [x, y] = points[Math.floor(points.length / 2)]
  return { x, y }
}

function setUpOf({ equipment }: DemoShop, { lamp }: DemoReading): ReadingSetUp {
  return {
    lightSourceId: requireNamed(equipment, lamp === 'sodium' ? 'Sodium lamp 1' : 'Helium lamp 2').id,
    referenceFlatId: requireNamed(equipment, 'Flat QF-100').id,
    cameraSetUpId: requireNamed(equipment, 'Bench camera').id,
    thermometerId: requireNamed(equipment, 'Thermometer T3').id,
    viewingAngleDeg: null,
    viewingAngleUDeg: null,
    mirrored: false,
  }
}

function conditionsOf({ soakMinutes, note }: DemoReading): Conditions {
  return {
    airTemperatureC: 20.3,
    partTemperatureC: 20.4,
    soakMinutes,
    temperatureHalfWidthUm: null,
    meanGapUm: null,
    supportHalfWidthUm: null,
    edgePlacementUMm: 0.05,
    repeats: { standardDeviationUm: 0.008, count: 6 },
    note,
  }
}

function requireNamed<Item extends { name: string }>(items: readonly Item[], name: string): Item {
  const item = items.find((candidate) => candidate.name === name)
  if (!item) throw new Error(`The demo shop has no ${name}.`)
  return item
}

function requirePieceOf({ pieces }: DemoShop, { serial }: DemoReading): DemoShop['pieces'][number] {
  const piece = pieces.find((candidate) => candidate.serial === serial)
  if (!piece) throw new Error(`The demo shop has no piece ${serial}.`)
  return piece
}
