// @vitest-environment happy-dom
import type { PageDescription } from '@shared/schemas/page-description'
import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, describe, expect, it } from 'vitest'
import { PrintedPage } from './printed-page'

afterEach(cleanup)

const page: PageDescription = {
  widthPt: 595.28,
  heightPt: 841.89,
  title: 'Flatness certificate QL-2026-0318',
  items: [
    {
      kind: 'text',
      text: '0.339',
      x: 40,
      y: 60,
      sizePt: 40,
      weight: 'light',
      colour: '#12211c',
      anchor: 'end',
    },
    {
      kind: 'path',
      d: 'M0 0L10 0L10 10Z',
      fill: null,
      stroke: { colour: '#12211c', widthPt: 0.5, dashPt: [2, 1] },
      opacity: 0.5,
      evenOdd: false,
      clip: 'M0 0L5 0L5 5Z',
    },
    {
      kind: 'image',
      source: 'data:image/png;base64,AA==',
      x: 1,
      y: 2,
      widthPt: 3,
      heightPt: 4,
      clip: null,
      alt: 'Map',
    },
  ],
}

describe('a printed page', () => {
  it('is one picture with its title, and its text is text', () => {
    render(<PrintedPage page={page} />)
    const picture = screen.getByRole('img', { name: page.title })
    expect(picture.getAttribute('viewBox')).toBe('0 0 595.28 841.89')
    const text = picture.querySelector('text')
    expect(text?.textContent).toBe('0.339')
    expect(text?.getAttribute('text-anchor')).toBe('end')
    expect(text?.getAttribute('font-weight')).toBe('300')
  })

  it('keeps an item within its clip', () => {
    render(<PrintedPage page={page} />)
    const picture = screen.getByRole('img')
    const clipId = picture.querySelector('clipPath')?.id
    const path = picture.querySelector('path[stroke]')
    expect(path?.getAttribute('clip-path')).toBe(`url(#${clipId})`)
    expect(path?.getAttribute('stroke-dasharray')).toBe('2 1')
    expect(picture.querySelector('image')?.getAttribute('clip-path')).toBeNull()
  })
})
