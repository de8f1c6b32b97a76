import type { PageDescription, PageItem } from '@shared/schemas/page-description'
import PDFDocument from 'pdfkit'
import { fontRuns } from './font-runs'
import { allFontFiles } from './fonts'

export interface PdfInfo {
  title: string
  author: string
  createdAt: Date
  subject?: string
}

type ItemOf<Kind extends PageItem['kind']> = Extract<PageItem, { kind: Kind }>
type Document = PDFKit.PDFDocument

/** The page as a PDF with its fonts in it. The same page and the same info give the same bytes. */
export function renderPdf(page: PageDescription, info: PdfInfo): Promise<Buffer> {
  const document = new PDFDocument({
    size: [page.widthPt, page.heightPt],
    margin: 0,
    lang: 'en',
    displayTitle: true,
    pdfVersion: '1.7',
    info: {
      Title: info.title,
      Author: info.author,
      Creator: 'Lapwing',
      Producer: 'Lapwing',
      CreationDate: info.createdAt,
      ModDate: info.createdAt,
      ...(info.subject ? { Subject: info.subject } : {}),
    },
  })
  const bytes = collect(document)
  for (const file of allFontFiles()) document.registerFont(file.name, file.bytes)
  for (const item of page.items) drawItem(document, item)
  document.end()
  return bytes
}

function collect(document: Document): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    document.on('data', (chunk: Buffer) => chunks.push(chunk))
    document.on('end', () => resolve(Buffer.concat(chunks)))
    document.on('error', reject)
  })
}

function drawItem(document: Document, item: PageItem): void {
  switch (item.kind) {
    case 'text':
      drawText(document, item)
      break
    case 'path':
      within(document, item.clip, () => drawPath(document, item))
      break
    case 'image':
      within(document, item.clip, () => {
        document.image(item.source, item.x, item.y, { width: item.widthPt, height: item.heightPt })
      })
  }
}

function within(document: Document, clip: string | null, draw: () => void): void {
  document.save()
  if (clip !== null) document.path(clip).clip()
  draw()
  document.restore()
}

function drawText(document: Document, item: ItemOf<'text'>): void {
  const runs = fontRuns(item.text, item.weight).map((run) => ({
    ...run,
    widthPt: document.font(run.font).fontSize(item.sizePt).widthOfString(run.text),
  }))
  const widthPt = runs.reduce((sum, run) => sum + run.widthPt, 0)
  const share = { start: 0, middle: 0.5, end: 1 }[item.anchor]
  let x = item.x - share * widthPt
  document.fillColor(item.colour)
  for (const run of runs) {
    document
      .font(run.font)
      .fontSize(item.sizePt)
      .text(run.text, x, item.y, { lineBreak: false, baseline: 'alphabetic' })
    x += run.widthPt
  }
}

function drawPath(document: Document, { d, fill, stroke, opacity, evenOdd }: ItemOf<'path'>): void {
  document.path(d)
  if (opacity < 1) document.fillOpacity(opacity).strokeOpacity(opacity)
  if (stroke) {
    document.lineWidth(stroke.widthPt)
    if (stroke.dashPt) document.dash(stroke.dashPt[0], { space: stroke.dashPt[1] ?? stroke.dashPt[0] })
  }
  const rule = evenOdd ? 'even-odd' : 'non-zero'
  if (fill && stroke) document.fillAndStroke(fill, stroke.colour, rule)
  else if (fill) document.fill(fill, rule)
  else if (stroke) document.stroke(stroke.colour)
  else document.fillOpacity(0).fill()
}
