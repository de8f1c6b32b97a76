const dayMs = 24 * 3_600_000
const stepMs = 1000

export interface DemoClock {
  now: () => Date
  /** Goes on to a time of day (UTC) some days before today. */
  moveTo: (daysAgo: number, time: string) => void
  pass: (minutes: number) => void
}

/** The demo shop's past: it never goes back, and ends before the day on which the shop is set up. */
export function createDemoClock(today: Date): DemoClock {
  const midnightMs = Math.floor(today.getTime() / dayMs) * dayMs
  let nowMs = 0
  return {
    // A step with each look, so that what was done later is later.
    now: () => {
      nowMs += stepMs
      return new Date(nowMs)
    },
    moveTo: (daysAgo, time) => {
      const [hours, minutes] = time.split(':').map(Number)
      const toMs = midnightMs - daysAgo * dayMs + (hours * 60 + minutes) * 60_000
      if (toMs < nowMs) throw new Error(`The demo shop is past ${time}, ${daysAgo} days ago.`)
      nowMs = toMs
    },
    pass: (minutes) => {
      nowMs += minutes * 60_000
    },
  }
}
