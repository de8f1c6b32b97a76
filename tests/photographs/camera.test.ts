import { describe, expect, it } from 'vitest'
import { photoGeometry } from './camera'
import { plainScene, type Scene } from './scene'
import { setUpFile } from './set-up-file'

function tiltedScene(): Scene {
  const scene = plainScene('tilted', 1)
  scene.camera = { ...scene.camera, viewingAngleDeg: 35, recedesDeg: 70, turnDeg: 25 }
  return scene
}

describe('photo geometry', () => {
  it.each([0, 0.006, -0.006])(
    'leads back to the part place it came from with distortion %s',
    (distortion) => {
      const scene = tiltedScene()
      scene.camera = { ...scene.camera, distortion, offsetMm: [2, -1] }
      const { photoFromPart, partFromPhoto } = photoGeometry(scene)
      const [x, y] = partFromPhoto(...photoFromPart(11.3, -7.9))
      expect(x).toBeCloseTo(11.3, 9)
      expect(y).toBeCloseTo(-7.9, 9)
    },
  )

  it('shows the near half of a tilted face larger than the far half', () => {
    const scene = plainScene('tilted', 1)
    scene.camera = { ...scene.camera, viewingAngleDeg: 30, recedesDeg: 90 }
    const { photoFromPart } = photoGeometry(scene)
    const middle = photoFromPart(0, 0)[1]
    const near = middle - photoFromPart(0, -20)[1]
    const far = photoFromPart(0, 20)[1] - middle
    const nearness = (20 * Math.sin(Math.PI / 6)) / (6 * 40)
    expect(near / far).toBeCloseTo((1 + nearness) / (1 - nearness), 9)
  })

  it('turns the piece clockwise as seen', () => {
    const scene = plainScene('turned', 1)
    scene.camera = { ...scene.camera, turnDeg: 90 }
    const [x, y] = photoGeometry(scene).photoFromPart(10, 0)
    expect(x).toBeCloseTo(799.5, 9)
    expect(y).toBeGreaterThan(599.5)
  })

  it('marks a tilted disc by the ellipse on which its rim lies', () => {
    const scene = tiltedScene()
    const { outline } = setUpFile(scene)
    if (outline.kind !== 'ellipse') throw new Error('The outline is no ellipse.')
    const axis = (outline.rotationDeg * Math.PI) / 180
    for (let degree = 0; degree < 360; degree += 15) {
      const angle = (degree * Math.PI) / 180
      const [x, y] = photoGeometry(scene).photoFromPart(20 * Math.cos(angle), 20 * Math.sin(angle))
      const along = (x - outline.cx) * Math.cos(axis) + (y - outline.cy) * Math.sin(axis)
      const across = -(x - outline.cx) * Math.sin(axis) + (y - outline.cy) * Math.cos(axis)
      expect(Math.hypot(along / outline.rx, across / outline.ry)).toBeCloseTo(1, 4)
    }
  })
})
