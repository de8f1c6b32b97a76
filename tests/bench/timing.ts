import { performance } from 'node:perf_hooks'

/** How long the work takes, ms, each time; the first ones, while everything warms up, aren't counted. */
export async function timesOf(
  work: (round: number) => unknown,
  { rounds, warmUp }: { rounds: number; warmUp: number },
): Promise<number[]> {
  const times: number[] = []
  for (let round = 0; round < warmUp + rounds; round++) {
    const start = performance.now()
    await work(round)
    if (round >= warmUp) times.push(performance.now() - start)
  }
  return times.sort((a, b) => a - b)
}

/** Of sorted times: the one that this share of them doesn't exceed. */
export function percentile(sorted: readonly number[], share: number): number {
  return sorted[Math.max(0, Math.ceil(share * sorted.length) - 1)]
}
