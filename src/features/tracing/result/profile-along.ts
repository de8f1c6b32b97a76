import type { Figure } from '@shared/schemas/results'

export interface LineMm {
  from: readonly [number, number]
  to: readonly [number, number]
}

/** The line from left to right through the middle of the map. */
export function middleLine({ columns, rows, x0Mm, y0Mm, stepMm }: Figure['map']): LineMm {
  const yMm = y0Mm + ((rows - 1) / 2) * stepMm
  return { from: [x0Mm, yMm], to: [x0Mm + (columns - 1) * stepMm, yMm] }
}

/** Heights along a line, evenly spaced; null off the measured area. */
export function heightsAlong(map: Figure['map'], { from, to }: LineMm, places = 160): (number | null)[] {
  return Array.from({ length: places }, (_, i) => {
    const share = i / (places - 1)
    return heightAt(map, from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share)
  })
}

export function lengthOf({ from, to }: LineMm): number {
  return Math.hypot(to[0] - from[0], to[1] - from[1])
}

/** Between the four grid places round it; places at the rim take what measured ones there are. */
function heightAt({ columns, rows, x0Mm, y0Mm, stepMm, heightsNm }: Figure['map'], xMm: number, yMm: number) {
  const column = (xMm - x0Mm) / stepMm
  const row = (yMm - y0Mm) / stepMm
  const [c0, r0] = [Math.floor(column), Math.floor(row)]
  let [sum, weight] = [0, 0]
  for (const [c, r] of [
    [c0, r0],
    [c0 + 1, r0],
    [c0, r0 + 1],
    [c0 + 1, r0 + 1],
  ]) {
    if (c < 0 || r < 0 || c >= columns || r >= rows) continue
    const nm = heightsNm[r * columns + c]
    if (nm === null) continue
    const w = (1 - Math.abs(column - c)) * (1 - Math.abs(row - r))
    sum += w * nm
    weight += w
  }
  return weight >= 0.5 ? sum / weight / 1000 : null
}
