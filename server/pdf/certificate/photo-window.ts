import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { Shape } from '@shared/schemas/shapes'
import type { Point } from './paths'

/** The part of the photograph that the page shows, and where. */
export interface PhotoWindow {
  x: number
  y: number
  width: number
  height: number
  /** Units per photo pixel. */
  scale: number
  place: (xPx: number, yPx: number) => Point
}

const photoWidth = 154
const leastHeight = 72
/** Of the face's size, free on every side. */
const margin = 0.06

/** As much as shows the face with a margin, never past the photograph's edge. */
export function photoWindow(snapshot: CertificateSnapshot, y: number, mostHeight: number): PhotoWindow {
  const { widthPx, heightPx } = snapshot.photo
  const [x0, y0, x1, y1] = faceBounds(snapshot)
  const free = 1 + 2 * margin
  const wantedWidth = (x1 - x0) * free
  const wantedHeight = (y1 - y0) * free
  const height = Math.min(mostHeight, Math.max(leastHeight, (photoWidth * wantedHeight) / wantedWidth))
  const scale = Math.max(
    Math.min(photoWidth / wantedWidth, height / wantedHeight),
    Math.min(photoWidth / widthPx, height / heightPx),
  )
  const shownWidth = Math.min(photoWidth, widthPx * scale)
  const shownHeight = Math.min(height, heightPx * scale)
  const left = held((x0 + x1) / 2 - shownWidth / scale / 2, widthPx - shownWidth / scale)
  const top = held((y0 + y1) / 2 - shownHeight / scale / 2, heightPx - shownHeight / scale)
  // Pixel centres stand at whole numbers, so the picture's own edge lies half a pixel out.
  const place = (xPx: number, yPx: number): Point => [
    (xPx + 0.5 - left) * scale,
    y + (yPx + 0.5 - top) * scale,
  ]
  return { x: 0, y, width: shownWidth, height: shownHeight, scale, place }
}

function faceBounds({ marks, photo }: CertificateSnapshot) {
  if (!marks.outline) return [0, 0, photo.widthPx, photo.heightPx] as const
  return boundsOf(marks.outline)
}

function held(start: number, most: number): number {
  return Math.min(Math.max(0, most), Math.max(0, start))
}

export type Bounds = readonly [x0: number, y0: number, x1: number, y1: number]

/** Of a shape in photo pixels; a turned ellipse by its longer half-axis. */
export function boundsOf(shape: Shape): Bounds {
  if (shape.kind === 'polygon') {
    const xs = shape.points.map(([x]) => x)
    const ys = shape.points.map(([, y]) => y)
    return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)]
  }
  const r = shape.kind === 'circle' ? shape.r : Math.max(shape.rx, shape.ry)
  return [shape.cx - r, shape.cy - r, shape.cx + r, shape.cy + r]
}
