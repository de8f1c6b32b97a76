import { type HeightField, sampleGrid } from '@shared/look/height-field'
import { niceStep, stepDecimals } from '@shared/look/rule-scale'
import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { formatNumber } from '@shared/units/height'
import { inks } from './inks'
import { linePath, type Point, pageWidth } from './paths'
import { type ProfileTrack, profileTrack } from './profile-track'
import type { Sheet } from './sheet'
import { plainNumber, words } from './words'

const left = 28
const right = pageWidth - 4
const width = right - left

/** Heights along the track with ± U shaded; gives the lower end. */
export function drawProfile(
  sheet: Sheet,
  top: number,
  snapshot: CertificateSnapshot,
  field: HeightField,
): number {
  const track = profileTrack(snapshot)
  const heightsUm = heightsAlong(snapshot, track, field)
  const axis = heightAxis(heightsUm, snapshot.figure.expandedUncertaintyUm)
  const y = top + 4 + 7 * sheet.density.text
  const yOf = (um: number) => y + ((axis.mostUm - um) / (axis.mostUm - axis.leastUm)) * sheet.density.plot
  drawHead(sheet, top, track)
  drawHeights(sheet, axis, yOf)
  drawLine(sheet, heightsUm, snapshot.figure.expandedUncertaintyUm, yOf)
  return drawPlaces(sheet, track, y + sheet.density.plot)
}

function drawHead(sheet: Sheet, top: number, track: ProfileTrack): void {
  const lead = sheet.style(9.8, 'semibold')
  const params = { diameter: plainNumber(track.diameterMm, 3) }
  const spans = [
    { text: words(`profile.${track.kind}`, params), style: lead },
    { text: words('profile.axes'), style: sheet.style(9.4, 'regular', inks.muted) },
  ]
  sheet.paragraph({ x: 0, y: top, width: pageWidth }, spans, lead)
}

/** Null where the track leaves the measured area. */
function heightsAlong(
  { figure }: CertificateSnapshot,
  { placesMm }: ProfileTrack,
  field: HeightField,
): (number | null)[] {
  const { x0Mm, y0Mm, stepMm } = figure.map
  return placesMm.map(([xMm, yMm]) => {
    const column = (xMm - x0Mm) / stepMm
    const row = (yMm - y0Mm) / stepMm
    const isOff = column < -0.5 || row < -0.5 || column > field.columns - 0.5 || row > field.rows - 0.5
    if (isOff || sampleGrid(field.coverage, field, column, row) < 0.5) return null
    return sampleGrid(field.heightsUm, field, column, row)
  })
}

interface HeightAxis {
  leastUm: number
  mostUm: number
  stepUm: number
}

/** In whole steps of 1, 2 or 5, and always with the plane. */
function heightAxis(heightsUm: readonly (number | null)[], uUm: number): HeightAxis {
  let least = 0
  let most = 0
  for (const um of heightsUm) {
    if (um === null) continue
    least = Math.min(least, um - uUm)
    most = Math.max(most, um + uUm)
  }
  const stepUm = niceStep((most - least || 0.01) / 3.6)
  const leastUm = Math.floor(least / stepUm + 1e-9) * stepUm
  const mostUm = Math.ceil(most / stepUm - 1e-9) * stepUm
  return { leastUm, mostUm: mostUm > leastUm ? mostUm : leastUm + stepUm, stepUm }
}

function drawHeights(
  sheet: Sheet,
  { leastUm, mostUm, stepUm }: HeightAxis,
  yOf: (um: number) => number,
): void {
  const style = sheet.style(8.2, 'regular', inks.muted)
  const count = Math.round((mostUm - leastUm) / stepUm) + 1
  for (let i = 0; i < count; i += 1) {
    const um = leastUm + i * stepUm
    const isPlane = Math.abs(um) < stepUm / 2
    sheet.line(left, yOf(um), right, yOf(um), {
      colour: isPlane ? inks.graduation : inks.hairline,
      width: isPlane ? 0.9 : 0.6,
    })
    const text = isPlane ? '0' : formatNumber(um, stepDecimals(stepUm), true)
    sheet.text(left - 6, yOf(um) + style.size * 0.33, text, style, 'end')
  }
}

function drawLine(
  sheet: Sheet,
  heightsUm: readonly (number | null)[],
  uUm: number,
  yOf: (um: number) => number,
): void {
  const xOf = (i: number) => left + (width * i) / (heightsUm.length - 1)
  for (const stretch of stretchesOf(heightsUm)) {
    const offset = (byUm: number) => stretch.map(([i, um]): Point => [xOf(i), yOf(um + byUm)])
    sheet.path(linePath([...offset(uUm), ...offset(-uUm).reverse()], true), {
      fill: inks.bottle,
      opacity: 0.13,
    })
    sheet.path(linePath(offset(0)), { stroke: { colour: inks.bottle, width: 1.3 } })
  }
}

/** Runs of measured places; gaps stay open. */
function stretchesOf(heightsUm: readonly (number | null)[]): [number, number][][] {
  const stretches: [number, number][][] = [[]]
  heightsUm.forEach((um, i) => {
    if (um === null) stretches.push([])
    else stretches[stretches.length - 1].push([i, um])
  })
  return stretches.filter(({ length }) => length > 1)
}

function drawPlaces(sheet: Sheet, track: ProfileTrack, y: number): number {
  const style = sheet.style(8.2, 'regular', inks.muted)
  const stroke = { colour: inks.graduation, width: 0.8 }
  const baseline = y + 3 + style.size
  sheet.line(left, y, right, y, stroke)
  for (const { share, text } of track.kind === 'round' ? hours() : lengths(track)) {
    const x = left + share * width
    sheet.line(x, y, x, y + 2.5, stroke)
    sheet.text(x, baseline, text, style, share > 0.98 && track.kind === 'straight' ? 'end' : 'middle')
  }
  return baseline
}

interface PlaceMark {
  share: number
  text: string
}

function hours(): PlaceMark[] {
  return Array.from({ length: 13 }, (_, i) => ({ share: i / 12, text: String(i % 12 === 0 ? 12 : i) }))
}

/** Millimetres from the middle. */
function lengths({ fromMm, toMm }: ProfileTrack): PlaceMark[] {
  const step = niceStep((toMm - fromMm) / 9)
  const first = Math.ceil(fromMm / step - 1e-9)
  const last = Math.floor(toMm / step + 1e-9)
  return Array.from({ length: last - first + 1 }, (_, i) => first + i).map((n) => {
    const number = n === 0 ? '0' : formatNumber(n * step, stepDecimals(step), true)
    return {
      share: (n * step - fromMm) / (toMm - fromMm),
      text: n === last ? words('profile.mm', { number }) : number,
    }
  })
}
