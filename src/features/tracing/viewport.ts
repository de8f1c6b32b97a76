/** Screen px = photo px × scale + offset; the screen's origin is the top left of the photograph's area. */
export interface Viewport {
  scale: number
  offsetX: number
  offsetY: number
}

export interface Size {
  width: number
  height: number
}

interface Place {
  x: number
  y: number
}

const smallestScale = 0.02
const largestScale = 16
/** Air round the photograph when it is fitted. */
const airPx = 24

export const oneToOne = 1

export function toScreen({ scale, offsetX, offsetY }: Viewport, { x, y }: Place): Place {
  return { x: x * scale + offsetX, y: y * scale + offsetY }
}

export function toPhoto({ scale, offsetX, offsetY }: Viewport, { x, y }: Place): Place {
  return { x: (x - offsetX) / scale, y: (y - offsetY) / scale }
}

/** The whole photograph, in the middle. */
export function fitPhoto(photo: Size, area: Size): Viewport {
  return fitBox({ x: -0.5, y: -0.5, ...photo }, area, 0)
}

/** A part of the photograph, in the middle: the face with a little air. */
export function fitBox(box: Place & Size, area: Size, air = airPx): Viewport {
  const scale = held(
    Math.min(Math.max(1, area.width - 2 * air) / box.width, Math.max(1, area.height - 2 * air) / box.height),
  )
  return {
    scale,
    offsetX: area.width / 2 - (box.x + box.width / 2) * scale,
    offsetY: area.height / 2 - (box.y + box.height / 2) * scale,
  }
}

/** Zooms by a factor; the place under the pointer stays under it. */
export function zoomAbout(viewport: Viewport, pointer: Place, factor: number): Viewport {
  return zoomTo(viewport, pointer, viewport.scale * factor)
}

export function zoomTo(viewport: Viewport, pointer: Place, scale: number): Viewport {
  const place = toPhoto(viewport, pointer)
  const next = held(scale)
  return { scale: next, offsetX: pointer.x - place.x * next, offsetY: pointer.y - place.y * next }
}

export function pan(viewport: Viewport, dx: number, dy: number): Viewport {
  return { ...viewport, offsetX: viewport.offsetX + dx, offsetY: viewport.offsetY + dy }
}

/** Two fingers: what lay under them stays under them, as far as zoom and shift can. */
export function pinch(
  viewport: Viewport,
  from: readonly [Place, Place],
  to: readonly [Place, Place],
): Viewport {
  const apart = (fingers: readonly [Place, Place]) =>
    Math.hypot(fingers[1].x - fingers[0].x, fingers[1].y - fingers[0].y) || 1
  const middleFrom = middle(from)
  const middleTo = middle(to)
  const zoomed = zoomAbout(viewport, middleFrom, apart(to) / apart(from))
  return pan(zoomed, middleTo.x - middleFrom.x, middleTo.y - middleFrom.y)
}

/** Brings a place into the middle, and near enough to be looked at. */
export function lookAt(viewport: Viewport, place: Place, area: Size): Viewport {
  const scale = Math.max(viewport.scale, oneToOne)
  return { scale, offsetX: area.width / 2 - place.x * scale, offsetY: area.height / 2 - place.y * scale }
}

function middle([a, b]: readonly [Place, Place]): Place {
  return { x: (a.x + b.x) / 2, y: (a.y + b.y) / 2 }
}

function held(scale: number): number {
  return Math.min(largestScale, Math.max(smallestScale, scale))
}
