import { emptyMarks } from '@shared/schemas/marks'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { type LatestRead, type ReadingWorker, startLatestReader } from './latest-reader'
import type { ReadAnswer, ReadRequest } from './result-worker'

const nothing = { problems: [], figure: null, findings: [] }

function start() {
  const asked: ReadRequest[] = []
  const told: LatestRead[] = []
  let answer: (event: { data: ReadAnswer }) => void = () => {}
  const worker: ReadingWorker = {
    postMessage: (request) => void asked.push(request),
    addEventListener: (_type, listener) => {
      answer = listener
    },
    terminate: () => {},
  }
  const reader = startLatestReader(worker, (latest) => told.push(latest))
  return { reader, asked, told, answer: (number: number) => answer({ data: { number, read: nothing } }) }
}

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

describe('the living result', () => {
  it('reads the last of several quick changes', () => {
    const { reader, asked } = start()
    for (const edge of [1, 2, 3]) reader.ask(emptyMarks(edge), null)
    vi.advanceTimersByTime(100)
    expect(asked.map(({ marks }) => marks.edgeBandMm)).toEqual([3])
  })

  it('goes on to the latest marks once the reading before is done, and skips those between', () => {
    const { reader, asked, told, answer } = start()
    reader.ask(emptyMarks(1), null)
    vi.advanceTimersByTime(100)
    reader.ask(emptyMarks(2), null)
    reader.ask(emptyMarks(3), null)
    vi.advanceTimersByTime(100)
    expect(asked).toHaveLength(1)
    answer(1)
    expect(asked.map(({ marks }) => marks.edgeBandMm)).toEqual([1, 3])
    expect(told[0].marks.edgeBandMm).toBe(1)
  })

  it('tells with each figure which marks it is of', () => {
    const { reader, told, answer } = start()
    const marks = emptyMarks(4)
    reader.ask(marks, null)
    vi.advanceTimersByTime(100)
    answer(1)
    expect(told[0].marks).toBe(marks)
  })

  it('does not take an answer that is not the one awaited', () => {
    const { reader, told, answer } = start()
    reader.ask(emptyMarks(4), null)
    vi.advanceTimersByTime(100)
    answer(7)
    expect(told).toEqual([])
  })
})
