/**
 * A region of a photograph as spans of whole pixels, row by row: exact to the pixel whatever the region's
 * shape, and quick, since only boundaries are visited.
 *
 *   row y:      ....████████....███████....      spans [4, 11], [16, 22]
 */
export interface RowSpans {
  readonly firstRow: number
  /** For row `firstRow + i`: ascending, disjoint pairs of first and last pixel. */
  readonly rows: readonly (readonly number[])[]
}

/** Pixels whose centres lie inside the closed polygon (even-odd). */
export function polygonSpans(points: readonly (readonly [number, number])[]): RowSpans {
  let top = Number.POSITIVE_INFINITY
  let bottom = Number.NEGATIVE_INFINITY
  for (const [, y] of points) {
    top = Math.min(top, y)
    bottom = Math.max(bottom, y)
  }
  const firstRow = Math.ceil(top)
  const crossings: number[][] = Array.from(
    { length: Math.max(0, Math.floor(bottom) - firstRow + 1) },
    () => [],
  )
  for (let i = 0, j = points.length - 1; i < points.length; j = i++) {
    const [xi, yi] = points[i]!
    const [xj, yj] = points[j]!
    if (yi === yj) continue
    const [x0, y0, x1, y1] = yi < yj ? [xi, yi, xj, yj] : [xj, yj, xi, yi]
    // Half-open in y, so that a corner on a row counts once.
    for (let y = Math.ceil(y0); y < y1; y++)
      crossings[y - firstRow]!.push(x0 + ((y - y0) * (x1 - x0)) / (y1 - y0))
  }
  return { firstRow, rows: crossings.map(spansBetween) }
}

function spansBetween(crossings: number[]): number[] {
  crossings.sort((a, b) => a - b)
  const spans: number[] = []
  for (let k = 0; k + 1 < crossings.length; k += 2) {
    const first = Math.ceil(crossings[k]!)
    const last = Math.floor(crossings[k + 1]!)
    if (last >= first) spans.push(first, last)
  }
  return spans
}

/** The region less another. */
export function spansLess(region: RowSpans, taken: RowSpans): RowSpans {
  return {
    firstRow: region.firstRow,
    rows: region.rows.map((spans, i) => rowLess(spans, rowOf(taken, region.firstRow + i))),
  }
}

/** The spans of one row of the photograph; empty outside the region. */
export function rowOf(region: RowSpans, y: number): readonly number[] {
  return region.rows[y - region.firstRow] ?? []
}

/** Parts of a row's spans that aren't in the other spans. */
export function rowLess(spans: readonly number[], taken: readonly number[]): number[] {
  const left: number[] = []
  for (let k = 0; k < spans.length; k += 2) {
    let first = spans[k]!
    const last = spans[k + 1]!
    for (let t = 0; t < taken.length && first <= last; t += 2) {
      if (taken[t + 1]! < first || taken[t]! > last) continue
      if (taken[t]! > first) left.push(first, taken[t]! - 1)
      first = taken[t + 1]! + 1
    }
    if (first <= last) left.push(first, last)
  }
  return left
}

/** Whether the pixel nearest to the place belongs to the region. */
export function spansHold(region: RowSpans, xPx: number, yPx: number): boolean {
  const spans = rowOf(region, Math.round(yPx))
  const x = Math.round(xPx)
  for (let k = 0; k < spans.length; k += 2) if (x >= spans[k]! && x <= spans[k + 1]!) return true
  return false
}

/** Number of pixels of the region. */
export function pixelCount(region: RowSpans): number {
  let count = 0
  for (const spans of region.rows) {
    for (let k = 0; k < spans.length; k += 2) count += spans[k + 1]! - spans[k]! + 1
  }
  return count
}

/** Calls back for every pixel of the region with a neighbour (left, right, above, below) outside it. */
export function forEachRimPixel(region: RowSpans, visit: (xPx: number, yPx: number) => void): void {
  region.rows.forEach((spans, i) => {
    const y = region.firstRow + i
    const open = [...rowLess(spans, rowOf(region, y - 1)), ...rowLess(spans, rowOf(region, y + 1))]
    const seen = new Set<number>()
    for (let k = 0; k < spans.length; k++) seen.add(spans[k]!)
    for (let k = 0; k < open.length; k += 2) for (let x = open[k]!; x <= open[k + 1]!; x++) seen.add(x)
    for (const x of seen) visit(x, y)
  })
}

/**
 * Parts of the region that no path of side-by-side pixels joins. Returns, for every row, the part number of
 * each span, and how many pixels each part holds.
 */
export function connectedParts(region: RowSpans): { partOf: number[][]; pixels: number[] } {
  const parent: number[] = []
  const find = (a: number): number => {
    let root = a
    while (parent[root] !== root) root = parent[root]!
    parent[a] = root
    return root
  }
  const labels = region.rows.map((spans) => {
    const row: number[] = []
    for (let k = 0; k < spans.length; k += 2) row.push(parent.push(parent.length) - 1)
    return row
  })
  for (let i = 1; i < region.rows.length; i++) {
    const above = region.rows[i - 1]!
    const here = region.rows[i]!
    for (let k = 0; k < here.length; k += 2) {
      for (let t = 0; t < above.length; t += 2) {
        if (above[t + 1]! < here[k]! || above[t]! > here[k + 1]!) continue
        parent[find(labels[i]![k / 2]!)] = find(labels[i - 1]![t / 2]!)
      }
    }
  }
  const numberOf = new Map<number, number>()
  const pixels: number[] = []
  const partOf = labels.map((row, i) =>
    row.map((label, k) => {
      const root = find(label)
      let part = numberOf.get(root)
      if (part === undefined) {
        part = pixels.push(0) - 1
        numberOf.set(root, part)
      }
      const spans = region.rows[i]!
      pixels[part] = pixels[part]! + spans[2 * k + 1]! - spans[2 * k]! + 1
      return part
    }),
  )
  return { partOf, pixels }
}
