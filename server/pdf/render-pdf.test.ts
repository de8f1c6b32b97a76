import type { PageDescription } from '@shared/schemas/page-description'
import { describe, expect, it } from 'vitest'
import { certificateFixture, picturesFixture } from './certificate.fixture'
import { layoutCertificate } from './certificate-page'
import { fontRuns } from './font-runs'
import { createMeasure } from './measure-text'
import { renderPdf } from './render-pdf'

const info = { title: 'Title', author: 'Shop', createdAt: new Date('2026-12-01T10:14:00Z') }

describe('a page as PDF', () => {
  it('has the same bytes each time, on one page, with its fonts in it', async () => {
    const snapshot = certificateFixture('few-bands-1')
    const page = layoutCertificate(snapshot, await picturesFixture(snapshot), createMeasure())
    const again = layoutCertificate(snapshot, await picturesFixture(snapshot), createMeasure())
    const pdf = await renderPdf(page, info)
    expect(pdf.equals(await renderPdf(again, info))).toBe(true)
    const text = pdf.toString('latin1')
    expect(text.startsWith('%PDF-1.7')).toBe(true)
    expect(text.match(/\/Type \/Page\b/g)).toHaveLength(1)
    expect(text).toContain('D:20261201101400Z')
    expect(text).toContain('SourceSans3-Light')
    expect(text.match(/\/FontFile/g)?.length).toBeGreaterThanOrEqual(3)
    expect(text).not.toContain('Helvetica')
  })

  it('draws every sort of item', async () => {
    const page: PageDescription = {
      widthPt: 100,
      heightPt: 100,
      title: 'All',
      items: [
        {
          kind: 'text',
          text: 'Łódź λ 0.3 µm',
          x: 50,
          y: 20,
          sizePt: 9,
          weight: 'light',
          colour: '#000000',
          anchor: 'middle',
        },
        {
          kind: 'path',
          d: 'M0 0L10 0L10 10Z',
          fill: '#ff0000',
          stroke: { colour: '#00ff00', widthPt: 1, dashPt: [2, 1] },
          opacity: 0.5,
          evenOdd: true,
          clip: 'M0 0L5 0L5 5Z',
        },
      ],
    }
    const pdf = await renderPdf(page, info)
    expect(pdf.toString('latin1')).toContain('/ca 0.5')
  })
})

describe('the font of a character', () => {
  it('is the file that has it', () => {
    expect(fontRuns('Łódź λ', 'regular')).toEqual([
      { font: 'regular-latin-ext', text: 'Ł' },
      { font: 'regular-latin', text: 'ód' },
      { font: 'regular-latin-ext', text: 'ź ' },
      { font: 'regular-greek', text: 'λ' },
    ])
  })

  it('is never none: what no file has is spelled out, bared of its accents or asked about', () => {
    expect(fontRuns('≤ 3 → 漢', 'semibold')).toEqual([{ font: 'semibold-latin', text: '<= 3 -> ?' }])
  })
})
