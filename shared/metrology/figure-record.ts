import type { Figure } from '../schemas/results'
import type { FlatnessResult, HeightGrid } from './types'

/** A figure as it is stored and sent: plain JSON, the map in whole nanometres, lists of our own. */
export function figureForStorage(result: FlatnessResult): Figure {
  const { grid, residuals, ...rest } = result
  return {
    ...rest,
    budget: rest.budget.map((row) => ({ ...row })),
    notStated: [...rest.notStated],
    statements: rest.statements.map(({ code, params }) => ({ code, params: { ...params } })),
    bandReadings: rest.bandReadings.map(storedBand),
    worstBandReading: rest.worstBandReading && storedBand(rest.worstBandReading),
    map: storedMap(grid),
    residuals: residuals.map(({ traceId, residualsPx, weights }) => ({
      traceId,
      residualsPx: Array.from(residualsPx, (px) => rounded(px, 3)),
      weights: Array.from(weights, (weight) => rounded(weight, 3)),
    })),
    findings: rest.findings.map(storedFinding),
  }
}

/** A finding as it is stored and sent. */
export function storedFinding(finding: FlatnessResult['findings'][number]): Figure['findings'][number] {
  const { code, severity, params, place, traceIds } = finding
  return { code, severity, params: { ...params }, place: place && { ...place }, traceIds: [...traceIds] }
}

function storedMap(grid: HeightGrid): Figure['map'] {
  const { columns, rows, x0Mm, y0Mm, stepMm } = grid
  return {
    columns,
    rows,
    x0Mm,
    y0Mm,
    stepMm,
    heightsNm: Array.from(grid.heightsUm, (um) => (Number.isNaN(um) ? null : Math.round(um * 1000))),
    supported: Array.from(grid.supported, (flag) => (flag === 0 ? 0 : 1)),
    coveragePercent: Array.from(grid.coverage, (share) => Math.round(100 * share)),
  }
}

function storedBand(band: NonNullable<FlatnessResult['worstBandReading']>): Figure['bandReadings'][number] {
  const [from, to] = band.chord
  return {
    ...band,
    chord: [
      [from[0], from[1]],
      [to[0], to[1]],
    ],
    bowAt: [band.bowAt[0], band.bowAt[1]],
  }
}

function rounded(value: number, decimals: number): number {
  const scale = 10 ** decimals
  return Math.round(value * scale) / scale
}
