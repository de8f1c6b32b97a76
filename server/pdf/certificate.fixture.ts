import { readFileSync } from 'node:fs'
import { decide, figureForStorage, fromMeasureFile, readTraces } from '@shared/metrology'
import { type CertificateSnapshot, certificateSnapshotSchema } from '@shared/schemas/certificates'
import { type MeasureFile, measureFileSchema } from '@shared/schemas/measure-file'
import type { Face, FaceSizes } from '@shared/schemas/parts'
import sharp from 'sharp'
import type { CertificatePictures } from './certificate-page'
import { drawMapColours } from './map-colours'
import { photographForPage } from './photograph'

/** What the practice file leaves open and a shop would state. */
const stated = {
  referenceFlatFormUm: 0.031,
  viewingAngleUncertaintyDeg: 1,
  temperatureHalfWidthUm: 0.02,
  edgePlacementUncertaintyMm: 0.05,
}

/** Practice photographs are all of this size. */
const photo = { sha256: 'a'.repeat(64), widthPx: 1600, heightPx: 1200 }

export type FixtureChange = Partial<Omit<CertificateSnapshot, 'figure' | 'face'>> & { face?: Partial<Face> }

/** The snapshot of a certificate of a traced practice photograph, with real figures and invented people. */
export function certificateFixture(
  name: string,
  { face: faceChange, ...change }: FixtureChange = {},
): CertificateSnapshot {
  const file = measureFileSchema.parse(
    JSON.parse(readFileSync(`tests/fixtures/practice/${name}.traced.json`, 'utf8')),
  )
  const outcome = readTraces(fromMeasureFile({ ...file, ...stated }, photo))
  if (outcome.kind === 'refused') throw new Error(`${name} was refused`)
  const { residuals: _r, bandReadings: _b, findings: _f, ...figure } = figureForStorage(outcome.result)
  const face: Face = { ...usualFace(sizeOf(file)), ...faceChange }
  const flatnessUm =
    face.reference === 'minimumZone' ? figure.flatness.minimumZoneUm : figure.flatness.leastSquaresUm
  const { verdict, guardBandUm } = decide({
    tolerance: face.tolerance,
    rule: face.rule,
    flatnessUm,
    expandedUncertaintyUm: figure.expandedUncertaintyUm,
    sagittaUm: figure.terms.sagittaUm,
    sagittaUUm: figure.terms.sagittaUUm,
    supportedShare: figure.supportedShare,
    leastSupportedShare: 0.8,
  })
  return certificateSnapshotSchema.parse({
    ...paper,
    face,
    figure,
    flatnessUm,
    verdict,
    guardBandUm,
    photo,
    marks: marksOf(file),
    wavelengthNm: file.lightSource.wavelengthNm,
    viewingAngleDeg: file.viewingAngleDeg,
    engineVersion: figure.engineVersion,
    ...change,
  })
}

/** Bands of a sort for the photograph, and the map's true colours. */
export async function picturesFixture(snapshot: CertificateSnapshot): Promise<CertificatePictures> {
  const { widthPx, heightPx } = snapshot.photo
  const stripes = `<svg xmlns="http://www.w3.org/2000/svg" width="${widthPx}" height="${heightPx}">
    <defs><pattern id="b" width="60" height="60" patternUnits="userSpaceOnUse" patternTransform="rotate(20)">
    <rect width="60" height="60" fill="#8a6410"/><rect width="60" height="26" fill="#4a3408"/></pattern></defs>
    <rect width="100%" height="100%" fill="url(#b)"/></svg>`
  return {
    photo: await photographForPage(await sharp(Buffer.from(stripes)).png().toBuffer()),
    map: await drawMapColours(snapshot.figure.map),
  }
}

function sizeOf({ outline, exclusions }: MeasureFile): FaceSizes {
  if (outline.kind === 'polygon') {
    return { shape: 'block', widthMm: outline.widthMm, heightMm: outline.heightMm }
  }
  const [bore] = exclusions
  const { diameterMm } = outline
  if (
    outline.kind === 'circle' &&
    bore?.kind === 'circle' &&
    Math.hypot(bore.cx - outline.cx, bore.cy - outline.cy) < 5
  ) {
    return { shape: 'annulus', diameterMm, boreMm: (diameterMm * bore.r) / outline.r }
  }
  return { shape: 'disc', diameterMm }
}

function marksOf(file: MeasureFile): CertificateSnapshot['marks'] {
  return {
    outline: file.outline,
    leaveOuts: file.exclusions.map((shape, i) => ({ id: `leave-out-${i}`, shape, copies: null })),
    edgeBandMm: file.edgeExclusionMm,
    pressArrow: file.pressTest ?? null,
    datumMarks: [],
    flatIndexMark: null,
    traces: (file.traces ?? []).map((trace, i) => ({ id: `trace-${i}`, ...trace })),
    straightedge: null,
  }
}

function usualFace(size: FaceSizes): Face {
  return {
    id: 'face',
    partId: 'part',
    name: 'lapped',
    size,
    tolerance: { kind: 'plain', max: { valueUm: 0.9, typed: '0.9 µm' } },
    reference: 'minimumZone',
    rule: { kind: 'iso14253_2017', guardFactor: 0.825 },
    edgeBandMm: 0.5,
    support: 'free',
    template: null,
  }
}

const paper = {
  number: 'QL-2026-0318',
  checkCode: '7KQ4-MR2X-9HTD',
  checkUrl: 'https://lapwing.example/check/7KQ4-MR2X-9HTD',
  replaces: null,
  shop: {
    name: 'Quillmere Lapping Works',
    address: '4 Staithe Row\nQuillmere QM3 7LP',
    email: 'flatness@quillmere.example',
  },
  issuedTo: { name: 'Dunmarrow Pumps', address: '12 Weir Lane' },
  part: { number: 'SR-40', revision: 'C', name: 'Pump seal ring', material: 'carbon' },
  piece: { serial: '2208-05', lotNumber: '22-08', order: 'DP 5531' },
  readingNumber: 412,
  received: '26 November 2026, sound',
  setUp: {
    lightSourceId: 'light',
    referenceFlatId: 'flat',
    cameraSetUpId: 'camera',
    thermometerId: 'thermometer',
    viewingAngleDeg: null,
    viewingAngleUDeg: null,
    mirrored: false,
  },
  conditions: {
    airTemperatureC: 20.3,
    partTemperatureC: 20.1,
    soakMinutes: 240,
    temperatureHalfWidthUm: null,
    meanGapUm: null,
    supportHalfWidthUm: null,
    edgePlacementUMm: null,
    repeats: null,
    note: '',
  },
  equipment: [
    {
      name: 'Reference flat RF-2',
      details: { kind: 'referenceFlat', diameterMm: 75, formUm: 0.031, expandedUUm: 0.012 },
      calibration: {
        laboratory: 'Harrowvale Metrology',
        certificateNumber: 'HV 26-1190',
        calibratedOn: '2026-06-14',
        dueOn: '2026-12-14',
      },
    },
    {
      name: 'Helium lamp HL-1',
      details: { kind: 'lightSource', wavelengthNm: 587.56, relativeU: 2e-6, lamp: 'helium' },
      calibration: null,
    },
    {
      name: 'Bench camera',
      details: {
        kind: 'cameraSetUp',
        viewingAngleDeg: 0,
        viewingAngleUDeg: 1,
        distanceMm: 600,
        mirrored: false,
      },
      calibration: null,
    },
    {
      name: 'Bench thermometer TH-1',
      details: { kind: 'thermometer', uC: 0.04 },
      calibration: {
        laboratory: 'Harrowvale Metrology',
        certificateNumber: 'HV 26-0077',
        calibratedOn: '2026-01-22',
        dueOn: '2027-01-22',
      },
    },
  ],
  departureReason: null,
  procedure: 'LP 12, flatness by optical flat',
  measured: { name: 'Maren Oldacre', at: '2026-11-30T09:12:00.000Z' },
  agreed: { name: 'Tobias Fenwright', at: '2026-11-30T14:40:00.000Z' },
  issued: { name: 'Ines Calloway', at: '2026-12-01T10:14:00.000Z' },
  onePersonShop: false,
}

/** So many characters, in long words and with letters of several font files. */
function longText(length: number): string {
  return 'Wolfeschlegelstein Łódź hausenbergerdorff '.repeat(20).slice(0, length).trim()
}

const longDetails: CertificateSnapshot['equipment'][number]['details'][] = [
  { kind: 'referenceFlat', diameterMm: 152.4, formUm: 0.0317, expandedUUm: 0.0123 },
  { kind: 'lightSource', wavelengthNm: 632.81623, relativeU: 0.0123, lamp: 'laser' },
  { kind: 'cameraSetUp', viewingAngleDeg: 12.25, viewingAngleUDeg: 1.25, distanceMm: 600, mirrored: false },
  { kind: 'thermometer', uC: 0.04 },
]

/** Everything that people type, as long as the forms let it be. */
export const longNames: FixtureChange = {
  number: 'ABCDEFGH-2026-12345',
  replaces: 'ABCDEFGH-2026-12344',
  checkUrl: `https://${'long.'.repeat(38)}example/check/7KQ4-MR2X-9HTD`,
  shop: { name: longText(100), address: longText(300), email: 'x'.repeat(200) },
  issuedTo: { name: longText(120), address: longText(300) },
  part: { number: longText(60), revision: longText(20), name: longText(120), material: longText(120) },
  piece: { serial: longText(60), lotNumber: longText(60), order: longText(60) },
  face: { name: longText(60) },
  received: longText(120),
  departureReason: longText(500),
  procedure: longText(120),
  equipment: longDetails.map((details) => ({
    name: longText(60),
    details,
    calibration: {
      laboratory: longText(120),
      certificateNumber: longText(80),
      calibratedOn: '2026-01-22',
      dueOn: '2027-11-30',
    },
  })),
  measured: { name: longText(120), at: '2026-11-30T09:12:00.000Z' },
  agreed: { name: 'x'.repeat(120), at: '2026-11-30T14:40:00.000Z' },
  issued: { name: longText(120), at: '2026-12-01T10:14:00.000Z' },
  onePersonShop: true,
}
