import type { Shape } from '@shared/schemas/shapes'

/** A4 in points. */
export const pageWidthPt = 595.28
export const pageHeightPt = 841.89
/** 13 mm. */
export const leftPt = (13 / 25.4) * 72
/** The certificate is this many units wide between its margins. */
export const pageWidth = 544
export const ptPerUnit = (pageWidthPt - 2 * leftPt) / pageWidth

export type Point = readonly [number, number]

/** Share of a circle's radius at which a cubic's handles draw a quarter of it. */
const quarterHandle = 0.5522847498

function at([x, y]: Point): string {
  return `${rounded(leftPt + x * ptPerUnit)} ${rounded(y * ptPerUnit)}`
}

/** Thousandths of a point; no negative nought, so that the same page is always written alike. */
function rounded(pt: number): number {
  return Math.round(pt * 1000) / 1000 + 0
}

export function linePath(points: readonly Point[], closed = false): string {
  if (points.length < 2) return ''
  return `M${points.map(at).join('L')}${closed ? 'Z' : ''}`
}

export function rectPath(x: number, y: number, width: number, height: number): string {
  return linePath(
    [
      [x, y],
      [x + width, y],
      [x + width, y + height],
      [x, y + height],
    ],
    true,
  )
}

export function circlePath(cx: number, cy: number, r: number): string {
  return ellipsePath(cx, cy, r, r, 0)
}

function ellipsePath(cx: number, cy: number, rx: number, ry: number, rotationDeg: number): string {
  const turn = (rotationDeg * Math.PI) / 180
  const on = (u: number, v: number): string =>
    at([
      cx + rx * u * Math.cos(turn) - ry * v * Math.sin(turn),
      cy + rx * u * Math.sin(turn) + ry * v * Math.cos(turn),
    ])
  const k = quarterHandle
  return [
    `M${on(1, 0)}`,
    `C${on(1, k)} ${on(k, 1)} ${on(0, 1)}`,
    `C${on(-k, 1)} ${on(-1, k)} ${on(-1, 0)}`,
    `C${on(-1, -k)} ${on(-k, -1)} ${on(0, -1)}`,
    `C${on(k, -1)} ${on(1, -k)} ${on(1, 0)}Z`,
  ].join('')
}

/** A cubic curve of points: a start, then handle, handle and end again and again. */
export function curvePath(points: readonly Point[]): string {
  const [start, ...rest] = points.map(at)
  const curves = Array.from(
    { length: rest.length / 3 },
    (_, i) => `C${rest[3 * i]} ${rest[3 * i + 1]} ${rest[3 * i + 2]}`,
  )
  return `M${start}${curves.join('')}`
}

/** A shape of the photograph; `place` puts its pixels on the sheet and `scale` is units per pixel. */
export function shapePath(shape: Shape, place: (x: number, y: number) => Point, scale: number): string {
  switch (shape.kind) {
    case 'circle': {
      const [cx, cy] = place(shape.cx, shape.cy)
      return circlePath(cx, cy, shape.r * scale)
    }
    case 'ellipse': {
      const [cx, cy] = place(shape.cx, shape.cy)
      return ellipsePath(cx, cy, shape.rx * scale, shape.ry * scale, shape.rotationDeg)
    }
    case 'polygon':
      return linePath(
        shape.points.map(([x, y]) => place(x, y)),
        true,
      )
  }
}

/** Parallel lines at 45 degrees over a box, to be kept within what is hatched. */
export function hatchPath(x: number, y: number, width: number, height: number, distance: number): string {
  const step = distance * Math.SQRT2
  const count = Math.ceil((width + height) / step)
  return Array.from({ length: count }, (_, i) => {
    const along = (i + 0.5) * step
    const foot = Math.max(0, along - width)
    const top = Math.max(0, along - height)
    return linePath([
      [x + along - foot, y + foot],
      [x + top, y + along - top],
    ])
  }).join('')
}
