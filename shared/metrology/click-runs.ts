/**
 * Neighbouring clicks on one trace see nearly the same surface. Taken together as one, by their weighted mean,
 * they say what they said singly, save for forms finer than the run is long, and the work falls with their number.
 * The mean of a run is a linear equation for the surface just as a click is, so that nothing is approximated
 * but the scatter within the run.
 */
export interface ClickRuns {
  readonly count: number
  /** Run `r` holds the clicks from `starts[r]` up to `starts[r + 1]`; one longer than `count`. */
  readonly starts: Int32Array
}

/** Runs of at most `longest` clicks, none across two traces; clicks of a trace must follow one another. */
export function runsOfClicks(traceOf: ArrayLike<number>, count: number, longest: number): ClickRuns {
  const starts: number[] = []
  let first = 0
  while (first < count) {
    let end = first
    while (end < count && traceOf[end] === traceOf[first]) end++
    // Even runs: seven clicks by three become 3, 2, 2 and not 3, 3, 1.
    const pieces = Math.ceil((end - first) / longest)
    for (let p = 0; p < pieces; p++) starts.push(first + Math.round((p * (end - first)) / pieces))
    first = end
  }
  return { count: starts.length, starts: Int32Array.from([...starts, count]) }
}

/** Weighted mean of each run's rows, with the runs' weights; a run without weight gets a row of zeros. */
export function meanRows(
  runs: ClickRuns,
  design: Float64Array,
  terms: number,
  rowWeight: ArrayLike<number>,
): { design: Float64Array; rowWeight: Float64Array } {
  const means = new Float64Array(runs.count * terms)
  const weights = new Float64Array(runs.count)
  for (let r = 0; r < runs.count; r++) {
    const [start, end] = [runs.starts[r]!, runs.starts[r + 1]!]
    let total = 0
    for (let i = start; i < end; i++) total += rowWeight[i]!
    weights[r] = total
    if (total === 0) continue
    const out = r * terms
    for (let i = start; i < end; i++) {
      const share = rowWeight[i]! / total
      const row = i * terms
      for (let a = 0; a < terms; a++) means[out + a] = means[out + a]! + share * design[row + a]!
    }
  }
  return { design: means, rowWeight: weights }
}

/** Weighted mean of a value over each run; 0 for a run without weight. */
export function meanValues(
  runs: ClickRuns,
  values: ArrayLike<number>,
  rowWeight: ArrayLike<number>,
): Float64Array {
  const means = new Float64Array(runs.count)
  for (let r = 0; r < runs.count; r++) {
    let total = 0
    let sum = 0
    for (let i = runs.starts[r]!; i < runs.starts[r + 1]!; i++) {
      total += rowWeight[i]!
      sum += rowWeight[i]! * values[i]!
    }
    means[r] = total === 0 ? 0 : sum / total
  }
  return means
}
