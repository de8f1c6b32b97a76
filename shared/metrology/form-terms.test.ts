import { describe, expect, it } from 'vitest'
import { type FormFit, fitForm, formStatements, formWord, type SampledForm } from './form-terms'
import type { FormTerms } from './types'

const scales = { acrossMm: 40, edgeBandMm: 0 }

/** A disc of 40 mm sampled each half millimetre, with its rim at weight nought. */
function disc(heightUm: (x: number, y: number) => number): SampledForm {
  const places: [number, number, number][] = []
  for (let y = -20; y <= 20; y += 0.5)
    for (let x = -20; x <= 20; x += 0.5) if (Math.hypot(x, y) < 20) places.push([x, y, 0.25])
  for (let k = 0; k < 360; k++)
    places.push([20 * Math.cos((k * Math.PI) / 180), 20 * Math.sin((k * Math.PI) / 180), 0])
  return {
    xMm: Float64Array.from(places, ([x]) => x),
    yMm: Float64Array.from(places, ([, y]) => y),
    weightMm2: Float64Array.from(places, ([, , w]) => w),
    heightUm: Float64Array.from(places, ([x, y]) => heightUm(x, y)),
    rimDistanceMm: Float64Array.from(places, ([x, y]) => 20 - Math.hypot(x, y)),
  }
}

function fitted(heightUm: (x: number, y: number) => number): FormFit {
  const fit = fitForm(disc(heightUm), scales)
  if (!fit) throw new Error('no fit')
  return fit
}

/** 2 mm wide, a slope down to so many µm at the very rim. */
const roll = (um: number, x: number, y: number) => um * Math.max(0, (Math.hypot(x, y) - 18) / 2)

const termsOf = (fit: FormFit): FormTerms => ({
  sagittaUm: fit.sagittaUm,
  sagittaUUm: 0.05,
  radiusOfCurvatureM: null,
  saddlePeakToValleyUm: fit.saddlePeakToValleyUm,
  saddleHighAxisDeg: fit.saddleHighAxisDeg,
  edgeDropUm: fit.edgeDropUm,
  edgeDropWidthMm: fit.edgeDropWidthMm,
  edgeDropWorstHour: fit.edgeDropWorstHour,
  remainderRmsUm: fit.remainderRmsUm,
})
const codes = (fit: FormFit, flatnessUm: number, signKnown = true) => {
  const word = formWord(fit, flatnessUm, 0.05, signKnown)
  return { word, statements: formStatements(fit, termsOf(fit), word, 0.05, signKnown) }
}

// Closed forms derived here.
describe('what a form is made of', () => {
  it('a cap, tilted, is its sagitta and nothing else', () => {
    const fit = fitted((x, y) => 0.6 * (1 - (x * x + y * y) / 400) + 0.1 * x - 0.05 * y + 3)
    expect(fit.sagittaUm).toBeCloseTo(0.6, 9)
    expect(fit.spherePeakToValleyUm).toBeCloseTo(0.6, 9)
    expect(fit.saddlePeakToValleyUm).toBeCloseTo(0, 9)
    expect(fit.edgeDropUm).toBeCloseTo(0, 9)
    expect(fit.remainderRmsUm).toBeCloseTo(0, 9)
  })

  it.each([0, 30, 45, -60, 85])('a saddle high along %s° is its peak to valley', (axisDeg) => {
    const axis = (axisDeg * Math.PI) / 180
    const fit = fitted((x, y) => {
      const [u, v] = [x * Math.cos(axis) + y * Math.sin(axis), -x * Math.sin(axis) + y * Math.cos(axis)]
      return (0.25 * (u * u - v * v)) / 400
    })
    expect(fit.saddlePeakToValleyUm).toBeCloseTo(0.5, 3)
    expect(fit.saddleHighAxisDeg).toBeCloseTo(axisDeg, 6)
    expect(fit.sagittaUm).toBeCloseTo(0, 9)
  })

  it('an even rolled rim drops all round, and names no hour', () => {
    const fit = fitted((x, y) => roll(-0.6, x, y))
    // Mean over the ring of 18 to 20 mm of (r − 18)/2 is 0.5088.
    expect(fit.edgeDropUm).toBeCloseTo(-0.6 * 0.5088, 1)
    expect(fit.edgeDropWidthMm).toBeCloseTo(2, 12)
    expect(fit.edgeDropWorstHour).toBeNull()
    expect(fit.innerSagittaUm).toBeCloseTo(0, 9)
  })

  it.each([
    [12, 0, -1],
    [3, 1, 0],
    [6, 0, 1],
    [9, -1, 0],
    [1, Math.sin(Math.PI / 6), -Math.cos(Math.PI / 6)],
  ])('a rim rolled at %s o’clock names the hour', (hour, ux, uy) => {
    const fit = fitted((x, y) => ((x * ux + y * uy) / Math.hypot(x, y) > 0.93 ? roll(-1, x, y) : 0))
    expect(fit.edgeDropWorstHour).toBe(hour)
  })

  it('isn’t to be had from places on a line', () => {
    const line: SampledForm = {
      xMm: Float64Array.of(0, 1, 2, 3, 4, 5, 6, 7),
      yMm: new Float64Array(8),
      weightMm2: new Float64Array(8).fill(1),
      heightUm: Float64Array.of(0, 1, 0, 1, 0, 1, 0, 1),
      rimDistanceMm: new Float64Array(8).fill(9),
    }
    expect(fitForm(line, scales)).toBeNull()
  })
})

describe('the form in words', () => {
  it('a high and a hollow middle are told with the press arrow, a bow without', () => {
    const high = fitted((x, y) => -0.6 * ((x * x + y * y) / 400))
    const hollow = fitted((x, y) => 0.6 * ((x * x + y * y) / 400))
    expect(codes(high, 0.6).word).toBe('convex')
    expect(codes(high, 0.6).statements.map((s) => s.code)).toEqual(['highMiddle'])
    expect(codes(hollow, 0.6).word).toBe('concave')
    expect(codes(hollow, 0.6).statements.map((s) => s.code)).toEqual(['hollow'])
    expect(codes(hollow, 0.6, false).word).toBe('unknown')
    expect(codes(hollow, 0.6, false).statements.map((s) => s.code)).toEqual(['bowedUnsigned'])
  })

  it('a saddle names its high and low hours', () => {
    const saddle = fitted((x, y) => (0.3 * (x * x - y * y)) / 400)
    const { word, statements } = codes(saddle, 0.6)
    expect(word).toBe('saddle')
    expect(statements[0]).toMatchObject({
      code: 'saddle',
      params: { high: 3, highOpposite: 9, low: 6, lowOpposite: 12 },
    })
    expect(codes(saddle, 0.6, false).statements[0]!.code).toBe('saddleUnsigned')
  })

  it('what doesn’t stand out of U is flat within the reading', () => {
    const flat = fitted((x, y) => 0.03 * (1 - (x * x + y * y) / 400))
    expect(codes(flat, 0.03).word).toBe('flat')
    expect(codes(flat, 0.03).statements.map((s) => s.code)).toEqual(['flatWithinReading'])
  })

  it('a form that neither sphere nor saddle explains is irregular', () => {
    const ripple = fitted((x) => 0.3 * Math.sin(x))
    expect(codes(ripple, 0.6).word).toBe('irregular')
    expect(codes(ripple, 0.6).statements.map((s) => s.code)).toEqual(['irregular'])
  })

  it('a rolled rim is told beside the middle that the roll doesn’t reach', () => {
    const fit = fitted((x, y) => 0.3 * (1 - (x * x + y * y) / 400) + roll(-0.8, x, y))
    const { statements } = codes(fit, 1.1)
    expect(statements.map((s) => s.code)).toEqual(['highMiddle', 'rolledRim'])
    expect(statements[0]!.params.heightUm).toBeCloseTo(0.3, 6)
  })
})
