/** Runs the work of a key once at a time: who asks meanwhile gets the same promise. */
export function singleFlight<T>(): (key: string, work: () => Promise<T>) => Promise<T> {
  const running = new Map<string, Promise<T>>()
  return (key, work) => {
    const already = running.get(key)
    if (already) return already
    const started = work().finally(() => running.delete(key))
    running.set(key, started)
    return started
  }
}
