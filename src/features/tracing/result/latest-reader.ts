import type { Marks } from '@shared/schemas/marks'
import type { Circumstances, MarksRead } from './read-marks'
import type { ReadAnswer, ReadRequest } from './result-worker'

/** What was read, and the marks it was read from: figures are current only for those. */
export interface LatestRead {
  marks: Marks
  circumstances: Circumstances
  read: MarksRead | null
}

/** As much of a Worker as is needed. */
export interface ReadingWorker {
  postMessage: (request: ReadRequest) => void
  addEventListener: (type: 'message', listener: (event: { data: ReadAnswer }) => void) => void
  terminate: () => void
}

export interface LatestReader {
  ask: (marks: Marks, circumstances: Circumstances) => void
  stop: () => void
}

const pauseMs = 30

/** Reads the latest marks, one reading at a time; what came meanwhile is skipped but for the last. */
export function startLatestReader(worker: ReadingWorker, onRead: (latest: LatestRead) => void): LatestReader {
  let number = 0
  let atWork: ReadRequest | null = null
  let waiting: Omit<ReadRequest, 'number'> | null = null
  let timer: ReturnType<typeof setTimeout> | null = null

  const begin = () => {
    timer = null
    if (atWork || !waiting) return
    number += 1
    atWork = { number, ...waiting }
    waiting = null
    worker.postMessage(atWork)
  }
  worker.addEventListener('message', ({ data }) => {
    if (data.number !== atWork?.number) return
    const { marks, circumstances } = atWork
    atWork = null
    onRead({ marks, circumstances, read: data.read })
    begin()
  })
  return {
    ask: (marks, circumstances) => {
      waiting = { marks, circumstances }
      if (timer === null) timer = setTimeout(begin, pauseMs)
    },
    stop: () => {
      if (timer) clearTimeout(timer)
      worker.terminate()
    },
  }
}
