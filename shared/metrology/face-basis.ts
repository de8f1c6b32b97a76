import type { PartFrame } from '../geometry/part-frame'
import type { Shape } from '../schemas/shapes'
import { type BasisDomain, type Rim, type SurfaceBasis, surfaceBasis } from './surface-basis'
import type { TracedReading } from './types'

/** Total degree of the polynomials: waves down to about a seventh of the face's size, where that suffices. */
export const USUAL_DEGREE = 14
/** For faces with finer waves, down to a tenth. */
export const FINE_DEGREE = 20
/** Clicks for each polynomial that they are to choose among; fewer and the waves run through the clicks' own errors. */
const CLICKS_PER_POLYNOMIAL = 3

/** The highest total degree, up to a limit, that so many clicks can choose among. */
export function degreeFor(clicks: number, limit: number): number {
  let degree = 4
  while (degree < limit && CLICKS_PER_POLYNOMIAL * polynomialCount(degree + 1) <= clicks) degree++
  return degree
}

/** Number of polynomials up to a total degree. */
function polynomialCount(degree: number): number {
  return ((degree + 1) * (degree + 2)) / 2
}
/** Lengths over which a rim's drop may die away, as shares of half the face's size. */
const RIM_LENGTH_SHARES = [0.04, 0.08, 0.16]

/** Size of a face over which forms are told: diameter of a round face, longer side of another, mm. */
export function acrossMmOf({ size }: Pick<TracedReading, 'size'>): number {
  switch (size.kind) {
    case 'round':
      return size.diameterMm
    case 'block':
      return Math.max(size.widthMm, size.heightMm)
    case 'free':
      return size.longestSideMm
  }
}

/** The functions for a reading's face up to a degree, with rim terms for its outer rim and for every bore. */
export function faceBasis(reading: TracedReading, frame: PartFrame, maxDegree: number): SurfaceBasis {
  const half = acrossMmOf(reading) / 2
  const lengthsMm = RIM_LENGTH_SHARES.map((share) => share * half)
  const rims = [...outerRims(reading, frame), ...reading.exclusions.flatMap((shape) => boreRim(shape, frame))]
  return surfaceBasis(
    domainOf(reading, frame),
    maxDegree,
    rims.map((rim) => ({ rim, lengthsMm })),
  )
}

function domainOf(reading: TracedReading, frame: PartFrame): BasisDomain {
  if (reading.outline.kind !== 'polygon') return { kind: 'disc', radiusMm: acrossMmOf(reading) / 2 }
  const corners = reading.outline.points.map(([x, y]) => frame.toMm(x, y))
  const xs = corners.map(([x]) => x)
  const ys = corners.map(([, y]) => y)
  const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)]
  return {
    kind: 'rectangle',
    cx: (left + right) / 2,
    cy: (top + bottom) / 2,
    halfWidthMm: (right - left) / 2,
    halfHeightMm: (bottom - top) / 2,
  }
}

function outerRims(reading: TracedReading, frame: PartFrame): Rim[] {
  const domain = domainOf(reading, frame)
  if (domain.kind === 'disc') return [{ kind: 'outerCircle', cx: 0, cy: 0, radiusMm: domain.radiusMm }]
  return reading.size.kind === 'block' ? [{ ...domain, kind: 'block' }] : []
}

/** Polygons (slots, ports) are cut through the face and don't roll it as a lap rolls a rim. */
function boreRim(shape: Shape, frame: PartFrame): Rim[] {
  if (shape.kind === 'polygon') return []
  const [rx, ry] = shape.kind === 'circle' ? [shape.r, shape.r] : [shape.rx, shape.ry]
  const [cx, cy] = frame.toMm(shape.cx, shape.cy)
  const radiusMm = Math.sqrt(rx * ry) * frame.mmPerPx(shape.cx, shape.cy)
  return [{ kind: 'bore', cx, cy, radiusMm }]
}
