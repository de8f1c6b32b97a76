import type { PageDescription, PageItem } from '@shared/schemas/page-description'
import { pageDescriptionSchema } from '@shared/schemas/page-description'
import { beforeAll, describe, expect, it } from 'vitest'
import { certificateFixture, type FixtureChange, longNames, picturesFixture } from './certificate.fixture'
import { type CertificatePictures, layoutCertificate } from './certificate-page'
import { createMeasure, type Measure } from './measure-text'

const height = (valueUm: number, typed = `${valueUm} µm`) => ({ valueUm, typed })
const plain = (valueUm: number, typed?: string) => ({ kind: 'plain', max: height(valueUm, typed) }) as const

let measure: Measure
let pictures: CertificatePictures
beforeAll(async () => {
  measure = createMeasure()
  pictures = await picturesFixture(certificateFixture('seal-ring-1'))
})

function pageOf(name: string, change: FixtureChange = {}): PageDescription {
  return layoutCertificate(certificateFixture(name, change), pictures, measure)
}

type TextItem = Extract<PageItem, { kind: 'text' }>
const textsOf = (page: PageDescription) => page.items.filter((item): item is TextItem => item.kind === 'text')
const wordsOf = (page: PageDescription) =>
  textsOf(page)
    .map(({ text }) => text)
    .join(' ')

interface Box {
  what: string
  x0: number
  y0: number
  x1: number
  y1: number
}

function textBox({ text, x, y, sizePt, weight, anchor }: TextItem): Box {
  const width = measure(text, weight, sizePt)
  const x0 = x - { start: 0, middle: 0.5, end: 1 }[anchor] * width
  return { what: text, x0, y0: y - 0.66 * sizePt, x1: x0 + width, y1: y + 0.2 * sizePt }
}

function pathBox(d: string): Box {
  const numbers = (d.match(/-?[\d.]+/g) ?? []).map(Number)
  const xs = numbers.filter((_, i) => i % 2 === 0)
  const ys = numbers.filter((_, i) => i % 2 === 1)
  return {
    what: d.slice(0, 40),
    x0: Math.min(...xs),
    y0: Math.min(...ys),
    x1: Math.max(...xs),
    y1: Math.max(...ys),
  }
}

/** What can be seen of an item. */
function boxOf(item: PageItem): Box {
  if (item.kind === 'text') return textBox(item)
  if (item.clip !== null) return pathBox(item.clip)
  if (item.kind === 'path') return pathBox(item.d)
  const { x, y, widthPt, heightPt } = item
  return { what: 'image', x0: x, y0: y, x1: x + widthPt, y1: y + heightPt }
}

function beyondMargins(page: PageDescription): Box[] {
  const sideMargin = (12 / 25.4) * 72
  const endMargin = (8 / 25.4) * 72
  return page.items
    .map(boxOf)
    .filter(
      ({ x0, y0, x1, y1 }) =>
        x0 < sideMargin || x1 > page.widthPt - sideMargin || y0 < endMargin || y1 > page.heightPt - endMargin,
    )
}

/** Pairs of texts that run into one another. */
function overlaps(page: PageDescription): string[] {
  const boxes = textsOf(page).map(textBox)
  return boxes.flatMap((a, i) =>
    boxes
      .slice(i + 1)
      .filter((b) => a.x0 < b.x1 - 0.1 && b.x0 < a.x1 - 0.1 && a.y0 < b.y1 && b.y0 < a.y1)
      .map((b) => `${a.what} | ${b.what}`),
  )
}

describe('the certificate’s page', () => {
  it('says number, item, figure with its uncertainty, rule and edition, and who signed', () => {
    const page = pageOf('seal-ring-1')
    const words = wordsOf(page)
    for (const text of [
      'QL-2026-0318',
      'page 1 of 1',
      'Quillmere Lapping Works',
      'Pump seal ring SR-40 C, carbon',
      '2208-05, lot 22-08',
      'Conforms to the tolerance of 0.90 µm, guard band 0.825 U.',
      'ISO 14253-1:2017',
      'at most 5 %',
      'k = 2',
      'Procedure LP 12',
      'Maren Oldacre',
      'Tobias Fenwright',
      'Ines Calloway',
      '1 December 2026, 10:14 UTC',
      '7KQ4-MR2X-9HTD',
      'clockwise from twelve o’clock',
    ]) {
      expect(words).toContain(text)
    }
    expect(words).toMatch(/0\.338 ± 0\.0\d\d µm/)
    expect(page.title).toBe('Flatness certificate QL-2026-0318, SR-40 2208-05')
    expect(pageDescriptionSchema.safeParse(page).success).toBe(true)
  })

  it('is the same for the same snapshot', () => {
    expect(pageOf('seal-ring-1')).toEqual(pageOf('seal-ring-1'))
  })

  it.each([
    ['a ring', 'seal-ring-1', {}],
    [
      'a block, signed',
      'block-1',
      { face: { tolerance: { kind: 'signed', least: height(-0.6), most: height(-0.2) } } },
    ],
    ['a disc at an angle', 'tilted-1', { viewingAngleDeg: 17 }],
    ['no tolerance, no equipment', 'saddle-1', { face: { tolerance: { kind: 'none' } }, equipment: [] }],
    ['far beyond the scale', 'dense-1', { face: { tolerance: plain(0.2) } }],
    ['the longest names that the forms allow', 'grooved-1', longNames],
  ] satisfies [string, string, FixtureChange][])(
    'keeps %s within one page, no text over another',
    (_, name, change) => {
      const page = pageOf(name, change)
      expect(beyondMargins(page)).toEqual([])
      expect(overlaps(page)).toEqual([])
    },
  )

  it('sets what fits in the usual sizes, and closer only what says more', () => {
    const size = (page: PageDescription) => textsOf(page).find(({ text }) => text === 'In words')?.sizePt ?? 0
    expect(size(pageOf('seal-ring-1', longNames))).toBeLessThan(size(pageOf('seal-ring-1')))
  })

  it('names the certificate that it replaces, and a shop of fewer than three people', () => {
    const words = wordsOf(pageOf('seal-ring-1', { replaces: 'QL-2026-0300', onePersonShop: true }))
    expect(words).toContain('replaces QL-2026-0300')
    expect(words).toContain('by fewer than three people')
    expect(wordsOf(pageOf('seal-ring-1'))).not.toContain('fewer than three')
  })

  it('says where the sign is unknown and what is not stated', () => {
    const snapshot = certificateFixture('seal-ring-1')
    const unsigned = {
      ...snapshot,
      figure: { ...snapshot.figure, signKnown: false, notStated: ['nearCamera'] },
    }
    const words = wordsOf(layoutCertificate(unsigned, pictures, measure))
    expect(words).toContain('what is shown as high may be low')
    expect(words).toContain('counted as nothing: near camera.')
  })
})

describe('the verdict', () => {
  const chestnut = '#a9562b'
  const bottle = '#1f5b49'
  const fills = (page: PageDescription) =>
    page.items.flatMap((item) => (item.kind === 'path' && item.fill !== null ? [item.fill] : []))

  it('conforms: filled sign, words first', () => {
    const page = pageOf('seal-ring-1')
    expect(textsOf(page).find(({ text }) => text === 'Conforms')).toMatchObject({
      weight: 'semibold',
      colour: bottle,
    })
    expect(fills(page)).not.toContain(chestnut)
  })

  it('does not conform: chestnut bar and diamond, by the drawing’s own unit', () => {
    const page = pageOf('seal-ring-1', { face: { tolerance: plain(0.254, '10 µin') } })
    expect(wordsOf(page)).toContain('Does not conform to the tolerance of 0.254 µm (10 µin)')
    expect(fills(page).filter((fill) => fill === chestnut)).toHaveLength(3)
  })

  it('neither is proven: an open sign', () => {
    const page = pageOf('seal-ring-1', { face: { tolerance: plain(0.34) } })
    expect(wordsOf(page)).toContain('Neither proven: conforming or not to the tolerance of 0.34 µm')
    expect(fills(page)).not.toContain(chestnut)
  })

  it('is given by no rule where the drawing has no tolerance', () => {
    const words = wordsOf(pageOf('seal-ring-1', { face: { tolerance: { kind: 'none' } } }))
    expect(words).toContain('No tolerance on the drawing: no verdict is given.')
    expect(words).not.toContain('Rule:')
  })

  it('is none where bands support too little', () => {
    const words = wordsOf(pageOf('seal-ring-1', { verdict: 'noVerdict' }))
    expect(words).toContain('No verdict on the tolerance of 0.90 µm: the bands support 100 % of the face.')
  })

  it('names the rule in words with its risk', () => {
    const ruled = (kind: 'simpleAcceptance' | 'iso14253_older' | 'own', guardFactor: number) =>
      wordsOf(pageOf('seal-ring-1', { face: { rule: { kind, guardFactor } } }))
    expect(ruled('simpleAcceptance', 0)).toMatch(/simple acceptance, U not taken into account.*at most 50 %/)
    expect(ruled('iso14253_older', 1)).toMatch(/guard band U\..*editions before 2017.*at most 2\.3 %/)
    expect(ruled('own', 0.5)).toMatch(/the shop’s own.*w = 0\.5 U.*at most 15\.9 %/)
  })
})

describe('the map', () => {
  it('ends at the true rim of the measured area', () => {
    const snapshot = certificateFixture('few-bands-1')
    const image = layoutCertificate(snapshot, pictures, measure).items.filter(
      ({ kind }) => kind === 'image',
    )[1]
    const rim = image.kind === 'image' ? (image.clip ?? '') : ''
    const { x0, x1, y0, y1 } = pathBox(rim)
    const numbers = (rim.match(/-?[\d.]+/g) ?? []).map(Number)
    const [cx, cy, radius] = [(x0 + x1) / 2, (y0 + y1) / 2, (x1 - x0) / 2]
    const off = numbers.flatMap((x, i) =>
      i % 2 === 0 ? [Math.abs(Math.hypot(x - cx, numbers[i + 1] - cy) - radius)] : [],
    )
    expect(Math.max(...off)).toBeLessThan(0.02)
  })
})
