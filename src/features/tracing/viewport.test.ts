import { describe, expect, it } from 'vitest'
import { fitBox, fitPhoto, lookAt, pan, pinch, toPhoto, toScreen, zoomAbout, zoomTo } from './viewport'

const area = { width: 792, height: 674 }
const start = { scale: 0.5, offsetX: 40, offsetY: -12 }

describe('the view of the photograph', () => {
  it('keeps the place under the pointer while zooming in, out and in again', () => {
    const pointer = { x: 300, y: 200 }
    const place = toPhoto(start, pointer)
    let view = start
    for (const factor of [1.2, 1.2, 0.5, 3]) view = zoomAbout(view, pointer, factor)
    expect(toScreen(view, place).x).toBeCloseTo(pointer.x)
    expect(toScreen(view, place).y).toBeCloseTo(pointer.y)
  })

  it('shows the whole photograph in the middle when fitted', () => {
    const view = fitPhoto({ width: 4000, height: 3000 }, area)
    expect(toScreen(view, { x: -0.5, y: -0.5 }).x).toBeGreaterThanOrEqual(-1e-9)
    expect(toScreen(view, { x: 3999.5, y: 2999.5 }).x).toBeLessThanOrEqual(area.width + 1e-9)
    const middle = toScreen(view, { x: 1999.5, y: 1499.5 })
    expect(middle.x).toBeCloseTo(area.width / 2)
    expect(middle.y).toBeCloseTo(area.height / 2)
  })

  it('leaves air round a part that is fitted', () => {
    const view = fitBox({ x: 100, y: 100, width: 500, height: 500 }, area)
    expect(toScreen(view, { x: 100, y: 100 }).y).toBeCloseTo(24)
  })

  it('holds the scale between its limits', () => {
    expect(zoomTo(start, { x: 0, y: 0 }, 1000).scale).toBe(16)
    expect(zoomTo(start, { x: 0, y: 0 }, 0).scale).toBe(0.02)
  })

  it('keeps both fingers on what they touched', () => {
    const from = [
      { x: 200, y: 200 },
      { x: 300, y: 200 },
    ] as const
    const to = [
      { x: 180, y: 240 },
      { x: 380, y: 240 },
    ] as const
    const touched = from.map((finger) => toPhoto(start, finger))
    const view = pinch(start, from, to)
    expect(toScreen(view, touched[0]).x).toBeCloseTo(180)
    expect(toScreen(view, touched[1]).x).toBeCloseTo(380)
    expect(toScreen(view, touched[1]).y).toBeCloseTo(240)
  })

  it('moves with the hand when panned', () => {
    expect(toScreen(pan(start, 5, 7), { x: 0, y: 0 })).toEqual({ x: 45, y: -5 })
  })

  it('brings a place into the middle at full size or nearer', () => {
    const view = lookAt(start, { x: 900, y: 400 }, area)
    expect(view.scale).toBe(1)
    expect(toScreen(view, { x: 900, y: 400 })).toEqual({ x: 396, y: 337 })
  })
})
