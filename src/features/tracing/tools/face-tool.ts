import { circleThroughPoints, ellipseThroughPoints } from '@shared/geometry/shape'
import type { Outline } from '@shared/schemas/marks'
import type { FaceSizes } from '@shared/schemas/parts'
import type { PointPx } from '@shared/schemas/shapes'
import { closesPolygon, nothingPlaced, type Placing, placePoints } from './placing'
import type { FaceWay, Scene, Step, ToolEvent } from './tool'

export interface FaceState extends Placing {
  tool: 'face'
}

export const idleFace: FaceState = { tool: 'face', ...nothingPlaced }

/** Beyond this a round face is seen as an ellipse. */
const seenAtAnAngleDeg = 2

/** How a face of this shape is usually marked. */
export function usualFaceWay(size: FaceSizes, viewingAngleDeg: number): FaceWay {
  switch (size.shape) {
    case 'disc':
    case 'annulus':
      return viewingAngleDeg > seenAtAnAngleDeg ? 'ellipse' : 'circle'
    case 'block':
      return 'corners'
    case 'free':
      return 'polygon'
  }
}

/** Clicks that a way needs before there is an outline. */
export const clicksNeeded: Record<FaceWay, number> = { circle: 3, ellipse: 5, corners: 4, polygon: 3 }

/** The outline through the clicks, or null as long as they don't give one. */
function outlineThrough(way: FaceWay, points: readonly PointPx[]): Outline | null {
  if (points.length < clicksNeeded[way]) return null
  switch (way) {
    case 'circle':
      return circleThroughPoints(points)
    case 'ellipse':
      return ellipseThroughPoints(points)
    case 'corners':
    case 'polygon':
      return { kind: 'polygon', points: [...points] }
  }
}

/** Circle and ellipse stand as soon as the clicks suffice, and each further click on the rim refines them. */
export function stepFace(state: FaceState, event: ToolEvent, scene: Scene): Step<FaceState> {
  const way = scene.options.faceWay
  if (way === 'polygon' && (closesPolygon(state, event) || ends(event))) return closePolygon(state, scene)
  if (ends(event)) return { state: idleFace }
  const next = placePoints(state, event)
  if (next === state) return { state }
  if (way === 'polygon') return { state: next }
  return withOutline(next, way, scene)
}

function ends(event: ToolEvent): boolean {
  return event.type === 'end' || event.type === 'doubleClick'
}

function withOutline(next: FaceState, way: FaceWay, scene: Scene): Step<FaceState> {
  const outline = outlineThrough(way, next.points)
  if (!outline) return { state: next }
  const step = { marks: { ...scene.marks, outline }, selection: null }
  if (next.phase !== 'placing') return { state: next, ...step }
  if (way === 'corners') return { state: idleFace, ...step }
  // Idle, so that the face so far is a step of its own; the clicks stay to be refined by the next.
  return { state: { ...next, phase: 'idle', hover: null }, ...step }
}

function closePolygon(state: FaceState, scene: Scene): Step<FaceState> {
  const outline = outlineThrough('polygon', state.points)
  if (!outline) return { state: idleFace }
  return { state: idleFace, marks: { ...scene.marks, outline } }
}
