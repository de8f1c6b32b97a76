import { circleThroughPoints } from '@shared/geometry/shape'
import type { Marks } from '@shared/schemas/marks'
import type { PointPx } from '@shared/schemas/shapes'
import { handlesOf } from '../geometry/handles'
import { distance } from '../geometry/paths'
import type { TableState } from '../table-state'
import type { ToolState } from '../tools/step-tool'
import type { Selection, ToolOptions } from '../tools/tool'
import {
  drawDatum,
  drawLeaveOut,
  drawOutline,
  drawPressArrow,
  drawProfileLine,
  drawStraightedge,
  drawTrace,
} from './draw-marks'
import { drawCross, drawHandle, ink, type Pen, shapePath, strokeCased, strokeDashed, tracePath } from './pen'

/** What is selected, with its handles, in iris. */
export function drawSelected(pen: Pen, marks: Marks, selection: Selection, pressWord: string): void {
  drawSelectedMark(pen, marks, selection, pressWord)
  const isRoundMark = selection.kind === 'pressArrow' || selection.kind === 'straightedge'
  handlesOf(marks, selection).forEach((place, i) => {
    if (selection.kind !== 'datum') drawHandle(pen, place, selection.point === i, isRoundMark)
  })
}

function drawSelectedMark(pen: Pen, marks: Marks, selection: Selection, pressWord: string): void {
  switch (selection.kind) {
    case 'trace': {
      const trace = marks.traces.find(({ id }) => id === selection.id)
      if (trace) drawTrace(pen, trace, true)
      return
    }
    case 'leaveOut': {
      const leaveOut = marks.leaveOuts.find(({ id }) => id === selection.id)
      if (leaveOut) drawLeaveOut(pen, leaveOut, true)
      return
    }
    case 'datum': {
      const mark = marks.datumMarks.find(({ id }) => id === selection.id)
      if (mark) drawDatum(pen, mark, true)
      return
    }
    case 'outline':
      drawOutline(pen, marks.outline, true)
      return
    case 'pressArrow':
      drawPressArrow(pen, marks.pressArrow, pressWord, true)
      return
    case 'straightedge':
      drawStraightedge(pen, marks.straightedge, true)
      return
  }
}

/** What the tool in hand has set so far and would make of the pointer's place. */
export function drawGesture(pen: Pen, { tool, options, profile }: TableState): void {
  if (profile && tool.tool === 'profile') drawProfileLine(pen, profile.from, profile.to)
  switch (tool.tool) {
    case 'face':
      drawFaceGesture(pen, tool, options)
      return
    case 'leaveOut':
      drawLeaveOutGesture(pen, tool, options)
      return
    case 'band':
      drawBandGesture(pen, tool)
      return
    case 'straightedge':
      drawPlaced(pen, tool.points, tool.hover, tool.points.length < 2)
      return
    case 'number':
      if (tool.phase === 'pressing') strokeDashed(pen, () => tracePath(pen, tool.path), ink.selected)
      return
    default:
      return
  }
}

type Gesture<Name extends ToolState['tool']> = Extract<ToolState, { tool: Name }>

function drawPlaced(pen: Pen, points: readonly PointPx[], hover: PointPx | null, linked: boolean): void {
  const path = hover ? [...points, hover] : points
  if (linked && path.length > 1) strokeDashed(pen, () => tracePath(pen, path), ink.selected)
  for (const point of points) drawCross(pen, point)
}

function drawFaceGesture(pen: Pen, { points, hover }: Gesture<'face'>, { faceWay }: ToolOptions): void {
  // The circle that two clicks and the pointer would give, before the third click.
  const hint = faceWay === 'circle' && hover && points.length === 2 && circleThroughPoints([...points, hover])
  if (hint) strokeDashed(pen, () => shapePath(pen, hint), ink.selected)
  drawPlaced(pen, points, hover, faceWay === 'polygon' || faceWay === 'corners')
}

function drawLeaveOutGesture(pen: Pen, { points, hover }: Gesture<'leaveOut'>, options: ToolOptions): void {
  if (options.leaveOutWay !== 'circle') {
    drawPlaced(pen, points, hover, options.leaveOutWay === 'polygon')
    return
  }
  const centre = points[0]
  if (!centre) return
  drawCross(pen, centre)
  if (!hover) return
  const shape = { kind: 'circle' as const, cx: centre[0], cy: centre[1], r: distance(centre, hover) }
  strokeCased(pen, () => shapePath(pen, shape), true)
}

function drawBandGesture(pen: Pen, { points, hover }: Gesture<'band'>): void {
  if (points.length === 0) return
  strokeCased(pen, () => tracePath(pen, points), true)
  if (hover) strokeDashed(pen, () => tracePath(pen, [points[points.length - 1], hover]), ink.selected)
  points.forEach((point, i) => {
    drawHandle(pen, point, i === points.length - 1)
  })
}
