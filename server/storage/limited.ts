/** Lets so many pieces of work run at once; the others wait their turn. */
export function limitedTo(most: number): <T>(work: () => Promise<T>) => Promise<T> {
  let running = 0
  const waiting: (() => void)[] = []
  return async (work) => {
    if (running >= most) await new Promise<void>((resolve) => waiting.push(resolve))
    else running += 1
    try {
      return await work()
    } finally {
      // The place goes straight to the next in line, so that nobody slips in between.
      const next = waiting.shift()
      if (next) next()
      else running -= 1
    }
  }
}
