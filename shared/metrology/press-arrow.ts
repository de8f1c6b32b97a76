import type { PartFrame } from '../geometry/part-frame'
import { isMeasured, type MeasuredArea } from './measured-area'
import type { SurfaceFit } from './surface-fit'
import type { TracedPoints } from './traced-points'
import type { TracedReading } from './types'

export type ArrowReading =
  /** No arrow was drawn: high and hollow stay unsaid. */
  | 'none'
  /** Orders rise along the arrow, as they must. */
  | 'agrees'
  /** Orders fall along the arrow: either is wrong. */
  | 'against'
  /** The arrow runs along the bands, or the gap is level there. */
  | 'unclear'

/** Below this cosine between arrow and slope the arrow doesn't say which way the gap widens. */
const UNCLEAR_COSINE = 0.2
/** The sign is taken from so many band spacings about the arrow, not from one slope at the rim. */
const SPACINGS_ABOUT = 1.5
/** At least this share of the face's size about the arrow. */
const LEAST_SHARE = 0.08

/**
 * Whether the orders rise along the press arrow: the slope of the fitted gap is averaged over several bands
 * about the arrow's foot, within the measured area.
 */
export function readPressArrow(
  reading: TracedReading,
  fit: SurfaceFit,
  points: TracedPoints,
  area: MeasuredArea,
  frame: PartFrame,
): ArrowReading {
  const arrow = reading.pressArrow
  const length = arrow ? Math.hypot(arrow.dx, arrow.dy) : 0
  if (!arrow || length === 0) return 'none'
  const [ux, uy] = [arrow.dx / length, arrow.dy / length]
  const radius = aboutPx(reading, fit, points, area, arrow)
  let along = 0
  let slopes = 0
  for (let r = 0; r <= 4; r++) {
    for (let k = 0; k < (r === 0 ? 1 : 12); k++) {
      const angle = (k * Math.PI) / 6
      const x = arrow.x + ((radius * r) / 4) * Math.cos(angle)
      const y = arrow.y + ((radius * r) / 4) * Math.sin(angle)
      if (r > 0 && !isMeasured(area, x, y)) continue
      const [gx, gy] = gapSlope(fit, frame, x, y)
      along += gx * ux + gy * uy
      slopes += Math.hypot(gx, gy)
    }
  }
  const cosine = slopes > 0 ? along / slopes : 0
  if (Math.abs(cosine) < UNCLEAR_COSINE) return 'unclear'
  return cosine > 0 ? 'agrees' : 'against'
}

function aboutPx(
  reading: TracedReading,
  fit: SurfaceFit,
  points: TracedPoints,
  area: MeasuredArea,
  arrow: { x: number; y: number },
): number {
  let nearest = Number.POSITIVE_INFINITY
  let spacing = 0
  let i = 0
  for (const trace of reading.traces) {
    for (const [x, y] of trace.points) {
      const d = Math.hypot(x - arrow.x, y - arrow.y)
      if (d < nearest && i < points.count) {
        nearest = d
        spacing = 1 / fit.slopePerPx[i]!
      }
      i++
    }
  }
  const facePx = Math.sqrt(area.areaMm2) / area.frame.mmPerPx(arrow.x, arrow.y)
  return Math.min(0.3 * facePx, Math.max(LEAST_SHARE * facePx, SPACINGS_ABOUT * spacing))
}

/** Slope of the fitted gap at a place of the photograph, bands per px. */
function gapSlope(fit: SurfaceFit, frame: PartFrame, x: number, y: number): readonly [number, number] {
  const at = (xPx: number, yPx: number) => fit.gapAt(...frame.toMm(xPx, yPx))
  return [(at(x + 1, y) - at(x - 1, y)) / 2, (at(x, y + 1) - at(x, y - 1)) / 2]
}
