// Practice photographs and traces drawn by a program that shares no code with this one, their answers known: what this
// folder draws has to be like them.
import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { photoGeometry } from './camera'
import { gapBands } from './gap'
import type { Trace } from './hand-traces'
import knownScenes from './practice-scenes.json'
import {
  type Camera,
  type Face,
  type Form,
  type Lamp,
  plainScene,
  type RolledRim,
  type Scene,
  type Wedge,
} from './scene'
import { type SetUpFile, setUpFile } from './set-up-file'
import { type Truth, truthOf } from './truth'

/** What is known of a practice scene; its unevenness, dirt and camera noise don't matter to its figures. */
interface KnownScene {
  wavinessRmsUm: number
  lamp: Lamp
  face: Partial<Face>
  form: Form
  rolledRim: Partial<RolledRim>
  wedge: Partial<Wedge>
  camera: Partial<Camera>
}

const folder = 'tests/fixtures/practice'
const truths: Record<string, Truth> = JSON.parse(readFileSync(`${folder}/truth.json`, 'utf8'))
const practiceScenes = knownScenes as unknown as Record<string, KnownScene>
const names = Object.keys(practiceScenes)
const namesWithoutWaviness = names.filter((name) => practiceScenes[name].wavinessRmsUm === 0)

function practiceScene(name: string): Scene {
  const known = practiceScenes[name]
  const plain = plainScene(name, 1)
  return {
    ...plain,
    lamp: known.lamp,
    face: { ...plain.face, ...known.face },
    form: known.form,
    rolledRim: { ...plain.rolledRim, ...known.rolledRim },
    wedge: { ...plain.wedge, ...known.wedge },
    camera: { ...plain.camera, ...known.camera },
  }
}

function practiceFile(name: string): SetUpFile & { traces: Trace[] } {
  return JSON.parse(readFileSync(`${folder}/${name}.traced.json`, 'utf8'))
}

/** How far each click lies off its band, in px square to it, the one unknown fraction of a band taken out. */
function clickErrorsPx(scene: Scene, traces: readonly Trace[]): number[] {
  const gap = gapBands(scene)
  const { partFromPhoto } = photoGeometry(scene)
  const gapAt = (x: number, y: number) => gap(...partFromPhoto(x, y))
  const clicks = traces.flatMap(({ order, points }) => points.map((point) => ({ order, point })))
  const off = clicks.map(({ order, point }) => gapAt(...point) - order)
  const mean = off.reduce((sum, value) => sum + value, 0) / off.length
  return clicks.map(({ point: [x, y] }, i) => {
    const steepness = Math.hypot(gapAt(x + 0.5, y) - gapAt(x - 0.5, y), gapAt(x, y + 0.5) - gapAt(x, y - 0.5))
    return (off[i] - mean) / steepness
  })
}

describe('practice scenes', () => {
  it.each(namesWithoutWaviness)('%s has the practice answer', (name) => {
    const truth = truthOf(practiceScene(name))
    const practice = truths[name]
    // The practice answers stand on whole pixels and miss the last 0.4 % of a rise towards the rim.
    expect(truth.minimumZoneUm / practice.minimumZoneUm).toBeGreaterThan(0.999)
    expect(truth.minimumZoneUm / practice.minimumZoneUm).toBeLessThan(1.006)
    expect(truth.rmsUm / practice.rmsUm).toBeCloseTo(1, 2)
    expect(truth.curvatureUmPerMm2 / practice.curvatureUmPerMm2).toBeCloseTo(1, 2)
    expect(truth.bandUm).toBeCloseTo(practice.bandUm, 6)
    expect(truth.convex).toBe(practice.convex)
  })

  it.each(namesWithoutWaviness)('%s has the practice traces within their click noise', (name) => {
    const errors = clickErrorsPx(practiceScene(name), practiceFile(name).traces)
    const deviation = Math.sqrt(errors.reduce((sum, error) => sum + error * error, 0) / errors.length)
    expect(deviation).toBeGreaterThan(0.62)
    expect(deviation).toBeLessThan(0.78)
  })

  it.each(names)('%s is marked as in the practice file', (name) => {
    const ours = setUpFile(practiceScene(name))
    const theirs = practiceFile(name)
    expect(ours.lightSource).toEqual(theirs.lightSource)
    expect(ours.edgeExclusionMm).toBe(theirs.edgeExclusionMm)
    expect(ours.exclusions.length).toBe(theirs.exclusions.length)
    const numbers = (value: unknown) =>
      JSON.stringify(value)
        .match(/-?\d+\.?\d*/g)!
        .map(Number)
    const [marked, expected] = [numbers(ours.outline), numbers(theirs.outline)]
    for (let i = 0; i < expected.length; i++) expect(Math.abs(marked[i] - expected[i])).toBeLessThan(0.02)
  })
})
