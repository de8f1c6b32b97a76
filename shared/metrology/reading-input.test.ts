import { describe, expect, it } from 'vitest'
import { emptyMarks, type Marks } from '../schemas/marks'
import { measureFileSchema } from '../schemas/measure-file'
import type { FaceSizes } from '../schemas/parts'
import { fromMeasureFile, toReadingInput } from './reading-input'
import type { SetUp } from './types'

const setUp: SetUp = {
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
}

const marks: Marks = { ...emptyMarks(1.5), outline: { kind: 'circle', cx: 500, cy: 400, r: 300 } }
const input = (own: Partial<Marks>, size: FaceSizes = { shape: 'disc', diameterMm: 60 }) =>
  toReadingInput({ marks: { ...marks, ...own }, size, photo: null, setUp, mirrored: false })

describe('the engine’s input from marks', () => {
  it('isn’t there before the outline is', () => {
    expect(input({ outline: null })).toBeNull()
  })

  it('has every copy of a leave-out', () => {
    const hole = { kind: 'circle' as const, cx: 700, cy: 400, r: 20 }
    const places = input({
      leaveOuts: [
        { id: 'holes', shape: hole, copies: { count: 4, cx: 500, cy: 400 } },
        { id: 'bore', shape: { ...hole, cx: 500 }, copies: null },
      ],
    })?.exclusions
    const centres = places?.map((place) =>
      place.kind === 'circle' ? [place.cx, place.cy].map(Math.round) : [],
    )
    expect(centres).toEqual([
      [700, 400],
      [500, 600],
      [300, 400],
      [500, 200],
      [500, 400],
    ])
  })

  it('gives each kind of face its millimetres; a bore is a leave-out and no size', () => {
    const sizes = [
      { shape: 'disc', diameterMm: 60 },
      { shape: 'annulus', diameterMm: 60, boreMm: 40 },
      { shape: 'block', widthMm: 35, heightMm: 9 },
      { shape: 'free', longestSideMm: 80 },
    ] as const
    expect(sizes.map((size) => input({}, size)?.size)).toEqual([
      { kind: 'round', diameterMm: 60 },
      { kind: 'round', diameterMm: 60 },
      { kind: 'block', widthMm: 35, heightMm: 9 },
      { kind: 'free', longestSideMm: 80 },
    ])
  })
})

describe('the engine’s input from a measuring file', () => {
  const file = {
    lightSource: { wavelengthNm: 632.8 },
    outline: { kind: 'circle', cx: 500, cy: 400, r: 300, diameterMm: 60 },
    traces: [{ order: 0, points: [[1, 2]] }, { points: [[3, 4]] }],
  }

  it('names the traces, and takes what isn’t in it as not stated', () => {
    const reading = fromMeasureFile(measureFileSchema.parse(file), null)
    expect(reading.traces).toEqual([
      { id: 'trace-1', order: 0, points: [[1, 2]] },
      { id: 'trace-2', order: null, points: [[3, 4]] },
    ])
    expect(reading.outline).toEqual({ kind: 'circle', cx: 500, cy: 400, r: 300 })
    expect(reading.setUp).toEqual({ ...setUp, wavelengthNm: 632.8 })
    expect([reading.edgeBandMm, reading.pressArrow, reading.mirrored]).toEqual([0, null, false])
  })

  it('has every uncertainty that is in it', () => {
    const stated = {
      ...file,
      lightSource: { wavelengthNm: 632.8, relativeUncertainty: 1e-4 },
      viewingAngleDeg: 12,
      viewingAngleUncertaintyDeg: 0.5,
      edgePlacementUncertaintyMm: 0.1,
      referenceFlatFormUm: 0.03,
      temperatureHalfWidthUm: 0.02,
      supportHalfWidthUm: 0.01,
      repeats: { standardDeviationUm: 0.01, count: 4 },
      nearCamera: { meanGapUm: 20, distanceMm: 300 },
    }
    expect(fromMeasureFile(measureFileSchema.parse(stated), null).setUp).toEqual({
      wavelengthNm: 632.8,
      wavelengthRelativeU: 1e-4,
      viewingAngleDeg: 12,
      viewingAngleUDeg: 0.5,
      edgePlacementUMm: 0.1,
      referenceFlatFormUm: 0.03,
      temperatureHalfWidthUm: 0.02,
      repeats: { standardDeviationUm: 0.01, count: 4 },
      nearCamera: { meanGapUm: 20, distanceMm: 300 },
      supportHalfWidthUm: 0.01,
    })
  })
})
