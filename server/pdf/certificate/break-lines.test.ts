import { describe, expect, it } from 'vitest'
import { breakLines } from './break-lines'

const plain = { size: 1, weight: 'regular', colour: '#000000' } as const
const bold = { size: 1, weight: 'semibold', colour: '#000000' } as const
/** Every character is one wide. */
const widthOf = (text: string) => text.length

const lines = (text: string, width: number) =>
  breakLines([{ text, style: plain }], width, widthOf).map((line) => line.map((span) => span.text).join('|'))

describe('breaking lines', () => {
  it('breaks at spaces, and within a word that fills a line by itself', () => {
    expect(lines('one two three', 7)).toEqual(['one two', 'three'])
    expect(lines('abcdefgh ij', 3)).toEqual(['abc', 'def', 'gh', 'ij'])
    expect(lines('', 5)).toEqual([])
  })

  it('keeps a number with its unit, and a sum together', () => {
    expect(lines('it is 0.60 µm', 11)).toEqual(['it is', '0.60 µm'])
    expect(lines('at most T − w', 11)).toEqual(['at most', 'T − w'])
    expect(lines('in 3 munich', 9)).toEqual(['in 3', 'munich'])
    expect(lines('w = 0.825 U', 9)).toHaveLength(2)
  })

  it('goes on in another style on the same line', () => {
    const spans = [
      { text: 'Bold words', style: bold },
      { text: 'then plain', style: plain },
    ]
    expect(breakLines(spans, 15, widthOf)).toEqual([
      [
        { text: 'Bold words', style: bold, x: 0 },
        { text: 'then', style: plain, x: 11 },
      ],
      [{ text: 'plain', style: plain, x: 0 }],
    ])
  })
})
