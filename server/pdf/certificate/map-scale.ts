import type { HeightField } from '@shared/look/height-field'
import { heightRgb } from '@shared/look/height-scale'
import { niceStep, stepDecimals } from '@shared/look/rule-scale'
import { formatNumber } from '@shared/units/height'
import { inks } from './inks'
import { rectPath } from './paths'
import type { Sheet } from './sheet'
import { words } from './words'

const x = 361
const width = 10
const strips = 64

/** The bar beside the map: low dark, high light, the plane its one named tick; gives the lower end. */
export function drawMapScale(sheet: Sheet, top: number, { leastUm, mostUm }: HeightField): number {
  const style = sheet.style(8.6, 'regular', inks.muted)
  const y = top + style.size + 4
  const height = sheet.density.picture * 0.76 - 8
  const foot = y + height + style.size + 3
  const yOf = (um: number) => y + ((mostUm - um) / (mostUm - leastUm)) * height
  sheet.text(x, y - 5, words('scale.high'), style)
  drawStrips(sheet, y, height)
  for (const { um, decimals } of ticksOf(leastUm, mostUm)) {
    sheet.line(x + width, yOf(um), x + width + 4, yOf(um), { colour: inks.graduation, width: 0.8 })
    sheet.text(x + width + 7, yOf(um) + style.size * 0.33, formatNumber(um, decimals, true), style)
  }
  sheet.line(x + width, yOf(0), x + width + 6, yOf(0), { colour: inks.ink, width: 1.3 })
  sheet.text(x + width + 9, yOf(0) + style.size * 0.33, words('scale.plane'), { ...style, colour: inks.ink })
  sheet.text(x, foot, words('scale.low'), style)
  return foot
}

function drawStrips(sheet: Sheet, y: number, height: number): void {
  const each = height / strips
  for (let i = 0; i < strips; i += 1) {
    // Strips reach under the next one, so that no viewer shows a seam.
    const depth = Math.min(2 * each, height - i * each)
    sheet.path(rectPath(x, y + i * each, width, depth), { fill: hex(heightRgb(1 - (i + 0.5) / strips)) })
  }
  sheet.path(rectPath(x, y, width, height), { stroke: { colour: inks.ink, width: 0.6 } })
}

function hex(rgb: readonly number[]): string {
  return `#${rgb.map((channel) => channel.toString(16).padStart(2, '0')).join('')}`
}

/** In steps of 1, 2 or 5, without the plane, and none so near to it that the figures would touch. */
function ticksOf(leastUm: number, mostUm: number): { um: number; decimals: number }[] {
  const step = niceStep((mostUm - leastUm) / 5)
  const decimals = stepDecimals(step)
  const first = Math.ceil(leastUm / step - 1e-9)
  const last = Math.floor(mostUm / step + 1e-9)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i)
    .filter((n) => n !== 0)
    .map((n) => ({ um: n * step, decimals }))
}
