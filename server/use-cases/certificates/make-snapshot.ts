import { decide } from '@shared/metrology'
import type { CertificateSnapshot, CertifiedEquipment } from '@shared/schemas/certificates'
import type { Face } from '@shared/schemas/parts'
import type { Figure } from '@shared/schemas/results'
import { eq, inArray } from 'drizzle-orm'
import type { Connection } from '../../db/client'
import { selectEquipment } from '../../db/equipment'
import { equipment } from '../../db/schema/equipment'
import { customers, lots, parts, pieces } from '../../db/schema/parts'
import { people } from '../../db/schema/people'
import { readSettings } from '../../db/settings'
import { AppError } from '../../errors'
import { selectPhotos } from '../photos/select-photos'
import type { ReadingRecord } from '../readings/reading-record'
import { type ResultRecord, requireResult } from '../results/select-result'

export interface CertificateFacts {
  number: string
  checkCode: string
  checkUrl: string
  replaces: string | null
  received: string
  issuedBy: { id: string; name: string }
  at: Date
}

/** Everything that the certificate of a reading says, read from the database as it stands. */
export function makeSnapshot(
  db: Connection,
  reading: ReadingRecord,
  facts: CertificateFacts,
): CertificateSnapshot {
  const { result, figure } = requireFigure(db, reading)
  const settings = readSettings(db)
  const photo = selectPhotos(db, reading.id).find(({ role }) => role === 'bands')
  if (!photo || reading.agreedById === null || reading.agreedAt === null) throw new AppError('notAgreed')
  const { residuals: _residuals, bandReadings: _bands, findings: _findings, ...shown } = figure
  const { setUp, conditions, traced } = result.inputs
  const measured = { name: nameOf(db, reading.takenById), at: reading.createdAt }
  const agreed = { name: nameOf(db, reading.agreedById), at: reading.agreedAt }
  const signers = new Set([reading.takenById, reading.agreedById, facts.issuedBy.id])
  return {
    number: facts.number,
    checkCode: facts.checkCode,
    checkUrl: facts.checkUrl,
    replaces: facts.replaces,
    shop: { name: settings.shopName, address: settings.shopAddress, email: settings.shopEmail },
    ...itemOf(db, reading.pieceId),
    face: result.face,
    readingNumber: reading.number,
    received: facts.received,
    figure: shown,
    flatnessUm: result.flatnessUm ?? figure.flatness.minimumZoneUm,
    verdict: result.verdict,
    guardBandUm: guardBandOf(result.face, result, figure, settings.leastSupportedShare),
    photo: { sha256: photo.sha256, widthPx: photo.widthPx, heightPx: photo.heightPx },
    marks: reading.marks,
    setUp,
    wavelengthNm: traced.setUp.wavelengthNm,
    viewingAngleDeg: traced.setUp.viewingAngleDeg,
    conditions,
    equipment: equipmentOf(db, setUp),
    departureReason: reading.departureReason,
    procedure: settings.procedure,
    engineVersion: result.engineVersion,
    measured,
    agreed,
    issued: { name: facts.issuedBy.name, at: facts.at.toISOString() },
    onePersonShop: signers.size < 3,
  }
}

function requireFigure(db: Connection, reading: ReadingRecord): { result: ResultRecord; figure: Figure } {
  const result = reading.latestResultId === null ? null : requireResult(db, reading.latestResultId)
  if (!result?.figure) throw new AppError('figureMissing')
  return { result, figure: result.figure }
}

function guardBandOf(
  face: Face,
  { flatnessUm, expandedUncertaintyUm }: ResultRecord,
  figure: Figure,
  leastSupportedShare: number,
): number | null {
  const { sagittaUm, sagittaUUm } = figure.terms
  const { supportedShare } = figure
  const { tolerance, rule } = face
  return decide({
    tolerance,
    rule,
    flatnessUm,
    expandedUncertaintyUm,
    sagittaUm,
    sagittaUUm,
    supportedShare,
    leastSupportedShare,
  }).guardBandUm
}

function itemOf(db: Connection, pieceId: string): Pick<CertificateSnapshot, 'issuedTo' | 'part' | 'piece'> {
  const row = db
    .select({ customer: customers, part: parts, serial: pieces.serial, lot: lots })
    .from(pieces)
    .innerJoin(parts, eq(parts.id, pieces.partId))
    .innerJoin(customers, eq(customers.id, parts.customerId))
    .leftJoin(lots, eq(lots.id, pieces.lotId))
    .where(eq(pieces.id, pieceId))
    .get()
  if (!row) throw new Error(`The reading's piece ${pieceId} is gone.`)
  const { customer, part, serial, lot } = row
  return {
    issuedTo: { name: customer.name, address: customer.address },
    part: { number: part.number, revision: part.revision, name: part.name, material: part.material },
    piece: { serial, lotNumber: lot?.number ?? null, order: lot?.order || null },
  }
}

function equipmentOf(db: Connection, setUp: ReadingRecord['setUp']): CertifiedEquipment[] {
  const ids = [setUp.referenceFlatId, setUp.lightSourceId, setUp.cameraSetUpId, setUp.thermometerId]
  const named = ids.filter((id) => id !== null)
  const rows = selectEquipment(db, inArray(equipment.id, named))
  return named.flatMap((id) => {
    const row = rows.find((candidate) => candidate.id === id)
    return row ? [{ name: row.name, details: row.details, calibration: row.calibration }] : []
  })
}

function nameOf(db: Connection, personId: string): string {
  return db.select({ name: people.name }).from(people).where(eq(people.id, personId)).get()?.name ?? ''
}
