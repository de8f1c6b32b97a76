import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { inks } from './inks'
import { curvePath, type Point, pageWidth } from './paths'
import type { Sheet } from './sheet'
import { onOneLine, words } from './words'

const textX = 37
const textWidth = 285
const top = 43

/** Who issues it on the left, what it is on the right; gives the lower end. */
export function drawShopHead(sheet: Sheet, { shop, number, replaces }: CertificateSnapshot): number {
  drawMark(sheet, 0, 34, 26.5)
  const name = sheet.style(13, 'semibold')
  const detail = sheet.style(9.2, 'regular', inks.muted)
  const nameY = sheet.paragraph({ x: textX, y: top, width: textWidth }, shop.name, name, 1.15)
  let leftY = nameY
  for (const [i, line] of [onOneLine(shop.address), shop.email].filter((text) => text !== '').entries()) {
    const y = leftY + (i === 0 ? 12 : 12.5) * sheet.density.text
    leftY = sheet.paragraph({ x: textX, y, width: textWidth }, line, detail)
  }
  return Math.max(leftY, drawTitle(sheet, number, replaces))
}

function drawTitle(sheet: Sheet, number: string, replaces: string | null): number {
  const title = { ...sheet.style(26.5, 'light'), size: 26.5 }
  const lines = [
    { text: words('title'), style: title, y: 53 },
    { text: number, style: { ...sheet.style(12, 'semibold'), size: 12 }, y: 69 },
  ]
  const small = sheet.style(9.2, 'regular', inks.muted)
  const below = [...(replaces ? [words('replaces', { number: replaces })] : []), words('pageOf')]
  below.forEach((text, i) => {
    lines.push({ text, style: small, y: 82 + 12 * i })
  })
  for (const { text, style, y } of lines) {
    sheet.text(pageWidth, y, text, sheet.fitted(text, style, 205), 'end')
  }
  return lines[lines.length - 1].y
}

/** Three nested bows, drawn within a square of 24. */
const bows: readonly (readonly Point[])[] = [
  [
    [1.5, 20],
    [2.5, 9],
    [6.5, 3.5],
    [12, 3.5],
    [17.5, 3.5],
    [21.5, 9],
    [22.5, 20],
  ],
  [
    [6.2, 20],
    [6.8, 13.2],
    [8.7, 9.2],
    [12, 9.2],
    [15.3, 9.2],
    [17.2, 13.2],
    [17.8, 20],
  ],
  [
    [10.3, 20],
    [10.5, 16.7],
    [11, 15],
    [12, 15],
    [13, 15],
    [13.5, 16.7],
    [13.7, 20],
  ],
]

function drawMark(sheet: Sheet, x: number, y: number, size: number): void {
  // The bows leave 1.5 of 24 free on the left: they start at the margin.
  const scale = size / 21
  for (const bow of bows) {
    const d = curvePath(bow.map(([u, v]) => [x + (u - 0.5) * scale, y + (v - 3) * scale]))
    sheet.path(d, { stroke: { colour: inks.ink, width: 2.1 * scale } })
  }
}
