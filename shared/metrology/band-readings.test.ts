import { describe, expect, it } from 'vitest'
import { type PartFrame, partFrame } from '../geometry/part-frame'
import type { Trace } from '../schemas/marks'
import { readBands, worstBand } from './band-readings'

/** Helium d, half a wavelength (published wavelength, derived here). */
const bandUm = 0.2937809
const photo = { widthPx: 1600, heightPx: 1200 }

function discFrame(): PartFrame {
  const made = partFrame(
    { kind: 'circle', cx: 800, cy: 600, r: 480 },
    { kind: 'round', diameterMm: 48 },
    { viewingAngleDeg: 0, photo, mirrored: false },
  )
  if ('problem' in made) throw new Error(made.problem)
  return made
}

function tiltedFrame(): PartFrame {
  const made = partFrame(
    { kind: 'ellipse', cx: 800, cy: 560, rx: 480, ry: 418, rotationDeg: 20 },
    { kind: 'round', diameterMm: 48 },
    { viewingAngleDeg: 30, photo, mirrored: false },
  )
  if ('problem' in made) throw new Error(made.problem)
  return made
}

/** Bands along a direction, bowed as parabolas with the given bow and pitch in mm. */
function bowed(frame: PartFrame, orders: number[], bowMm: number, pitchMm: number, turnDeg = 0): Trace[] {
  const turn = (turnDeg * Math.PI) / 180
  return orders.map((order) => ({
    id: `band ${order}`,
    order,
    points: Array.from({ length: 41 }, (_, k): [number, number] => {
      const t = k / 20 - 1
      const [u, v] = [15 * t, order * pitchMm + bowMm * (1 - t * t)]
      return [...frame.toPx(u * Math.cos(turn) - v * Math.sin(turn), u * Math.sin(turn) + v * Math.cos(turn))]
    }),
  }))
}

describe('the shop’s reading of bands', () => {
  // (b/s)·λ/2, common practice; values for helium derived here.
  it.each([
    [1, 2, 0.14689],
    [2.5, 10, 0.073445],
    [4.2, 14, 0.088134],
    [9, 3, 0.88134],
  ])('a bow of %s on a pitch of %s', (bow, pitch, flatnessUm) => {
    const readings = readBands(bowed(discFrame(), [-1, 0, 1], bow, pitch), discFrame(), bandUm)
    expect(readings).toHaveLength(3)
    for (const reading of readings) {
      expect(reading.flatnessUm).toBeCloseTo(flatnessUm, 5)
      expect(reading.bowPx).toBeCloseTo(20 * bow, 3)
      expect(reading.spacingPx).toBeCloseTo(20 * pitch, 3)
    }
  })

  it('is the same whichever way bands run or bow, and by a camera at an angle', () => {
    for (const frame of [discFrame(), tiltedFrame()]) {
      for (const [bow, turn] of [
        [1, 0],
        [-1, 0],
        [1, 37],
        [-1, 90],
      ] as const) {
        for (const reading of readBands(bowed(frame, [3, 4, 5], bow, 4, turn), frame, bandUm))
          expect(reading.flatnessUm).toBeCloseTo(bandUm / 4, 4)
      }
    }
  })

  it('of straight bands is nothing', () => {
    for (const reading of readBands(bowed(discFrame(), [0, 1, 2], 0, 4), discFrame(), bandUm))
      expect(reading.flatnessUm).toBeCloseTo(0, 9)
  })

  it('names the chord’s ends and the place of the greatest bow', () => {
    const frame = discFrame()
    const traces = bowed(frame, [0, 1], 1, 4)
    const [first] = readBands(traces, frame, bandUm)
    expect(first!.traceId).toBe('band 0')
    expect(first!.chord[0]).toEqual(traces[0]!.points[0]!.map((v) => expect.closeTo(v, 6)))
    expect(first!.chord[1]).toEqual(traces[0]!.points[40]!.map((v) => expect.closeTo(v, 6)))
    expect(first!.bowAt).toEqual(traces[0]!.points[20]!.map((v) => expect.closeTo(v, 3)))
  })

  it('has its pitch from the mean of both sides, from one side at the end', () => {
    const frame = discFrame()
    const at = (order: number, yMm: number): Trace => ({
      ...bowed(frame, [order], 0, 0)[0]!,
      points: bowed(frame, [0], 1, 0)[0]!.points.map(([x, y]) => [x, y + yMm * 20]),
    })
    const [a, b, c] = readBands([at(0, 0), at(1, 4), at(2, 10)], frame, bandUm)
    expect(a!.spacingPx).toBeCloseTo(80, 3)
    expect(b!.spacingPx).toBeCloseTo(100, 3)
    expect(c!.spacingPx).toBeCloseTo(120, 3)
  })

  it('isn’t to be had for rings, bands without a neighbour or a number, and a few clicks', () => {
    const frame = discFrame()
    const ring = (order: number, radius: number): Trace => ({
      id: `ring ${order}`,
      order,
      points: Array.from({ length: 40 }, (_, k) => [
        800 + radius * Math.cos((k * Math.PI) / 20),
        600 + radius * Math.sin((k * Math.PI) / 20),
      ]),
    })
    expect(readBands([ring(0, 100), ring(1, 180)], frame, bandUm)).toEqual([])
    expect(readBands(bowed(frame, [0, 2], 1, 4), frame, bandUm)).toEqual([])
    const [one, two] = bowed(frame, [0, 1], 1, 4)
    expect(readBands([one!, { ...two!, order: null }], frame, bandUm)).toEqual([])
    expect(readBands([one!, { ...two!, points: two!.points.slice(0, 3) }], frame, bandUm)).toEqual([])
  })

  it('worst of all is the one that reads most', () => {
    const frame = discFrame()
    const readings = readBands(
      [...bowed(frame, [0, 1], 0.5, 4), ...bowed(frame, [2], 2, 4), ...bowed(frame, [3], 0.5, 4)],
      frame,
      bandUm,
    )
    expect(worstBand(readings)?.order).toBe(2)
    expect(worstBand([])).toBeNull()
  })
})
