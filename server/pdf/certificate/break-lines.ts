import type { TextStyle } from './sheet'

/** A stretch of a paragraph in one style. */
export interface Span {
  text: string
  style: TextStyle
}

export interface PlacedSpan extends Span {
  /** From the line's start. */
  x: number
}

/** Spaces, but for those between a number and its unit and about a sign of arithmetic. */
const breakable =
  /(?<![0-9][ \t\n]*)(?<![−+=±])[ \t\n]+(?![−+=±·] )|(?<=[0-9])[ \t\n]+(?!(?:µm|mm²?|nm|%|U|°C|h|min)(?![\p{L}\d])|[−+=±·] )/u

type WidthOf = (text: string, style: TextStyle) => number

/** Lines no wider than `width`: broken at spaces, and within a word only where it fills a line by itself. */
export function breakLines(spans: readonly Span[], width: number, widthOf: WidthOf): PlacedSpan[][] {
  const words = spans.flatMap(({ text, style }) =>
    text
      .split(breakable)
      .filter((word) => word !== '')
      .flatMap((word) => piecesOf(word, style, width, widthOf))
      .map((word) => ({ text: word, style })),
  )
  const lines: PlacedSpan[][] = []
  let line: PlacedSpan[] = []
  let filled = 0
  for (const word of words) {
    const space = line.length === 0 ? 0 : widthOf(' ', word.style)
    const wide = widthOf(word.text, word.style)
    if (line.length > 0 && filled + space + wide > width) {
      lines.push(line)
      line = []
      filled = 0
    }
    filled += append(line, word, filled, widthOf)
  }
  return line.length > 0 ? [...lines, line] : lines
}

/** Adds a word to a line, into the last stretch where the style is the same; gives by how much the line grew. */
function append(line: PlacedSpan[], word: Span, filled: number, widthOf: WidthOf): number {
  const last = line.at(-1)
  const space = last ? widthOf(' ', word.style) : 0
  if (last?.style === word.style) last.text += ` ${word.text}`
  else line.push({ ...word, x: filled + space })
  return space + widthOf(word.text, word.style)
}

function piecesOf(word: string, style: TextStyle, width: number, widthOf: WidthOf): string[] {
  if (widthOf(word, style) <= width) return [word]
  const pieces: string[] = []
  let piece = ''
  for (const character of word) {
    if (piece !== '' && widthOf(piece + character, style) > width) {
      pieces.push(piece)
      piece = ''
    }
    piece += character
  }
  return [...pieces, piece]
}
