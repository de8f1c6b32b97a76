import type { Size } from '../viewport'

interface Place {
  x: number
  y: number
}

/** The magnifier's quarter as seen from the pointer: −1 is left or above, 1 right or below. */
export interface Quarter {
  toX: 1 | -1
  toY: 1 | -1
}

export interface GlassSize {
  radiusPx: number
  /** What hangs below the glass. */
  belowPx: number
}

const quarters: readonly Quarter[] = [
  { toX: 1, toY: 1 },
  { toX: -1, toY: 1 },
  { toX: 1, toY: -1 },
  { toX: -1, toY: -1 },
]
/** Between pointer and glass, and between glass and the area's rim. */
const gapPx = 30
const rimPx = 12

/** The middle of the glass for a quarter, held within the area. */
export function glassMiddle(pointer: Place, { toX, toY }: Quarter, size: GlassSize, area: Size): Place {
  const aside = size.radiusPx + gapPx
  const above = size.radiusPx + size.belowPx + gapPx / 2
  const x = pointer.x + toX * aside
  const y = pointer.y + (toY === 1 ? aside * 0.75 : -above)
  return {
    x: held(x, size.radiusPx + rimPx, area.width - size.radiusPx - rimPx),
    y: held(y, size.radiusPx + rimPx, area.height - size.radiusPx - size.belowPx - rimPx),
  }
}

/**
 * The quarter in which the glass hides least of what is being drawn (`avoid`, screen px) and never the pointer's
 * own place; the one before stays unless another is better, so that the glass doesn't jump about.
 */
export function chooseQuarter(
  pointer: Place,
  avoid: readonly Place[],
  size: GlassSize,
  area: Size,
  before: Quarter | null,
): Quarter {
  const hidden = (quarter: Quarter) => {
    const middle = glassMiddle(pointer, quarter, size, area)
    const covered = avoid.filter((place) => covers(middle, size, place)).length
    return covered + (covers(middle, size, pointer) ? 1000 : 0)
  }
  const best = quarters.reduce((a, b) => (hidden(b) < hidden(a) ? b : a))
  return before && hidden(before) <= hidden(best) ? before : best
}

function covers(middle: Place, { radiusPx, belowPx }: GlassSize, { x, y }: Place): boolean {
  const margin = 6
  return (
    Math.abs(x - middle.x) <= radiusPx + margin &&
    y >= middle.y - radiusPx - margin &&
    y <= middle.y + radiusPx + belowPx + margin
  )
}

function held(value: number, least: number, most: number): number {
  return Math.max(least, Math.min(most, value))
}
