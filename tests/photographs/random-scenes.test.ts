import { describe, expect, it } from 'vitest'
import { photoGeometry } from './camera'
import { handTraces } from './hand-traces'
import { measuredArea } from './measured-area'
import { randomPair } from './random-pair'
import { families, randomScene } from './random-scenes'
import { setUpFile } from './set-up-file'

describe('random scenes', () => {
  it.each(families)('of family %s are the same for the same seed and others for another', (family) => {
    expect(randomScene(family, 21)).toEqual(randomScene(family, 21))
    expect(randomScene(family, 21).wedge).not.toEqual(randomScene(family, 22).wedge)
  })

  it.each(families)('of family %s show the whole face and three bands or more', (family) => {
    for (let seed = 40; seed < 44; seed++) {
      const scene = randomScene(family, seed)
      const { photoFromPart } = photoGeometry(scene)
      const border = measuredArea({ ...scene.face, edgeBandMm: 0 }).borderPlacesMm()
      const isOutside = ([x, y]: readonly [number, number]) =>
        x < 0 || x > scene.camera.widthPx - 1 || y < 0 || y > scene.camera.heightPx - 1
      expect(border.map((place) => photoFromPart(...place)).filter(isOutside)).toEqual([])
      expect(handTraces(scene, 1).length).toBeGreaterThanOrEqual(3)
    }
  })

  it('press where the face is measured, along a direction of length one', () => {
    const scene = randomScene('valve-plate', 5)
    const { pressTest } = setUpFile(scene)
    const place = photoGeometry(scene).partFromPhoto(pressTest.x, pressTest.y)
    expect(measuredArea(scene.face).holds(...place)).toBe(true)
    expect(Math.hypot(pressTest.dx, pressTest.dy)).toBeCloseTo(1, 2)
  })

  it('give pairs one waviness, one set of marks and a turn between the photographs', () => {
    const { before, after, turnedDeg } = randomPair(6)
    expect(after.waviness).toEqual(before.waviness)
    expect(after.face).toEqual(before.face)
    const [mark] = before.face.datumMarksMm
    const angleOf = (scene: typeof before) => {
      const [x, y] = photoGeometry(scene).photoFromPart(...mark)
      return (Math.atan2(y - 599.5, x - 799.5) * 180) / Math.PI
    }
    expect((angleOf(after) - angleOf(before) + 720) % 360).toBeCloseTo(turnedDeg, 6)
  })
})
