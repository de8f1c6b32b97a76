import { copiesOf } from '@shared/geometry/shape'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { Shape } from '@shared/schemas/shapes'
import type { PagePicture } from '../photograph'
import { inks } from './inks'
import { circlePath, hatchPath, linePath, type Point, rectPath, shapePath } from './paths'
import { type Bounds, boundsOf, type PhotoWindow, photoWindow } from './photo-window'
import type { Sheet } from './sheet'
import { words } from './words'

const white = '#ffffff'

/** The photograph about the face with everything that was marked on it; gives the lower end. */
export function drawPhotograph(
  sheet: Sheet,
  top: number,
  snapshot: CertificateSnapshot,
  photo: PagePicture,
): number {
  sheet.text(0, top, words('head.photograph'), sheet.style(9.8, 'semibold'))
  const view = photoWindow(snapshot, top + 9 * sheet.density.text, sheet.density.picture)
  const frame = rectPath(view.x, view.y, view.width, view.height)
  const [x, y] = view.place(-0.5, -0.5)
  const box = {
    x,
    y,
    width: snapshot.photo.widthPx * view.scale,
    height: snapshot.photo.heightPx * view.scale,
  }
  sheet.image(photo.source, box, frame, words('photographAlt'))
  drawMarks(sheet, snapshot, view, frame)
  return view.y + view.height
}

function drawMarks(sheet: Sheet, { marks }: CertificateSnapshot, view: PhotoWindow, frame: string): void {
  for (const shape of marks.leaveOuts.flatMap(copiesOf)) hatchShape(sheet, shape, view)
  for (const { points } of marks.traces) {
    const d = linePath(points.map(([x, y]) => view.place(x, y)))
    sheet.path(d, { stroke: { colour: inks.casing, width: 1.3 }, opacity: 0.45, clip: frame })
    sheet.path(d, { stroke: { colour: white, width: 0.5 }, clip: frame })
  }
  if (marks.outline) cased(sheet, shapePath(marks.outline, view.place, view.scale), 0.9, frame)
  drawQuarters(sheet, marks.outline, view, frame)
  drawPressArrow(sheet, marks.pressArrow, view, frame)
}

function cased(sheet: Sheet, d: string, width: number, clip: string): void {
  sheet.path(d, { stroke: { colour: inks.casing, width: width + 0.9 }, opacity: 0.6, clip })
  sheet.path(d, { stroke: { colour: white, width }, clip })
}

function hatchShape(sheet: Sheet, shape: Shape, view: PhotoWindow): void {
  const d = shapePath(shape, view.place, view.scale)
  sheet.path(d, { fill: inks.casing, opacity: 0.55, clip: rectPath(view.x, view.y, view.width, view.height) })
  const [x0, y0, x1, y1] = withinView(boundsOf(shape), view)
  if (x1 <= x0 || y1 <= y0) return
  sheet.path(hatchPath(x0, y0, x1 - x0, y1 - y0, 3), {
    stroke: { colour: white, width: 0.4 },
    opacity: 0.6,
    clip: d,
  })
  sheet.path(d, {
    stroke: { colour: white, width: 0.6 },
    clip: rectPath(view.x, view.y, view.width, view.height),
  })
}

function withinView([x0, y0, x1, y1]: Bounds, view: PhotoWindow): Bounds {
  const [left, top] = view.place(x0, y0)
  const [right, foot] = view.place(x1, y1)
  return [
    Math.max(view.x, left),
    Math.max(view.y, top),
    Math.min(view.x + view.width, right),
    Math.min(view.y + view.height, foot),
  ]
}

/** Ticks across the rim at twelve, three, six and nine o'clock of a round face. */
function drawQuarters(
  sheet: Sheet,
  outline: CertificateSnapshot['marks']['outline'],
  view: PhotoWindow,
  frame: string,
): void {
  if (outline?.kind !== 'circle') return
  const [cx, cy] = view.place(outline.cx, outline.cy)
  const r = outline.r * view.scale
  for (const [u, v] of [
    [0, -1],
    [1, 0],
    [0, 1],
    [-1, 0],
  ] as const) {
    const on = (at: number): Point => [cx + u * at, cy + v * at]
    sheet.path(linePath([on(r - 2.5), on(r + 2.5)]), { stroke: { colour: white, width: 0.7 }, clip: frame })
  }
}

const leastArrow = 15
const mostArrow = 34

/** From where the finger presses, the way that the bands travel. */
function drawPressArrow(
  sheet: Sheet,
  arrow: CertificateSnapshot['marks']['pressArrow'],
  view: PhotoWindow,
  frame: string,
): void {
  if (!arrow) return
  const [x, y] = view.place(arrow.x, arrow.y)
  const given = Math.hypot(arrow.dx, arrow.dy) || 1
  const long = Math.min(mostArrow, Math.max(leastArrow, given * view.scale))
  const [u, v] = [arrow.dx / given, arrow.dy / given]
  const on = (along: number, aside: number): Point => [x + u * along - v * aside, y + v * along + u * aside]
  cased(sheet, linePath([on(2.5, 0), on(long - 5, 0)]), 1.4, frame)
  const tip = linePath([on(long, 0), on(long - 7, 3), on(long - 7, -3)], true)
  sheet.path(tip, { fill: white, stroke: { colour: inks.casing, width: 0.5 }, clip: frame })
  sheet.path(circlePath(x, y, 2.2), { fill: inks.casing, stroke: { colour: white, width: 1 }, clip: frame })
}
