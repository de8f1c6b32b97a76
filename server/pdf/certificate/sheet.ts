import type { PageItem, PageWeight } from '@shared/schemas/page-description'
import type { Measure } from '../measure-text'
import { breakLines, type Span } from './break-lines'
import type { Density } from './density'
import { inks } from './inks'
import { leftPt, linePath, ptPerUnit } from './paths'

export interface TextStyle {
  /** Units. */
  size: number
  weight: PageWeight
  colour: string
}

export interface Stroke {
  colour: string
  /** Units. */
  width: number
  dash?: readonly number[]
}

export interface PathLook {
  fill?: string
  stroke?: Stroke
  opacity?: number
  evenOdd?: boolean
  clip?: string | null
}

export interface TextBox {
  x: number
  /** Of the first baseline. */
  y: number
  width: number
}

/** Body text leads to the next line by this many times its size. */
const leading = 1.32

/**
 * What is drawn so far. Lengths are units of the certificate: x from the left margin, y from the sheet's top edge.
 */
export class Sheet {
  readonly items: PageItem[] = []

  constructor(
    private readonly measure: Measure,
    readonly density: Density,
  ) {}

  /** Text that gives way with the density; the figure and the title don't. */
  style(size: number, weight: PageWeight = 'regular', colour: string = inks.ink): TextStyle {
    return { size: size * this.density.text, weight, colour }
  }

  gap(units: number): number {
    return units * this.density.gap
  }

  widthOf(text: string, { weight, size }: TextStyle): number {
    return this.measure(text, weight, size)
  }

  text(
    x: number,
    y: number,
    text: string,
    style: TextStyle,
    anchor: 'start' | 'middle' | 'end' = 'start',
  ): void {
    if (text === '') return
    const { size, weight, colour } = style
    this.items.push({
      kind: 'text',
      text,
      x: leftPt + x * ptPerUnit,
      y: y * ptPerUnit,
      sizePt: size * ptPerUnit,
      weight,
      colour,
      anchor,
    })
  }

  /** Text broken into lines within the box; gives the last baseline. */
  paragraph(box: TextBox, spans: string | readonly Span[], style: TextStyle, lead = leading): number {
    const given = typeof spans === 'string' ? [{ text: spans, style }] : spans
    const lines = breakLines(given, box.width, (text, of) => this.widthOf(text, of))
    lines.forEach((line, i) => {
      const y = box.y + i * style.size * lead
      for (const { x, text, style: of } of line) this.text(box.x + x, y, text, of)
    })
    return box.y + Math.max(0, lines.length - 1) * style.size * lead
  }

  /** The largest size, no larger than the style's, at which the text fits on one line. */
  fitted(text: string, style: TextStyle, width: number): TextStyle {
    const wide = this.widthOf(text, style)
    return wide <= width ? style : { ...style, size: (style.size * width) / wide }
  }

  path(d: string, { fill, stroke, opacity = 1, evenOdd = false, clip = null }: PathLook): void {
    if (d === '') return
    this.items.push({
      kind: 'path',
      d,
      fill: fill ?? null,
      opacity,
      evenOdd,
      clip,
      stroke: stroke
        ? {
            colour: stroke.colour,
            widthPt: stroke.width * ptPerUnit,
            ...(stroke.dash ? { dashPt: stroke.dash.map((length) => length * ptPerUnit) } : {}),
          }
        : null,
    })
  }

  line(x0: number, y0: number, x1: number, y1: number, stroke: Stroke, opacity = 1): void {
    this.path(
      linePath([
        [x0, y0],
        [x1, y1],
      ]),
      { stroke, opacity },
    )
  }

  image(
    source: string,
    box: { x: number; y: number; width: number; height: number },
    clip: string,
    alt: string,
  ): void {
    this.items.push({
      kind: 'image',
      source,
      x: leftPt + box.x * ptPerUnit,
      y: box.y * ptPerUnit,
      widthPt: box.width * ptPerUnit,
      heightPt: box.height * ptPerUnit,
      clip,
      alt,
    })
  }
}
