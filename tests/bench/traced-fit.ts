import { readTraces, type TracedReading } from '@shared/metrology'
import { type Measurement, measurement } from './measurement'
import { percentile, timesOf } from './timing'

const bands = 40
const pointsEach = 60
const radiusPx = 900
const middlePx = 1000

/** Flatness with its uncertainty from 40 traces of 60 points on a face that is bowed, astigmatic and wavy. */
export async function benchTracedFit(): Promise<Measurement> {
  const reading = tracedReading()
  const { kind } = readTraces(reading)
  if (kind !== 'figure') throw new Error('The bench reading gave no figure.')
  const times = await timesOf(() => readTraces(reading), { rounds: 15, warmUp: 5 })
  return measurement(
    `traced fit, flatness and U, ${bands} × ${pointsEach} points`,
    percentile(times, 0.5),
    100,
  )
}

function tracedReading(): TracedReading {
  return {
    outline: { kind: 'circle', cx: middlePx, cy: middlePx, r: radiusPx },
    size: { kind: 'round', diameterMm: 60 },
    exclusions: [],
    edgeBandMm: 1,
    pressArrow: { x: middlePx, y: middlePx, dx: 0, dy: 1 },
    traces: Array.from({ length: bands }, (_, i) => bandTrace(i - (bands - 1) / 2, i)),
    photo: { widthPx: 2 * middlePx, heightPx: 2 * middlePx },
    mirrored: false,
    setUp: {
      wavelengthNm: 589.3,
      wavelengthRelativeU: 0.0005,
      viewingAngleDeg: 0,
      viewingAngleUDeg: 1,
      edgePlacementUMm: 0.05,
      referenceFlatFormUm: 0.03,
      temperatureHalfWidthUm: 0.01,
      repeats: null,
      nearCamera: null,
      supportHalfWidthUm: null,
    },
  }
}

/** The line y(x) where the gap is a whole band: found step by step, since the bow bends it. */
function bandTrace(step: number, order: number): TracedReading['traces'][number] {
  const spacing = (2 * radiusPx) / (bands + 2)
  const half = Math.sqrt(radiusPx ** 2 - (step * spacing) ** 2) * 0.94
  const points = Array.from({ length: pointsEach }, (_, k): [number, number] => {
    const x = -half + (2 * half * k) / (pointsEach - 1)
    let y = step * spacing
    for (let i = 0; i < 30; i++) y = (step - formBands(x / radiusPx, y / radiusPx)) * spacing
    return [middlePx + x + click(order, k), middlePx + y + click(k, order)]
  })
  return { id: `band-${order}`, order, points: points.filter(isOnFace) }
}

function formBands(x: number, y: number): number {
  return 0.9 * (x * x + y * y) + 0.3 * (x * x - y * y) + 0.05 * Math.sin(5 * x) * Math.cos(4 * y)
}

function isOnFace([x, y]: [number, number]): boolean {
  return Math.hypot(x - middlePx, y - middlePx) < radiusPx
}

/** A hand's ± 0.7 px, the same at every run. */
function click(a: number, b: number): number {
  const turn = Math.sin(a * 127.1 + b * 311.7) * 43_758.5453
  return (turn - Math.floor(turn) - 0.5) * 1.4
}
