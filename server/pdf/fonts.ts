import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { PageWeight } from '@shared/schemas/page-description'
import PDFDocument from 'pdfkit'
import { unwrapWoff } from './unwrap-woff'

/** Subsets of Source Sans 3 as its package parts them, the one that holds most of what we write first. */
const subsets = ['latin', 'latin-ext', 'greek', 'cyrillic'] as const
const weights: Record<PageWeight, number> = { light: 300, regular: 400, semibold: 600 }

export type FontName = `${PageWeight}-${(typeof subsets)[number]}`

export interface FontFile {
  name: FontName
  bytes: Buffer
  has: (codePoint: number) => boolean
}

/** What pdfkit keeps of a font that it has opened, and doesn't type. */
interface OpenedFont {
  _font: { font: { hasGlyphForCodePoint(codePoint: number): boolean } }
}

const require = createRequire(import.meta.url)
const opened = new Map<PageWeight, FontFile[]>()

/** The files of one weight, in the order in which they are asked for a character. */
export function fontFiles(weight: PageWeight): FontFile[] {
  const known = opened.get(weight)
  if (known) return known
  const files = subsets.map((subset) => openFont(weight, subset))
  opened.set(weight, files)
  return files
}

export function allFontFiles(): FontFile[] {
  return (Object.keys(weights) as PageWeight[]).flatMap(fontFiles)
}

function openFont(weight: PageWeight, subset: (typeof subsets)[number]): FontFile {
  const file = `@fontsource/source-sans-3/files/source-sans-3-${subset}-${weights[weight]}-normal.woff`
  const bytes = unwrapWoff(readFileSync(require.resolve(file)))
  const document = new PDFDocument({ autoFirstPage: false }).font(bytes)
  const { font } = (document as unknown as OpenedFont)._font
  return {
    name: `${weight}-${subset}`,
    bytes,
    has: (codePoint) => font.hasGlyphForCodePoint(codePoint),
  }
}
