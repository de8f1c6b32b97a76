/** A figure beside what is aimed at. */
export interface Measurement {
  what: string
  ms: number
  targetMs: number
}

export function measurement(what: string, ms: number, targetMs: number): Measurement {
  return { what, ms, targetMs }
}

/** One line: the figure, the target, and how they stand to one another (1 is just met, less is better). */
export function measurementLine({ what, ms, targetMs }: Measurement): string {
  const ratio = ms / targetMs
  const columns = [
    what.padEnd(56),
    `${ms.toFixed(1).padStart(8)} ms`,
    `target ${String(targetMs).padStart(4)} ms`,
    `ratio ${ratio.toFixed(2)}`,
  ]
  return `${columns.join('   ')}${ratio > 1 ? '   missed' : ''}`
}
