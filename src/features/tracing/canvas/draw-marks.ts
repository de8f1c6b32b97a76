import { copiesOf } from '@shared/geometry/shape'
import type { LeaveOut, Marks, Trace } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { middleOfPath, pathLength } from '../geometry/paths'
import { rimPlace } from '../geometry/shape-path'
import { toScreen } from '../viewport'
import {
  drawChip,
  drawCross,
  hatch,
  ink,
  type Pen,
  shapePath,
  strokeCased,
  strokeDashed,
  tracePath,
} from './pen'

/** Outline with its ticks at the four quarters and its centre; the edge band dashed within. */
export function drawOutline(pen: Pen, outline: Marks['outline'], isSelected: boolean): void {
  if (!outline) return
  strokeCased(pen, () => shapePath(pen, outline), isSelected)
  if (outline.kind === 'polygon') return
  drawCross(pen, [outline.cx, outline.cy], 5)
  for (let quarter = 0; quarter < 4; quarter += 1) {
    const [x, y] = rimPlace(outline, (quarter * Math.PI) / 2)
    const at = toScreen(pen.viewport, { x, y })
    const from = toScreen(pen.viewport, { x: outline.cx, y: outline.cy })
    const length = Math.hypot(at.x - from.x, at.y - from.y) || 1
    const [ux, uy] = [(at.x - from.x) / length, (at.y - from.y) / length]
    strokeCased(pen, () => {
      pen.context.moveTo(at.x - 7 * ux, at.y - 7 * uy)
      pen.context.lineTo(at.x + 7 * ux, at.y + 7 * uy)
    })
  }
}

export function drawEdgeBand(pen: Pen, paths: readonly (readonly PointPx[])[]): void {
  for (const path of paths) strokeDashed(pen, () => tracePath(pen, path, true), 'rgb(255 255 255 / 0.75)')
}

export function drawLeaveOut(pen: Pen, leaveOut: LeaveOut, isSelected: boolean): void {
  const { context } = pen
  const shapes = copiesOf(leaveOut)
  context.beginPath()
  for (const shape of shapes) shapePath(pen, shape)
  context.fillStyle = 'rgb(12 14 15 / 0.5)'
  context.fill()
  const pattern = hatch(context)
  if (pattern) {
    context.fillStyle = pattern
    context.fill()
  }
  context.strokeStyle = isSelected ? ink.selected : 'rgb(255 255 255 / 0.8)'
  context.lineWidth = isSelected ? 1.6 : 1
  context.stroke()
  if (leaveOut.copies && isSelected) drawCross(pen, [leaveOut.copies.cx, leaveOut.copies.cy], 6)
}

export function drawTrace(pen: Pen, { points }: Pick<Trace, 'points'>, isSelected: boolean): void {
  if (points.length === 1) drawCross(pen, points[0], 4)
  else strokeCased(pen, () => tracePath(pen, points), isSelected)
}

const shortestArrowPx = 56

/** From a ring where the finger presses to a filled head. */
export function drawPressArrow(
  pen: Pen,
  arrow: Marks['pressArrow'],
  label: string,
  isSelected: boolean,
): void {
  if (!arrow) return
  const { context, viewport } = pen
  const own = Math.hypot(arrow.dx, arrow.dy)
  if (own === 0) return
  const [ux, uy] = [arrow.dx / own, arrow.dy / own]
  // Any length says the same, but a short one couldn't be seen.
  const length = Math.max(shortestArrowPx, own * viewport.scale)
  const tail = toScreen(viewport, arrow)
  const tip = { x: tail.x + ux * length, y: tail.y + uy * length }
  const head = Math.min(17, length * 0.6)
  const colour = isSelected ? ink.selected : ink.line
  const shaft = () => {
    context.beginPath()
    context.moveTo(tail.x + 5 * ux, tail.y + 5 * uy)
    context.lineTo(tip.x - head * ux, tip.y - head * uy)
  }
  const barb = () => {
    context.beginPath()
    context.moveTo(tip.x, tip.y)
    context.lineTo(tip.x - head * ux - 0.42 * head * uy, tip.y - head * uy + 0.42 * head * ux)
    context.lineTo(tip.x - head * ux + 0.42 * head * uy, tip.y - head * uy - 0.42 * head * ux)
    context.closePath()
  }
  context.lineJoin = 'round'
  for (const [stroke, width] of [
    [ink.casing, 6],
    [colour, 3],
  ] as const) {
    context.strokeStyle = stroke
    context.lineWidth = width
    shaft()
    context.stroke()
  }
  barb()
  context.strokeStyle = ink.casing
  context.lineWidth = 3
  context.stroke()
  context.fillStyle = colour
  context.fill()
  context.beginPath()
  context.arc(tail.x, tail.y, 4.6, 0, 2 * Math.PI)
  context.fillStyle = ink.dark
  context.fill()
  context.strokeStyle = colour
  context.lineWidth = 2
  context.stroke()
  const beside = { x: tip.x - 18 * ux - 26, y: tip.y + 16 }
  drawChip(pen, {
    text: label,
    place: [(beside.x - viewport.offsetX) / viewport.scale, (beside.y - viewport.offsetY) / viewport.scale],
  })
}

export function drawDatum(pen: Pen, mark: Marks['datumMarks'][number], isSelected: boolean): void {
  const { context, viewport } = pen
  const at = toScreen(viewport, mark)
  strokeCased(
    pen,
    () => {
      context.moveTo(at.x + 7, at.y)
      context.arc(at.x, at.y, 7, 0, 2 * Math.PI)
      context.moveTo(at.x - 11, at.y)
      context.lineTo(at.x + 11, at.y)
      context.moveTo(at.x, at.y - 11)
      context.lineTo(at.x, at.y + 11)
    },
    isSelected,
  )
  if (mark.label) {
    const place: PointPx = [mark.x + 18 / viewport.scale, mark.y - 12 / viewport.scale]
    drawChip(pen, { text: mark.label, place, isSelected })
  }
}

export function drawStraightedge(pen: Pen, edge: Marks['straightedge'], isSelected: boolean): void {
  if (!edge) return
  strokeCased(pen, () => tracePath(pen, [edge.from, edge.to]), isSelected)
  const foot = footOn(edge.bowAt, edge.from, edge.to)
  strokeDashed(pen, () => tracePath(pen, [foot, edge.bowAt]))
  strokeDashed(pen, () => tracePath(pen, [edge.bowAt, edge.nextBandAt]), ink.selected)
  drawCross(pen, edge.bowAt, 4)
  drawCross(pen, edge.nextBandAt, 4)
}

function footOn(place: PointPx, a: PointPx, b: PointPx): PointPx {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const length2 = dx * dx + dy * dy || 1
  const t = ((place[0] - a[0]) * dx + (place[1] - a[1]) * dy) / length2
  return [a[0] + t * dx, a[1] + t * dy]
}

export function drawProfileLine(pen: Pen, from: PointPx, to: PointPx): void {
  strokeDashed(pen, () => tracePath(pen, [from, to]))
  drawChip(pen, { text: 'A', place: from })
  drawChip(pen, { text: 'B', place: to })
}

/** Nearer than this on screen chips crowd, and only first, last, fives and selected are shown. */
const crowdedPx = 22

interface NumbersShown {
  onAllPieces: boolean
  selectedId: string | null
}

/** A chip for each numbered band on its middle: on the longest of its pieces, or on all of them; always on the selected. */
export function drawNumbers(
  pen: Pen,
  traces: readonly Trace[],
  { onAllPieces, selectedId }: NumbersShown,
): void {
  const selected = traces.find(({ id, order }) => id === selectedId && order !== null)
  const numbered = onAllPieces ? traces.filter(({ order }) => order !== null) : longestPieces(traces)
  const places = numbered.map(({ points }) => middleOfPath(points))
  const orders = numbered.map(({ order }) => order ?? 0)
  const isCrowded = nearestPx(places, pen.viewport.scale) < crowdedPx
  const [least, most] = [Math.min(...orders), Math.max(...orders)]
  numbered.forEach(({ id, order }, i) => {
    const n = order ?? 0
    if (id === selectedId || (!onAllPieces && n === selected?.order)) return
    if (isCrowded && n !== least && n !== most && !isRoundBetween(n, least, most)) return
    drawChip(pen, { text: signed(n), place: places[i] })
  })
  if (selected) {
    const text = signed(selected.order ?? 0)
    drawChip(pen, { text, place: middleOfPath(selected.points), isSelected: true })
  }
}

function signed(n: number): string {
  return String(n).replace('-', '\u2212')
}

/** Fives, but not those that would lie on the first or the last. */
function isRoundBetween(n: number, least: number, most: number): boolean {
  return n % 5 === 0 && n - least > 2 && most - n > 2
}

function longestPieces(traces: readonly Trace[]): Trace[] {
  const longest = new Map<number, { trace: Trace; lengthPx: number }>()
  for (const trace of traces) {
    if (trace.order === null) continue
    const lengthPx = pathLength(trace.points)
    if (lengthPx > (longest.get(trace.order)?.lengthPx ?? -1)) longest.set(trace.order, { trace, lengthPx })
  }
  return [...longest.values()].map(({ trace }) => trace)
}

/** Median distance of each chip to the one nearest to it. */
function nearestPx(places: readonly PointPx[], scale: number): number {
  if (places.length < 2) return Number.POSITIVE_INFINITY
  const nearest = places.map((place, i) => {
    let best = Number.POSITIVE_INFINITY
    places.forEach((other, j) => {
      if (i !== j) best = Math.min(best, Math.hypot(place[0] - other[0], place[1] - other[1]))
    })
    return best
  })
  return nearest.toSorted((a, b) => a - b)[nearest.length >> 1] * scale
}

/** A diamond at the place of a mistake. */
export function drawProblem({ context, viewport }: Pen, [x, y]: PointPx): void {
  const at = toScreen(viewport, { x, y })
  const r = 7
  context.beginPath()
  context.moveTo(at.x, at.y - r)
  context.lineTo(at.x + r, at.y)
  context.lineTo(at.x, at.y + r)
  context.lineTo(at.x - r, at.y)
  context.closePath()
  context.fillStyle = ink.attention
  context.fill()
  context.strokeStyle = ink.dark
  context.lineWidth = 1.5
  context.stroke()
}
