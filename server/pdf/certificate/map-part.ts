import type { HeightField } from '@shared/look/height-field'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import type { PagePicture } from '../photograph'
import { inks } from './inks'
import { type GridPlace, linesPath, type MapSurface } from './map-lines'
import { drawMapScale } from './map-scale'
import { circlePath, hatchPath, linePath, type Point } from './paths'
import { profileTrack } from './profile-track'
import type { Sheet } from './sheet'
import { words } from './words'

const left = 178
const mostWidth = 166

/** Where the map stands on the sheet. */
interface MapPlace extends GridPlace {
  width: number
  height: number
  /** Units of a place in mm. */
  ofMm: (xMm: number, yMm: number) => Point
}

interface MapContent {
  snapshot: CertificateSnapshot
  surface: MapSurface
  colours: PagePicture
}

/** The height map with its scale; gives the lower end. */
export function drawMap(sheet: Sheet, top: number, { snapshot, surface, colours }: MapContent): number {
  const { figure } = snapshot
  const head = words(figure.signKnown ? 'head.map' : 'head.mapUnsigned')
  sheet.text(left, top, head, sheet.style(9.8, 'semibold'))
  const place = placeOf(figure.map, top + 9 * sheet.density.text, sheet.density.picture)
  const rim = linesPath(surface.rim, place, true)
  if (rim !== '') {
    sheet.image(colours.source, place, rim, words('mapAlt'))
    drawContours(sheet, surface, place, rim)
    drawUnsupported(sheet, surface, place)
    drawTrack(sheet, snapshot, place, rim)
    sheet.path(rim, { stroke: { colour: inks.ink, width: 0.75 }, opacity: 0.75 })
  }
  drawTwelve(sheet, surface.field, place)
  drawExtreme(sheet, place.ofMm(figure.valley.xMm, figure.valley.yMm), false)
  drawExtreme(sheet, place.ofMm(figure.peak.xMm, figure.peak.yMm), true)
  return Math.max(place.y + place.height, drawMapScale(sheet, place.y, surface.field))
}

function placeOf(map: CertificateSnapshot['figure']['map'], y: number, mostHeight: number): MapPlace {
  const { columns, rows, x0Mm, y0Mm, stepMm } = map
  const cell = Math.min(mostWidth / columns, mostHeight / rows)
  const width = columns * cell
  return {
    x: left,
    y,
    cell,
    width,
    height: rows * cell,
    ofMm: (xMm, yMm) => [
      left + ((xMm - x0Mm) / stepMm + 0.5) * cell,
      y + ((yMm - y0Mm) / stepMm + 0.5) * cell,
    ],
  }
}

function drawContours(sheet: Sheet, { field, contours }: MapSurface, place: MapPlace, rim: string): void {
  const span = field.mostUm - field.leastUm
  for (const { valueUm, isPlane, lines } of contours) {
    const isDark = (valueUm - field.leastUm) / span < 0.55
    sheet.path(linesPath(lines, place), {
      stroke: { colour: isDark && !isPlane ? inks.paper : inks.ink, width: isPlane ? 1.3 : 0.6 },
      opacity: isPlane ? 0.95 : 0.5,
      clip: rim,
    })
  }
}

/** Hatched white where no trace is near. */
function drawUnsupported(sheet: Sheet, { unsupported }: MapSurface, place: MapPlace): void {
  const clip = linesPath(unsupported, place, true)
  if (clip === '') return
  sheet.path(hatchPath(place.x, place.y, place.width, place.height, 3.2), {
    stroke: { colour: inks.paper, width: 0.9 },
    opacity: 0.85,
    clip,
  })
  sheet.path(clip, { stroke: { colour: inks.paper, width: 0.5 }, opacity: 0.85 })
}

/** Where the profile below runs. */
function drawTrack(sheet: Sheet, snapshot: CertificateSnapshot, place: MapPlace, clip: string): void {
  const { placesMm } = profileTrack(snapshot)
  const d = linePath(placesMm.map(([x, y]) => place.ofMm(x, y)))
  sheet.path(d, { stroke: { colour: inks.ink, width: 0.9, dash: [3, 2.4] }, opacity: 0.9, clip })
}

/** A heavy tick at the top of the measured area, over its middle. */
function drawTwelve(sheet: Sheet, field: HeightField, place: MapPlace): void {
  const [x] = place.ofMm(0, 0)
  const column = Math.min(field.columns - 1, Math.max(0, Math.round((x - place.x) / place.cell - 0.5)))
  const rows = Array.from({ length: field.rows }, (_, row) => row)
  const first = rows.find((row) => field.coverage[row * field.columns + column] >= 0.5)
  if (first === undefined) return
  const y = place.y + first * place.cell
  sheet.line(x, y - 3, x, y + 9, { colour: inks.paper, width: 3 })
  sheet.line(x, y - 3, x, y + 8.5, { colour: inks.ink, width: 1.6 })
}

function drawExtreme(sheet: Sheet, [x, y]: Point, isPeak: boolean): void {
  const stroke = { colour: inks.ink, width: 1 }
  sheet.path(circlePath(x, y, 4.4), { fill: inks.paper, stroke: { colour: inks.ink, width: 0.9 } })
  sheet.line(x - 2.2, y, x + 2.2, y, stroke)
  if (isPeak) sheet.line(x, y - 2.2, x, y + 2.2, stroke)
}
