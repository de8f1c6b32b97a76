import type { PageWeight } from '@shared/schemas/page-description'
import PDFDocument from 'pdfkit'
import { fontRuns } from './font-runs'
import { allFontFiles } from './fonts'

/** Width of a text on one line, in points. */
export type Measure = (text: string, weight: PageWeight, sizePt: number) => number

/** Widths by the very font files that the page is printed with; kept, since a layout asks for the same words again. */
export function createMeasure(): Measure {
  const document = new PDFDocument({ autoFirstPage: false })
  for (const { name, bytes } of allFontFiles()) document.registerFont(name, bytes)
  const emWidths = new Map<string, number>()
  const emWidth = (text: string, weight: PageWeight) =>
    fontRuns(text, weight).reduce(
      (sum, run) => sum + document.font(run.font).fontSize(1000).widthOfString(run.text) / 1000,
      0,
    )
  return (text, weight, sizePt) => {
    const key = `${weight}\n${text}`
    let em = emWidths.get(key)
    if (em === undefined) {
      em = emWidth(text, weight)
      emWidths.set(key, em)
    }
    return em * sizePt
  }
}
