import type { SetUp } from '@shared/metrology'
import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { describe, expect, it } from 'vitest'
import { readMarks } from './read-marks'

const setUp: SetUp = {
  wavelengthNm: 632.8,
  wavelengthRelativeU: null,
  viewingAngleDeg: 0,
  viewingAngleUDeg: null,
  edgePlacementUMm: null,
  referenceFlatFormUm: null,
  temperatureHalfWidthUm: null,
  repeats: null,
  nearCamera: null,
  supportHalfWidthUm: null,
}
const circumstances = {
  size: { shape: 'disc' as const, diameterMm: 40 },
  photo: { widthPx: 800, heightPx: 800 },
  setUp,
  mirrored: false,
}

/** Straight bands, one every 60 px: a flat face. */
const flatFace: Marks = {
  ...emptyMarks(0.5),
  outline: { kind: 'circle', cx: 400, cy: 400, r: 350 },
  traces: Array.from({ length: 11 }, (_, i) => {
    const x = 100 + 60 * i
    const half = Math.sqrt(340 ** 2 - (x - 400) ** 2)
    const points = Array.from({ length: 13 }, (_, k): PointPx => [x, 400 - half + (k * half) / 6])
    return { id: `band-${i}`, order: i + 1, points }
  }),
}

describe('reading marks', () => {
  it('finds next to nothing on a flat face', () => {
    const { figure, problems } = readMarks(flatFace, circumstances)
    expect(figure?.flatness.minimumZoneUm).toBeLessThan(0.005)
    expect(problems).toEqual([])
  })

  it('says what is missing instead of a figure', () => {
    const bare = readMarks(emptyMarks(), circumstances)
    expect(bare.figure).toBeNull()
    expect(bare.findings.map(({ code }) => code)).toEqual(['noOutline'])
    const unnumbered = { ...flatFace, traces: flatFace.traces.map((trace) => ({ ...trace, order: null })) }
    const read = readMarks(unnumbered, circumstances)
    expect(read.figure).toBeNull()
    expect(read.findings.map(({ code }) => code)).toEqual(['orderMissing'])
  })

  it('still shows mistakes where no light source is stated', () => {
    const traces = flatFace.traces.map((trace, i) => (i === 4 ? { ...trace, order: null } : trace))
    const read = readMarks({ ...flatFace, traces }, null)
    expect(read.figure).toBeNull()
    expect(read.problems.map(({ code }) => code)).toEqual(['noNumber'])
  })

  it('doesn’t say the same mistake twice', () => {
    const strayed = flatFace.traces.map((trace, i) =>
      i === 5 ? { ...trace, points: [...trace.points, [400, 790] as PointPx] } : trace,
    )
    const { problems, findings } = readMarks({ ...flatFace, traces: strayed }, circumstances)
    expect(problems.map(({ code }) => code)).toEqual(['outsideFace'])
    expect(findings.map(({ code }) => code)).not.toContain('pointsOutsideFace')
  })
})
