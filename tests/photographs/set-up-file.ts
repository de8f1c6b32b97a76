import { type PhotoGeometry, type PlacePx, photoGeometry } from './camera'
import { widening } from './dark-bands'
import type { Trace } from './hand-traces'
import { leaveOuts, measuredArea } from './measured-area'
import { faceRadiusMm, lampWavelengthsNm, type PlaceMm, type Scene } from './scene'
import { seededRandom } from './seeded-random'

type CircleMark = { kind: 'circle'; cx: number; cy: number; r: number }
type EllipseMark = { kind: 'ellipse'; cx: number; cy: number; rx: number; ry: number; rotationDeg: number }
type PolygonMark = { kind: 'polygon'; points: PlacePx[] }

export type OutlineMark =
  | ((CircleMark | EllipseMark) & { diameterMm: number })
  | (PolygonMark & { widthMm: number; heightMm: number })

/** What an inspector knows and marks, as the measuring command reads it. */
export interface SetUpFile {
  photo: string
  lightSource: { wavelengthNm: number }
  viewingAngleDeg: number
  outline: OutlineMark
  exclusions: (CircleMark | EllipseMark | PolygonMark)[]
  edgeExclusionMm: number
  datumMarks?: PlacePx[]
  pressTest: { x: number; y: number; dx: number; dy: number }
  traces?: Trace[]
}

const fileExtensions = { jpeg: 'jpg', png8: 'png', png16: 'png', tiff8: 'tif', webp: 'webp' } as const

function rounded(value: number, digits: number): number {
  const factor = 10 ** digits
  return Math.round(value * factor) / factor
}

function roundedPlace([x, y]: PlacePx, digits: number): PlacePx {
  return [rounded(x, digits), rounded(y, digits)]
}

/** The circle that a person lays over the photographed rim: mean middle and mean radius. */
function circleMark(geometry: PhotoGeometry, radiusMm: number): CircleMark {
  const rim = Array.from({ length: 360 }, (_, index) => {
    const angle = (index * Math.PI) / 180
    return geometry.photoFromPart(radiusMm * Math.cos(angle), radiusMm * Math.sin(angle))
  })
  const cx = rim.reduce((sum, place) => sum + place[0], 0) / rim.length
  const cy = rim.reduce((sum, place) => sum + place[1], 0) / rim.length
  const r = rim.reduce((sum, place) => sum + Math.hypot(place[0] - cx, place[1] - cy), 0) / rim.length
  return { kind: 'circle', cx: rounded(cx, 2), cy: rounded(cy, 2), r: rounded(r, 2) }
}

/**
 * A circle round the face's middle, tilted by t and seen from a distance, is an ellipse. With s = r sin t / distance its half
 * axes are r/√(1 − s²) square to the tilt and r cos t/(1 − s²) along it, and its middle is moved by −r s cos t/(1 − s²).
 */
function ellipseMark(scene: Scene, geometry: PhotoGeometry, radiusMm: number): EllipseMark {
  const { camera, face } = scene
  const angle = (camera.viewingAngleDeg * Math.PI) / 180
  const recede = (camera.recedesDeg * Math.PI) / 180
  const s = (radiusMm * Math.sin(angle)) / (camera.distanceInFaceSizes * 2 * faceRadiusMm(face))
  const radiusPx = radiusMm * geometry.pxPerMm
  const along = (radiusPx * Math.cos(angle)) / (1 - s * s)
  const [cx, cy] = geometry.photoFromPart(0, 0)
  return {
    kind: 'ellipse',
    cx: rounded(cx - along * s * Math.cos(recede), 2),
    cy: rounded(cy - along * s * Math.sin(recede), 2),
    rx: rounded(radiusPx / Math.sqrt(1 - s * s), 2),
    ry: rounded(along, 2),
    rotationDeg: rounded((camera.recedesDeg + 90) % 360, 2),
  }
}

function roundMark(scene: Scene, geometry: PhotoGeometry, radiusMm: number): CircleMark | EllipseMark {
  return scene.camera.viewingAngleDeg === 0
    ? circleMark(geometry, radiusMm)
    : ellipseMark(scene, geometry, radiusMm)
}

function polygonMark(geometry: PhotoGeometry, pointsMm: readonly PlaceMm[], digits: number): PolygonMark {
  return {
    kind: 'polygon',
    points: pointsMm.map((place) => roundedPlace(geometry.photoFromPart(...place), digits)),
  }
}

function outlineMark(scene: Scene, geometry: PhotoGeometry): OutlineMark {
  const { face } = scene
  if (face.shape !== 'block') {
    return { ...roundMark(scene, geometry, faceRadiusMm(face)), diameterMm: face.sizeMm[0] }
  }
  const [halfX, halfY] = [face.sizeMm[0] / 2, face.sizeMm[1] / 2]
  const corners: PlaceMm[] = [
    [-halfX, -halfY],
    [halfX, -halfY],
    [halfX, halfY],
    [-halfX, halfY],
  ]
  return { ...polygonMark(geometry, corners, 2), widthMm: face.sizeMm[0], heightMm: face.sizeMm[1] }
}

/** A press arrow somewhere on the measured area, along the way in which the gap widens there. */
function pressTest(scene: Scene, geometry: PhotoGeometry): SetUpFile['pressTest'] {
  const random = seededRandom(scene.seed, 'press')
  const area = measuredArea(scene.face)
  const [halfX, halfY] = [scene.face.sizeMm[0] / 2, scene.face.sizeMm[1] / 2]
  for (let attempt = 0; attempt < 10_000; attempt++) {
    const place: PlaceMm = [random.between(-halfX, halfX), random.between(-halfY, halfY)]
    const [x, y] = geometry.photoFromPart(...place).map(Math.round)
    if (!area.holds(...geometry.partFromPhoto(x, y))) continue
    const [dx, dy] = widening(scene)(x, y)
    return { x, y, dx: rounded(dx, 3), dy: rounded(dy, 3) }
  }
  throw new Error(`${scene.name} has no measured place to press on.`)
}

/** Name of the scene's photograph beside its set-up file. */
export function photoFileName(scene: Scene): string {
  return `${scene.name}.${fileExtensions[scene.file.format]}`
}

/** The set-up file of a scene, without traces. */
export function setUpFile(scene: Scene): SetUpFile {
  const geometry = photoGeometry(scene)
  const { face, camera } = scene
  const marks = face.datumMarksMm.map((mark) => roundedPlace(geometry.photoFromPart(...mark), 2))
  return {
    photo: photoFileName(scene),
    lightSource: { wavelengthNm: lampWavelengthsNm[scene.lamp] },
    viewingAngleDeg: camera.viewingAngleDeg,
    outline: outlineMark(scene, geometry),
    exclusions: leaveOuts(face).map((shape) =>
      shape.kind === 'circle'
        ? roundMark(scene, geometry, shape.radiusMm)
        : polygonMark(geometry, shape.pointsMm, 1),
    ),
    edgeExclusionMm: face.edgeBandMm,
    ...(marks.length > 0 ? { datumMarks: marks } : {}),
    pressTest: pressTest(scene, geometry),
  }
}
