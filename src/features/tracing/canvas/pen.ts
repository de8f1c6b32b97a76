import type { PointPx, Shape } from '@shared/schemas/shapes'
import { toScreen, type Viewport } from '../viewport'

/** Draws photo places on a canvas in screen pixels. */
export interface Pen {
  context: CanvasRenderingContext2D
  viewport: Viewport
}

/** The table's dark colours, as the canvas needs them: `src/styles/tokens.css` has them for the page. */
export const ink = {
  line: '#ffffff',
  casing: 'rgb(12 14 15 / 0.62)',
  selected: '#b9a9f0',
  handle: '#1b1824',
  chip: 'rgb(16 19 21 / 0.92)',
  chipText: '#e9e8e3',
  attention: '#e39a6b',
  dark: '#15181a',
} as const

/** Names the path; the caller strokes or fills it. */
export function tracePath({ context, viewport }: Pen, points: readonly PointPx[], closed = false): void {
  const { scale, offsetX, offsetY } = viewport
  points.forEach(([x, y], i) => {
    if (i === 0) context.moveTo(x * scale + offsetX, y * scale + offsetY)
    else context.lineTo(x * scale + offsetX, y * scale + offsetY)
  })
  if (closed) context.closePath()
}

export function shapePath(pen: Pen, shape: Shape): void {
  const { context, viewport } = pen
  if (shape.kind === 'polygon') {
    tracePath(pen, shape.points, true)
    return
  }
  const { x, y } = toScreen(viewport, { x: shape.cx, y: shape.cy })
  const [rx, ry, turn] =
    shape.kind === 'circle'
      ? [shape.r, shape.r, 0]
      : [shape.rx, shape.ry, (shape.rotationDeg * Math.PI) / 180]
  context.moveTo(x + rx * viewport.scale * Math.cos(turn), y + rx * viewport.scale * Math.sin(turn))
  context.ellipse(x, y, rx * viewport.scale, ry * viewport.scale, turn, 0, 2 * Math.PI)
}

/** A line that stands on any ground: white in a dark casing, or iris where it is selected. */
export function strokeCased(pen: Pen, name: () => void, isSelected = false): void {
  const { context } = pen
  const width = isSelected ? 2.4 : 1.25
  context.lineJoin = 'round'
  context.lineCap = 'round'
  context.beginPath()
  name()
  context.strokeStyle = ink.casing
  context.lineWidth = width + 2
  context.stroke()
  context.strokeStyle = isSelected ? ink.selected : ink.line
  context.lineWidth = width
  context.stroke()
}

export function strokeDashed({ context }: Pen, name: () => void, colour: string = ink.line): void {
  context.beginPath()
  name()
  context.setLineDash([5, 4])
  context.strokeStyle = colour
  context.lineWidth = 1
  context.stroke()
  context.setLineDash([])
}

const handlePx = 6.4

export function drawHandle(
  { context, viewport }: Pen,
  [x, y]: PointPx,
  isHeld: boolean,
  isRound = false,
): void {
  const at = toScreen(viewport, { x, y })
  const size = isHeld ? handlePx + 2 : handlePx
  context.beginPath()
  if (isRound) context.arc(at.x, at.y, size / 2, 0, 2 * Math.PI)
  else context.rect(at.x - size / 2, at.y - size / 2, size, size)
  context.fillStyle = isHeld ? ink.selected : ink.handle
  context.fill()
  context.strokeStyle = isHeld ? ink.line : ink.selected
  context.lineWidth = 1.2
  context.stroke()
}

/** A cross where a place is set or a centre stands. */
export function drawCross({ context, viewport }: Pen, [x, y]: PointPx, armPx = 5): void {
  const at = toScreen(viewport, { x, y })
  for (const [colour, width] of [
    [ink.casing, 3.2],
    [ink.line, 1.25],
  ] as const) {
    context.beginPath()
    context.moveTo(at.x - armPx, at.y)
    context.lineTo(at.x + armPx, at.y)
    context.moveTo(at.x, at.y - armPx)
    context.lineTo(at.x, at.y + armPx)
    context.strokeStyle = colour
    context.lineWidth = width
    context.stroke()
  }
}

export interface Chip {
  text: string
  place: PointPx
  isSelected?: boolean
  /** Needs a person. */
  attention?: boolean
}

const chipHeightPx = 16

export function drawChip({ context, viewport }: Pen, chip: Chip): void {
  const at = toScreen(viewport, { x: chip.place[0], y: chip.place[1] })
  context.font = '600 12px "Source Sans 3", sans-serif'
  const width = Math.max(chipHeightPx, context.measureText(chip.text).width + 8)
  context.beginPath()
  context.roundRect(at.x - width / 2, at.y - chipHeightPx / 2, width, chipHeightPx, 2)
  context.fillStyle = chip.isSelected ? ink.selected : chip.attention ? ink.attention : ink.chip
  context.fill()
  context.fillStyle = chip.isSelected || chip.attention ? ink.dark : ink.chipText
  context.textAlign = 'center'
  context.textBaseline = 'middle'
  context.fillText(chip.text, at.x, at.y + 0.5)
}

/** White hatching at 45°, made once. */
let hatching: CanvasPattern | null = null

export function hatch(context: CanvasRenderingContext2D): CanvasPattern | null {
  if (hatching) return hatching
  const tile = document.createElement('canvas')
  tile.width = 8
  tile.height = 8
  const pen = tile.getContext('2d')
  if (!pen) return null
  pen.strokeStyle = 'rgb(255 255 255 / 0.5)'
  pen.lineWidth = 1
  pen.beginPath()
  for (const x of [-8, 0, 8]) {
    pen.moveTo(x, 8)
    pen.lineTo(x + 8, 0)
  }
  pen.stroke()
  hatching = context.createPattern(tile, 'repeat')
  return hatching
}
