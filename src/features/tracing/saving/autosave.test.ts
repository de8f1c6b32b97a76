import { emptyMarks, type Marks } from '@shared/schemas/marks'
import type { SaveMarks } from '@shared/schemas/readings'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { type SaveAnswer, type SaveState, startAutosave } from './autosave'

const marked = (edgeBandMm: number): Marks => emptyMarks(edgeBandMm)
const saved = (marksVersion: number): SaveAnswer => ({
  kind: 'saved',
  saved: { marksVersion, savedAt: `at ${marksVersion}` },
})
const stale: SaveAnswer = {
  kind: 'stale',
  stale: { currentVersion: 9, savedAt: 'then', savedBy: 'Edda Thorne' },
}

/** A server whose answers are given by hand, one after another. */
function start(answers: SaveAnswer[] = []) {
  const sent: SaveMarks[] = []
  const states: SaveState['kind'][] = []
  let kept: SaveMarks | null = null
  const pending: ((answer: SaveAnswer) => void)[] = []
  const autosave = startAutosave({
    version: 3,
    send: (save) => {
      sent.push(save)
      const answer = answers.shift()
      return answer ? Promise.resolve(answer) : new Promise((resolve) => pending.push(resolve))
    },
    copyHere: {
      keep: (unsaved) => {
        kept = unsaved
      },
      forget: () => {
        kept = null
      },
    },
    onState: ({ kind }) => states.push(kind),
  })
  const answer = async (given: SaveAnswer) => {
    pending.shift()?.(given)
    await vi.advanceTimersByTimeAsync(0)
  }
  return { autosave, sent, states, answer, kept: () => kept }
}

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

describe('autosave of marks', () => {
  it('waits for a pause, then sends the latest only', async () => {
    const { autosave, sent, states } = start([saved(4)])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(300)
    autosave.changed(marked(2))
    await vi.advanceTimersByTimeAsync(1000)
    expect(sent).toEqual([{ basedOnVersion: 3, marks: marked(2) }])
    expect(states).toEqual(['saving', 'saved'])
  })

  it('has one save in flight and sends what came meanwhile after it, based on the new version', async () => {
    const { autosave, sent, answer } = start()
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(1000)
    autosave.changed(marked(2))
    autosave.changed(marked(3))
    await vi.advanceTimersByTimeAsync(5000)
    expect(sent).toHaveLength(1)
    await answer(saved(4))
    expect(sent[1]).toEqual({ basedOnVersion: 4, marks: marked(3) })
  })

  it('keeps a copy here until the server has acknowledged', async () => {
    const { autosave, answer, kept } = start()
    autosave.changed(marked(1))
    expect(kept()).toEqual({ basedOnVersion: 3, marks: marked(1) })
    await vi.advanceTimersByTimeAsync(1000)
    expect(kept()).not.toBeNull()
    await answer(saved(4))
    expect(kept()).toBeNull()
  })

  it('tries again by itself, less and less often, while the server can’t be reached', async () => {
    const { autosave, sent, states } = start([
      { kind: 'unreachable' },
      { kind: 'unreachable' },
      { kind: 'unreachable' },
      saved(4),
    ])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(600)
    expect(states.at(-1)).toBe('offline')
    await vi.advanceTimersByTimeAsync(1000)
    expect(sent).toHaveLength(2)
    await vi.advanceTimersByTimeAsync(1999)
    expect(sent).toHaveLength(2)
    await vi.advanceTimersByTimeAsync(4001)
    expect(states.at(-1)).toBe('saved')
  })

  it('stops at a stale save and loses nothing', async () => {
    const { autosave, sent, states, kept } = start([stale])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(1000)
    autosave.changed(marked(2))
    await vi.advanceTimersByTimeAsync(60_000)
    expect(sent).toHaveLength(1)
    expect(states.at(-1)).toBe('stale')
    expect(kept()).toEqual({ basedOnVersion: 3, marks: marked(2) })
    expect(await autosave.flush()).toBe(false)
  })

  it('saves mine over theirs once that is chosen', async () => {
    const { autosave, sent } = start([stale, saved(10)])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(1000)
    autosave.resolve(9, 'then', marked(1))
    await vi.advanceTimersByTimeAsync(0)
    expect(sent[1]).toEqual({ basedOnVersion: 9, marks: marked(1) })
  })

  it('goes on from theirs once those are chosen', async () => {
    const { autosave, sent, kept } = start([stale, saved(10)])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(1000)
    autosave.resolve(9, 'then', null)
    expect(kept()).toBeNull()
    autosave.changed(marked(5))
    await vi.advanceTimersByTimeAsync(1000)
    expect(sent[1]).toEqual({ basedOnVersion: 9, marks: marked(5) })
  })

  it('sends at once when flushed, also what came during a save', async () => {
    const { autosave, sent } = start([saved(4), saved(5)])
    autosave.changed(marked(1))
    const first = autosave.flush()
    autosave.changed(marked(2))
    await first
    expect(await autosave.flush()).toBe(true)
    expect(sent.map(({ marks }) => marks.edgeBandMm)).toEqual([1, 2])
  })

  it('says why when the server will not have it', async () => {
    const { autosave, states } = start([{ kind: 'refused', message: 'This reading has left draft.' }])
    autosave.changed(marked(1))
    await vi.advanceTimersByTimeAsync(1000)
    expect(states.at(-1)).toBe('refused')
  })
})
