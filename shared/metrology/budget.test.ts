import { describe, expect, it } from 'vitest'
import { type BudgetSubject, drawUpBudget, expandedUncertaintyUm, notStatedIn } from './budget'
import { bareSetUp } from './closed-form.fixture'
import type { BudgetSource, SetUp } from './types'

const subject: BudgetSubject = {
  minimumZoneUm: 0.5,
  bandUm: 0.3,
  surface: { centreLine: 0.01, betweenBands: 0.004, bias: 0.003 },
  rimSlopeUmPerMm: 0.2,
  acrossMm: 40,
}

function contribution(source: BudgetSource, setUp: Partial<SetUp>, of: Partial<BudgetSubject> = {}): number {
  const rows = drawUpBudget({ ...subject, ...of }, { ...bareSetUp, ...setUp })
  const row = rows.find((r) => r.source === source)
  if (!row) throw new Error(`no row ${source}`)
  return row.contributionUm
}

describe('every row of the budget answers to its input', () => {
  it('centre line, between bands and bias in bands times the height of one', () => {
    expect(contribution('centreLine', {})).toBeCloseTo(0.003, 12)
    expect(contribution('betweenBands', {})).toBeCloseTo(0.0012, 12)
    expect(contribution('peakValleyBias', {})).toBeCloseTo(0.0009 / Math.sqrt(3), 12)
  })

  it('wavelength in proportion to the figure', () => {
    expect(contribution('wavelength', { wavelengthRelativeU: 0.01 })).toBeCloseTo(0.005, 12)
  })

  it('viewing angle by tan θ · u(θ), and in second order square on', () => {
    const u = Math.PI / 180
    expect(contribution('viewingAngle', { viewingAngleDeg: 30, viewingAngleUDeg: 1 })).toBeCloseTo(
      0.5 * Math.hypot(Math.tan(Math.PI / 6) * u, (u * u) / 2),
      12,
    )
    expect(contribution('viewingAngle', { viewingAngleUDeg: 1 })).toBeCloseTo((0.5 * u * u) / 2, 12)
  })

  it('outline by the slope at the rim', () => {
    expect(contribution('outline', { edgePlacementUMm: 0.05 })).toBeCloseTo(0.01, 12)
  })

  // GUM, 4.3.7: a rectangular distribution of half-width a has u = a ÷ √3.
  it.each([
    ['referenceFlat', { referenceFlatFormUm: 0.03164 }, 0.03164],
    ['temperature', { temperatureHalfWidthUm: 0.0093 }, 0.0093],
    ['support', { supportHalfWidthUm: 0.02 }, 0.02],
  ] as const)('%s as a rectangular half-width', (source, setUp, halfWidth) => {
    expect(contribution(source, setUp)).toBeCloseTo(halfWidth / Math.sqrt(3), 12)
  })

  it('repeat by s ÷ √n with its degrees of freedom', () => {
    const setUp = { ...bareSetUp, repeats: { standardDeviationUm: 0.02, count: 5 } }
    const row = drawUpBudget(subject, setUp).find((r) => r.source === 'repeat')
    expect(row?.contributionUm).toBeCloseTo(0.00894, 5)
    expect(row?.degreesOfFreedom).toBe(4)
  })

  it('near camera by mean gap × change of cos θ over the face', () => {
    // From five diameters the edge stands 0.496 % off: 20 µm of gap give 0.1 µm.
    const row = contribution('nearCamera', { nearCamera: { meanGapUm: 20, distanceMm: 200 } })
    expect(row * Math.sqrt(3)).toBeCloseTo(20 * 0.00496, 3)
  })
})

describe('the expanded uncertainty', () => {
  it('is twice the root of the sum of squares', () => {
    const rows = drawUpBudget(subject, { ...bareSetUp, referenceFlatFormUm: 0.03 })
    const sum = rows.reduce((s, r) => s + r.contributionUm ** 2, 0)
    expect(expandedUncertaintyUm(rows)).toBeCloseTo(2 * Math.sqrt(sum), 12)
  })

  it('counts what nobody stated as nothing, and lists it', () => {
    expect(notStatedIn(drawUpBudget(subject, bareSetUp))).toEqual([
      'wavelength',
      'viewingAngle',
      'outline',
      'referenceFlat',
      'temperature',
      'repeat',
      'nearCamera',
      'support',
    ])
  })

  it('lists nothing once all is stated, and only what is missing', () => {
    const all: SetUp = {
      ...bareSetUp,
      wavelengthRelativeU: 0.001,
      viewingAngleUDeg: 1,
      edgePlacementUMm: 0.05,
      referenceFlatFormUm: 0.03,
      temperatureHalfWidthUm: 0.01,
      repeats: { standardDeviationUm: 0.02, count: 5 },
      nearCamera: { meanGapUm: 10, distanceMm: 400 },
      supportHalfWidthUm: 0.01,
    }
    expect(notStatedIn(drawUpBudget(subject, all))).toEqual([])
    expect(notStatedIn(drawUpBudget(subject, { ...all, repeats: null }))).toEqual(['repeat'])
    for (const row of drawUpBudget(subject, bareSetUp))
      if (!row.stated)
        expect(row).toMatchObject({ contributionUm: 0, estimate: null, standardUncertainty: null })
  })

  // Band-reading budget, derived here by the GUM's root sum of squares: reading ± 0.1 band 0.01696, flat λ/20 at
  // 632.8 nm 0.01827, temperature ± 9.3 nm 0.00537, repeats of 20 nm, n = 5, 0.00894; uc 0.02702, U 0.0540 µm.
  it('of a reading to a tenth of a helium band is 0.054 µm', () => {
    const rows = drawUpBudget(
      {
        ...subject,
        bandUm: 0.2937809,
        surface: { centreLine: 0.1 / Math.sqrt(3), betweenBands: 0, bias: 0 },
      },
      {
        ...bareSetUp,
        referenceFlatFormUm: 0.03164,
        temperatureHalfWidthUm: 0.0093,
        repeats: { standardDeviationUm: 0.02, count: 5 },
      },
    )
    const of = (source: BudgetSource) => rows.find((r) => r.source === source)?.contributionUm
    expect(of('centreLine')).toBeCloseTo(0.01696, 5)
    expect(of('referenceFlat')).toBeCloseTo(0.01827, 5)
    expect(of('temperature')).toBeCloseTo(0.00537, 5)
    expect(of('repeat')).toBeCloseTo(0.00894, 5)
    expect(expandedUncertaintyUm(rows) / 2).toBeCloseTo(0.02702, 5)
    expect(expandedUncertaintyUm(rows)).toBeCloseTo(0.054, 4)
  })

  it('every stated row is its sensitivity times its standard uncertainty', () => {
    const rows = drawUpBudget(subject, {
      ...bareSetUp,
      wavelengthRelativeU: 0.001,
      viewingAngleDeg: 20,
      viewingAngleUDeg: 1,
      edgePlacementUMm: 0.05,
      nearCamera: { meanGapUm: 10, distanceMm: 400 },
    })
    for (const row of rows.filter((r) => r.stated))
      expect(row.sensitivity! * row.standardUncertainty!).toBeCloseTo(row.contributionUm, 12)
  })
})
