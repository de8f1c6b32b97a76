import type { Photo } from '@shared/schemas/readings'
import type { PointPx } from '@shared/schemas/shapes'
import { useEffect, useRef } from 'react'
import { useTranslation } from 'react-i18next'
import { handlesOf } from '../geometry/handles'
import { marksOf, type TableState } from '../table-state'
import { useTable, useTableStore } from '../table-store'
import { type Size, toScreen } from '../viewport'
import { drawGesture, drawSelected } from './draw-gesture'
import { drawTrace } from './draw-marks'
import { chooseQuarter, glassMiddle, type Quarter } from './glass-place'
import { acrossBands, lightAcross, patchOf } from './light-across'
import type { View } from './use-viewport'

interface Props {
  image: HTMLImageElement
  photo: Photo
  view: View
}

const radiusPx = 78
const times = 5
const stripPx = { width: 152, height: 62 }
/** Nearer than this a magnifier shows nothing more. */
const nearScale = 6

/** The photograph round the pointer, five times as large, opposite the hand; below it the light across the band. */
export function Magnifier(props: Props) {
  const place = useTable(placeLookedAt)
  if (!place || props.view.viewport.scale > nearScale) return null
  return <Glass {...props} place={place} />
}

/** While a place is being set or a handle is dragged, and not before. */
function placeLookedAt({ tool, pointer, selection }: TableState): PointPx | null {
  if (!pointer) return null
  switch (tool.tool) {
    case 'face':
    case 'leaveOut':
    case 'band':
    case 'straightedge':
      return tool.phase === 'idle' ? null : pointer
    case 'datum':
      return tool.phase === 'pressing' ? pointer : null
    case 'pick':
      return tool.phase === 'dragging' && selection?.point !== null ? pointer : null
    default:
      return null
  }
}

function Glass({ image, photo, view, place }: Props & { place: PointPx }) {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const tool = useTable((table) => table.tool)
  const glassRef = useRef<HTMLCanvasElement>(null)
  const stripRef = useRef<HTMLCanvasElement>(null)
  const { scale } = view.viewport

  // biome-ignore lint/correctness/useExhaustiveDependencies: drawn anew with what the tool has set.
  useEffect(() => {
    const glass = prepare(glassRef.current, { width: 2 * radiusPx, height: 2 * radiusPx })
    if (!glass) return
    const across = drawStrip(stripRef.current, image, photo, place, scale)
    drawGlass(glass, image, photo, place, times * scale, store.get(), across)
  }, [image, photo, place, scale, store, tool])

  const at = useGlassPlace(view, place, store.get())
  return (
    <div
      aria-hidden="true"
      data-magnifier
      className="pointer-events-none absolute flex flex-col items-center gap-1.5"
      style={{ left: at.x - radiusPx - 4, top: at.y - radiusPx - 4 }}
    >
      <canvas
        ref={glassRef}
        className="rounded-full border-[#e9e8e3] border-[1.5px] shadow-[0_0_0_4px_#15181a]"
        style={{ width: 2 * radiusPx, height: 2 * radiusPx }}
      />
      <div className="bg-ground/92 pb-1 text-center text-axis text-muted" style={{ width: stripPx.width }}>
        <canvas ref={stripRef} style={{ width: stripPx.width, height: stripPx.height - 22 }} />
        {t('stage.lightAcross')}
      </div>
    </div>
  )
}

const glassSize = { radiusPx, belowPx: stripPx.height + 6 }

/** The middle of the glass: clear of the hand and of what is being drawn. */
function useGlassPlace({ viewport, area }: View, [x, y]: PointPx, table: TableState) {
  const before = useRef<Quarter | null>(null)
  const pointer = toScreen(viewport, { x, y })
  const drawn = placesDrawn(table).map(([px, py]) => toScreen(viewport, { x: px, y: py }))
  before.current = chooseQuarter(pointer, drawn, glassSize, area, before.current)
  return glassMiddle(pointer, before.current, glassSize, area)
}

function placesDrawn({ tool, selection, ...table }: TableState): readonly PointPx[] {
  if ('points' in tool) return tool.points
  return selection ? handlesOf(table.history.present, selection) : []
}

function prepare(canvas: HTMLCanvasElement | null, { width, height }: Size): CanvasRenderingContext2D | null {
  if (!canvas) return null
  const density = Math.min(2, window.devicePixelRatio || 1)
  if (canvas.width !== width * density) canvas.width = width * density
  if (canvas.height !== height * density) canvas.height = height * density
  const context = canvas.getContext('2d', { willReadFrequently: false })
  context?.setTransform(density, 0, 0, density, 0, 0)
  context?.clearRect(0, 0, width, height)
  return context
}

/** Photo px of the part shown, and where it lies in the image, which may be smaller than the photograph. */
function drawPart(
  context: CanvasRenderingContext2D,
  image: HTMLImageElement,
  photo: Photo,
  from: PointPx,
  sizePx: number,
  toPx: number,
): void {
  const k = image.naturalWidth / photo.widthPx
  context.drawImage(image, (from[0] + 0.5) * k, (from[1] + 0.5) * k, sizePx * k, sizePx * k, 0, 0, toPx, toPx)
}

function drawGlass(
  context: CanvasRenderingContext2D,
  image: HTMLImageElement,
  photo: Photo,
  [x, y]: PointPx,
  scale: number,
  table: TableState,
  across: number | null,
): void {
  const size = (2 * radiusPx) / scale
  context.fillStyle = '#0f1113'
  context.fillRect(0, 0, 2 * radiusPx, 2 * radiusPx)
  drawPart(context, image, photo, [x - size / 2, y - size / 2], size, 2 * radiusPx)
  const viewport = { scale, offsetX: radiusPx - x * scale, offsetY: radiusPx - y * scale }
  const pen = { context, viewport }
  const marks = marksOf(table)
  for (const trace of marks.traces) drawTrace(pen, trace, false)
  if (table.selection) drawSelected(pen, marks, table.selection, '')
  drawGesture(pen, table)
  drawAim(context, across)
}

/** A cross at the place, and a dashed line square to the band. */
function drawAim(context: CanvasRenderingContext2D, across: number | null): void {
  context.strokeStyle = 'rgb(255 255 255 / 0.9)'
  context.lineWidth = 1.25
  context.beginPath()
  for (const [dx, dy] of [
    [1, 0],
    [-1, 0],
    [0, 1],
    [0, -1],
  ]) {
    context.moveTo(radiusPx + 4 * dx, radiusPx + 4 * dy)
    context.lineTo(radiusPx + 13 * dx, radiusPx + 13 * dy)
  }
  context.stroke()
  if (across === null) return
  const [ux, uy] = [Math.cos(across) * radiusPx, Math.sin(across) * radiusPx]
  context.setLineDash([3, 3])
  context.lineWidth = 1
  context.strokeStyle = 'rgb(255 255 255 / 0.6)'
  context.beginPath()
  context.moveTo(radiusPx - ux, radiusPx - uy)
  context.lineTo(radiusPx + ux, radiusPx + uy)
  context.stroke()
  context.setLineDash([])
}

const patchSize = 121
let patchCanvas: HTMLCanvasElement | null = null

/** The light square to the band under the pointer; gives the direction across, or null where nothing can be read. */
function drawStrip(
  canvas: HTMLCanvasElement | null,
  image: HTMLImageElement,
  photo: Photo,
  place: PointPx,
  scale: number,
): number | null {
  patchCanvas ??= document.createElement('canvas')
  patchCanvas.width = patchSize
  patchCanvas.height = patchSize
  const reader = patchCanvas.getContext('2d', { willReadFrequently: true })
  const height = stripPx.height - 22
  const context = prepare(canvas, { width: stripPx.width, height })
  if (!reader || !context) return null
  /** Photo px that the glass shows, either way from the place. */
  const reach = radiusPx / (times * scale)
  const size = 2 * reach
  drawPart(reader, image, photo, [place[0] - reach, place[1] - reach], size, patchSize)
  const patch = patchOf(reader.getImageData(0, 0, patchSize, patchSize))
  const across = acrossBands(patch)
  const light = lightAcross(patch, across, (patchSize - 1) / 2)
  const [least, most] = [Math.min(...light), Math.max(...light)]
  context.strokeStyle = '#e9e8e3'
  context.lineWidth = 1.25
  context.beginPath()
  light.forEach((value, i) => {
    const x = 12 + (i / (light.length - 1)) * (stripPx.width - 24)
    const y = height - 6 - ((value - least) / (most - least || 1)) * (height - 14)
    if (i === 0) context.moveTo(x, y)
    else context.lineTo(x, y)
  })
  context.stroke()
  context.strokeStyle = '#b9a9f0'
  context.beginPath()
  context.moveTo(stripPx.width / 2, 4)
  context.lineTo(stripPx.width / 2, height - 3)
  context.stroke()
  return across
}
