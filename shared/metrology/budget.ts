import type { SurfaceUncertainty } from './flatness-uncertainty'
import type { BudgetRow, BudgetSource, SetUp } from './types'

/** What the figure is that the budget is drawn up for. */
export interface BudgetSubject {
  minimumZoneUm: number
  bandUm: number
  surface: SurfaceUncertainty
  /** Steepest slope of the heights square to the rim where the extremes touch it, µm per mm. */
  rimSlopeUmPerMm: number
  acrossMm: number
}

/**
 * The uncertainty budget of a minimum-zone figure (JCGM 100), row by row. A source that nobody stated has its
 * row, counts as nothing and says so.
 */
export function drawUpBudget(subject: BudgetSubject, setUp: SetUp): BudgetRow[] {
  const { minimumZoneUm, bandUm, surface } = subject
  return [
    computed('centreLine', surface.centreLine * bandUm, 'normal'),
    computed('betweenBands', surface.betweenBands * bandUm, 'normal'),
    computed('peakValleyBias', (Math.abs(surface.bias) * bandUm) / Math.sqrt(3), 'rectangular'),
    wavelengthRow(minimumZoneUm, setUp),
    viewingAngleRow(minimumZoneUm, setUp),
    outlineRow(subject, setUp),
    halfWidthRow('referenceFlat', setUp.referenceFlatFormUm),
    halfWidthRow('temperature', setUp.temperatureHalfWidthUm),
    repeatRow(setUp),
    nearCameraRow(subject, setUp),
    halfWidthRow('support', setUp.supportHalfWidthUm),
  ]
}

/** Expanded uncertainty, k = 2, from the rows. */
export function expandedUncertaintyUm(rows: readonly BudgetRow[]): number {
  return 2 * Math.sqrt(rows.reduce((sum, row) => sum + row.contributionUm ** 2, 0))
}

/** Sources of the budget that nobody stated. */
export function notStatedIn(rows: readonly BudgetRow[]): BudgetSource[] {
  return rows.filter((row) => !row.stated).map((row) => row.source)
}

function computed(
  source: BudgetSource,
  standardUm: number,
  distribution: 'normal' | 'rectangular',
): BudgetRow {
  return {
    source,
    stated: true,
    estimate: null,
    distribution,
    standardUncertainty: standardUm,
    unit: 'um',
    sensitivity: 1,
    contributionUm: standardUm,
    degreesOfFreedom: null,
  }
}

function notStated(source: BudgetSource, unit: BudgetRow['unit']): BudgetRow {
  return {
    source,
    stated: false,
    estimate: null,
    distribution: null,
    standardUncertainty: null,
    unit,
    sensitivity: null,
    contributionUm: 0,
    degreesOfFreedom: null,
  }
}

function wavelengthRow(minimumZoneUm: number, setUp: SetUp): BudgetRow {
  if (setUp.wavelengthRelativeU === null) return notStated('wavelength', 'relative')
  return {
    source: 'wavelength',
    stated: true,
    estimate: `${setUp.wavelengthNm} nm`,
    distribution: 'normal',
    standardUncertainty: setUp.wavelengthRelativeU,
    unit: 'relative',
    sensitivity: minimumZoneUm,
    contributionUm: minimumZoneUm * setUp.wavelengthRelativeU,
    degreesOfFreedom: null,
  }
}

/**
 * Height per band goes with 1/cos θ, so its relative change is tan θ · u(θ), and u(θ)²/2 where θ is near nothing
 * (second order; JCGM 100, 5.1.2 note).
 */
function viewingAngleRow(minimumZoneUm: number, setUp: SetUp): BudgetRow {
  if (setUp.viewingAngleUDeg === null) return notStated('viewingAngle', 'deg')
  const angle = (setUp.viewingAngleDeg * Math.PI) / 180
  const u = (setUp.viewingAngleUDeg * Math.PI) / 180
  const contributionUm = minimumZoneUm * Math.hypot(Math.tan(angle) * u, (u * u) / 2)
  return {
    source: 'viewingAngle',
    stated: true,
    estimate: `${setUp.viewingAngleDeg.toFixed(2)}°`,
    distribution: 'normal',
    standardUncertainty: setUp.viewingAngleUDeg,
    unit: 'deg',
    sensitivity: contributionUm / Math.max(1e-12, setUp.viewingAngleUDeg),
    contributionUm,
    degreesOfFreedom: null,
  }
}

function outlineRow({ rimSlopeUmPerMm }: BudgetSubject, setUp: SetUp): BudgetRow {
  if (setUp.edgePlacementUMm === null) return notStated('outline', 'mm')
  return {
    source: 'outline',
    stated: true,
    estimate: null,
    distribution: 'normal',
    standardUncertainty: setUp.edgePlacementUMm,
    unit: 'mm',
    sensitivity: rimSlopeUmPerMm,
    contributionUm: rimSlopeUmPerMm * setUp.edgePlacementUMm,
    degreesOfFreedom: null,
  }
}

/** A source known as ± its half-width, anywhere within alike: u = a ÷ √3. */
function halfWidthRow(source: BudgetSource, halfWidthUm: number | null): BudgetRow {
  if (halfWidthUm === null) return notStated(source, 'um')
  return {
    ...computed(source, halfWidthUm / Math.sqrt(3), 'rectangular'),
    estimate: `± ${halfWidthUm} µm`,
  }
}

function repeatRow(setUp: SetUp): BudgetRow {
  if (setUp.repeats === null) return notStated('repeat', 'um')
  const { standardDeviationUm, count } = setUp.repeats
  return {
    ...computed('repeat', standardDeviationUm / Math.sqrt(count), 'normal'),
    estimate: `n = ${count}`,
    degreesOfFreedom: count - 1,
  }
}

/** A near camera sees the rim at another angle than the middle: mean gap × change of cos θ over the face. */
function nearCameraRow({ acrossMm }: BudgetSubject, setUp: SetUp): BudgetRow {
  if (setUp.nearCamera === null) return notStated('nearCamera', 'um')
  const { meanGapUm, distanceMm } = setUp.nearCamera
  const angle = (setUp.viewingAngleDeg * Math.PI) / 180
  const edge = Math.atan2(acrossMm / 2, distanceMm)
  const change = Math.max(
    Math.abs(1 - Math.cos(angle + edge) / Math.cos(angle)),
    Math.abs(1 - Math.cos(angle - edge) / Math.cos(angle)),
  )
  return {
    ...halfWidthRow('nearCamera', meanGapUm * change),
    estimate: `${meanGapUm} µm gap, ${distanceMm} mm`,
  }
}
