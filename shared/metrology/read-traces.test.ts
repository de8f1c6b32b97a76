import { describe, expect, it } from 'vitest'
import { bareSetUp, cap, closedFormReading, discPx, plane, saddle } from './closed-form.fixture'
import { readTraces } from './read-traces'
import { seededNormal } from './seeded-normal.fixture'
import type { FlatnessResult, TracedReading } from './types'

function figure(reading: TracedReading): FlatnessResult {
  const outcome = readTraces(reading)
  if (outcome.kind === 'refused') throw new Error(outcome.findings.map((f) => f.code).join(', '))
  return outcome.result
}

function refusalCodes(reading: TracedReading): string[] {
  const outcome = readTraces(reading)
  return outcome.kind === 'refused' ? outcome.findings.map((f) => f.code) : []
}

/** Radius of the measured area over that of the face: the edge band is 0.8 of 20 mm. */
const measured = 19.2 / 20
/** The outermost pixels stand up to a pixel inside the area's rim: so much of a form's height over the face. */
const pixelLoss = 2 / discPx.r

describe('faces in closed form', () => {
  it('reads nothing from a tilted plane', () => {
    const result = figure(closedFormReading(plane))
    expect(result.flatness.minimumZoneUm).toBeLessThan(1e-6)
    expect(result.flatness.leastSquaresUm).toBeLessThan(1e-6)
    expect(result.form).toBe('flat')
  })

  it.each([0.5, -0.5, 1.2])('reads the sag of a sphere cap of %s µm with its sign', (sagittaUm) => {
    const result = figure(closedFormReading(cap(sagittaUm)))
    const expected = Math.abs(sagittaUm) * measured ** 2
    expect(Math.abs(result.flatness.minimumZoneUm - expected)).toBeLessThan(pixelLoss * Math.abs(sagittaUm))
    expect(result.terms.sagittaUm).toBeCloseTo(sagittaUm, 4)
    expect(result.form).toBe(sagittaUm > 0 ? 'convex' : 'concave')
    // R = D² / (8 s): 40² mm² over 8 × 0.5 µm is 400 m.
    expect(result.terms.radiusOfCurvatureM).toBeCloseTo(1600 / (8 * sagittaUm), 1)
  })

  it('reads a saddle: both signs, its high axis along x', () => {
    const result = figure(closedFormReading(saddle(0.4)))
    const expected = 2 * 0.4 * measured ** 2
    expect(Math.abs(result.flatness.minimumZoneUm - expected)).toBeLessThan(pixelLoss * 0.8)
    expect(result.form).toBe('saddle')
    expect(result.terms.saddleHighAxisDeg).toBeCloseTo(0, 1)
    expect(Math.abs(result.terms.sagittaUm ?? 1)).toBeLessThan(1e-3)
  })

  it('finds the highest place in the middle of a cap and the lowest on the rim', () => {
    const { peak, valley } = figure(closedFormReading(cap(0.6)))
    expect(Math.hypot(peak.xMm, peak.yMm)).toBeLessThan(1)
    expect(Math.hypot(valley.xMm, valley.yMm)).toBeGreaterThan(19)
  })

  it('gives peak and valley that add up to the least squares figure, and a minimum zone no larger', () => {
    const { flatness } = figure(closedFormReading((x, y) => cap(0.3)(x, y) + saddle(0.2)(x, y)))
    expect(flatness.peakUm + flatness.valleyUm).toBeCloseTo(flatness.leastSquaresUm, 9)
    expect(flatness.minimumZoneUm).toBeLessThanOrEqual(flatness.leastSquaresUm + 1e-12)
  })

  it('gives the same figures twice, to the last digit', () => {
    const reading = closedFormReading(cap(0.4), { clickError: seededNormal(3, 0.7) })
    expect(figure(reading)).toEqual(figure(reading))
  })

  it('covers the true figure of a noisy hand with U, seed after seed', () => {
    const truth = 0.5 * measured ** 2
    for (let seed = 1; seed <= 12; seed++) {
      const reading = closedFormReading(cap(0.5), { clickError: seededNormal(seed, 0.7) })
      const result = figure(reading)
      expect(Math.abs(result.flatness.minimumZoneUm - truth)).toBeLessThan(
        result.expandedUncertaintyUm + pixelLoss * 0.5,
      )
      expect(result.fit.clickNoisePx).toBeGreaterThan(0.6)
      expect(result.fit.clickNoisePx).toBeLessThan(0.8)
    }
  })
})

describe('what must not matter', () => {
  const form = (x: number, y: number) => cap(0.35)(x, y) + saddle(0.15)(x, y)
  const reading = closedFormReading(form)
  const base = figure(reading)
  const moved = (map: (x: number, y: number) => [number, number], change: Partial<TracedReading> = {}) => ({
    ...reading,
    traces: reading.traces.map((t) => ({ ...t, points: t.points.map(([x, y]) => map(x, y)) })),
    ...change,
  })

  it('turning the photograph leaves every figure as it is', () => {
    const angle = 0.7
    const turn = (x: number, y: number): [number, number] => [
      800 + (x - 800) * Math.cos(angle) - (y - 600) * Math.sin(angle),
      600 + (x - 800) * Math.sin(angle) + (y - 600) * Math.cos(angle),
    ]
    const arrow = { x: 800, y: 600, dx: Math.cos(angle), dy: Math.sin(angle) }
    const turned = figure(moved(turn, { pressArrow: arrow }))
    expect(Math.abs(turned.flatness.minimumZoneUm - base.flatness.minimumZoneUm)).toBeLessThan(
      pixelLoss * 0.5,
    )
    expect(turned.terms.sagittaUm).toBeCloseTo(base.terms.sagittaUm!, 3)
  })

  it('shifting the face by whole pixels changes nothing', () => {
    const shifted = figure(
      moved((x, y) => [x + 37, y - 21], {
        outline: { kind: 'circle', cx: 837, cy: 579, r: discPx.r },
        pressArrow: { x: 837, y: 579, dx: 1, dy: 0 },
      }),
    )
    expect(shifted.flatness.minimumZoneUm).toBeCloseTo(base.flatness.minimumZoneUm, 6)
  })

  it('a photograph of twice the pixels gives the same figure', () => {
    const larger = figure(
      moved((x, y) => [2 * x, 2 * y], {
        outline: { kind: 'circle', cx: 1600, cy: 1200, r: 2 * discPx.r },
        pressArrow: { x: 1600, y: 1200, dx: 1, dy: 0 },
        photo: { widthPx: 3200, heightPx: 2400 },
      }),
    )
    expect(Math.abs(larger.flatness.minimumZoneUm - base.flatness.minimumZoneUm)).toBeLessThan(
      pixelLoss * 0.5,
    )
  })

  it('a photograph by a mirror, with its flag, gives the same heights on the part turned over left to right', () => {
    const mirrored = figure({ ...reading, mirrored: true })
    expect(mirrored.flatness.minimumZoneUm).toBeCloseTo(base.flatness.minimumZoneUm, 6)
    expect(mirrored.peak.xMm).toBeCloseTo(-base.peak.xMm, 6)
    expect(mirrored.peak.yMm).toBeCloseTo(base.peak.yMm, 6)
  })

  it('numbering from another order changes nothing', () => {
    const renumbered = figure({
      ...reading,
      traces: reading.traces.map((t) => ({ ...t, order: t.order! + 17 })),
    })
    expect(renumbered.flatness.minimumZoneUm).toBeCloseTo(base.flatness.minimumZoneUm, 9)
  })

  it('twice the wavelength gives twice the heights', () => {
    const doubled = figure({ ...reading, setUp: { ...bareSetUp, wavelengthNm: 2 * bareSetUp.wavelengthNm } })
    expect(doubled.flatness.minimumZoneUm).toBeCloseTo(2 * base.flatness.minimumZoneUm, 9)
  })
})

describe('the press arrow', () => {
  it('left out leaves high and hollow unsaid and the figure standing', () => {
    const reading = { ...closedFormReading(cap(0.5)), pressArrow: null }
    const result = figure(reading)
    expect(result.signKnown).toBe(false)
    expect(result.terms.sagittaUm).toBeNull()
    expect(result.form).toBe('unknown')
    expect(result.findings.map((f) => f.code)).toContain('noPressArrow')
    expect(result.flatness.minimumZoneUm).toBeGreaterThan(0.4)
  })

  it('against the numbers is refused', () => {
    const reading = closedFormReading(cap(0.5))
    expect(refusalCodes({ ...reading, pressArrow: { x: 800, y: 600, dx: -1, dy: 0 } })).toEqual([
      'orderAgainstPressArrow',
    ])
  })

  it('along the bands is called unclear', () => {
    const result = figure({ ...closedFormReading(plane), pressArrow: { x: 800, y: 600, dx: 0, dy: 1 } })
    expect(result.signKnown).toBe(false)
    expect(result.findings.map((f) => f.code)).toContain('pressArrowUnclear')
  })
})

describe('too little to go on', () => {
  const reading = closedFormReading(cap(0.4))

  it('asks for bands when none is traced', () => {
    expect(refusalCodes({ ...reading, traces: [] })).toEqual(['noBands'])
  })

  it('refuses two dark bands and reads three', () => {
    const few = closedFormReading(cap(0.1), { wedgeBands: 3.2 })
    expect(few.traces).toHaveLength(3)
    expect(refusalCodes({ ...few, traces: few.traces.slice(0, 2) })).toEqual(['tooFewBands'])
    expect(readTraces(few).kind).toBe('figure')
  })

  it('refuses a band without a number and says which', () => {
    const traces = reading.traces.map((t, i) => (i === 4 ? { ...t, order: null } : t))
    const outcome = readTraces({ ...reading, traces })
    expect(outcome.kind).toBe('refused')
    if (outcome.kind === 'refused')
      expect(outcome.findings[0]).toMatchObject({ code: 'orderMissing', traceIds: [traces[4]!.id] })
  })

  it('refuses clicks that all lie on one line', () => {
    const traces = reading.traces.map((t) => {
      const [x, y] = t.points[t.points.length >> 1]!
      return { ...t, points: [[x, y] as [number, number], [x, y + 1] as [number, number]] }
    })
    expect(refusalCodes({ ...reading, traces })).toEqual(['crossingsOnOneLine'])
  })

  it('refuses when edge band and leave-outs leave nothing to measure', () => {
    expect(refusalCodes({ ...reading, edgeBandMm: 25 })).toEqual(['nothingMeasured'])
  })

  it('refuses an outline without extent', () => {
    const outline = { kind: 'ellipse' as const, cx: 800, cy: 600, rx: 400, ry: 1e-9, rotationDeg: 0 }
    expect(refusalCodes({ ...reading, outline })).toEqual(['outlineDegenerate'])
  })
})

describe('mistakes in the traces', () => {
  const clean = closedFormReading(cap(0.4), { clickError: seededNormal(8, 0.6) })

  it('a few wild clicks hardly move the figure and are told of', () => {
    const traces = clean.traces.map((t, i) => ({
      ...t,
      points: t.points.map(([x, y], k) =>
        i % 4 === 1 && k === 5 ? ([x + 14, y] as [number, number]) : ([x, y] as [number, number]),
      ),
    }))
    const wild = figure({ ...clean, traces })
    const base = figure(clean)
    expect(Math.abs(wild.flatness.minimumZoneUm - base.flatness.minimumZoneUm)).toBeLessThan(0.004)
    expect(wild.findings.map((f) => f.code)).toContain('clicksSetAside')
  })

  it('a band numbered one off is named, and no figure is given', () => {
    const traces = clean.traces.map((t, i) => (i === 6 ? { ...t, order: t.order! + 1 } : t))
    const outcome = readTraces({ ...clean, traces })
    expect(outcome.kind).toBe('refused')
    if (outcome.kind === 'refused') {
      expect(outcome.findings).toMatchObject([{ code: 'neighboursDiffer', traceIds: [clean.traces[6]!.id] }])
    }
  })

  it('two bands that cross are shown where they do', () => {
    const traces = clean.traces.map((t, i) => {
      if (i !== 5) return t
      const next = clean.traces[6]!.points
      return {
        ...t,
        points: t.points.map((p, k) =>
          k > t.points.length / 2
            ? ([next[Math.min(k, next.length - 1)]![0] + 9, p[1]] as [number, number])
            : p,
        ),
      }
    })
    const outcome = readTraces({ ...clean, traces })
    const findings = outcome.kind === 'figure' ? outcome.result.findings : outcome.findings
    const crossing = findings.find((f) => f.code === 'bandsCross')
    expect(crossing?.traceIds).toEqual([clean.traces[5]!.id, clean.traces[6]!.id])
    expect(crossing?.place).not.toBeNull()
  })
})

describe('support', () => {
  it('is told when bands cover part of the face only, and refused when they hardly do', () => {
    const reading = closedFormReading(cap(0.2))
    const most = figure({ ...reading, traces: reading.traces.slice(3) })
    expect(most.supportedShare).toBeLessThan(0.9)
    expect(most.findings.map((f) => f.code)).toContain('partlySupported')
    expect(refusalCodes({ ...reading, traces: reading.traces.slice(0, 4) })).not.toEqual([])
  })
})
