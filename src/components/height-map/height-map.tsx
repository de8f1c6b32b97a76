import { heightField, type StoredMap } from '@shared/look/height-field'
import type { Figure } from '@shared/schemas/results'
import { useEffect, useMemo, useRef } from 'react'
import { drawHeightMap, type MapRange } from './draw-height-map'
import { commonRange, contourStepUm } from './map-range'

interface Place {
  xMm: number
  yMm: number
}

interface Props {
  map: StoredMap
  peak?: Figure['peak'] | null
  valley?: Figure['valley'] | null
  /** The longer side, CSS pixels. */
  sizePx: number
  /** Given where several maps share one scale. */
  range?: MapRange
  /** Distance of contours; by the range where not given. */
  stepUm?: number
  /** What the map says, for those who don't see it. */
  label: string
}

/** A height map with contours, the plane heavier, and marks at peak and valley. */
export function HeightMap({ map, peak, valley, sizePx, range, stepUm, label }: Props) {
  const canvasRef = useRef<HTMLCanvasElement>(null)
  const grid = useMemo(() => heightField(map), [map])
  const shownRange = useMemo(() => range ?? commonRange([map]), [range, map])
  const step = stepUm ?? contourStepUm(shownRange)
  const cellPx = sizePx / Math.max(map.columns, map.rows)
  const widthPx = Math.round(map.columns * cellPx)
  const heightPx = Math.round(map.rows * cellPx)

  useEffect(() => {
    const canvas = canvasRef.current
    if (!canvas) return
    const density = Math.min(2, window.devicePixelRatio || 1)
    canvas.width = Math.round(widthPx * density)
    canvas.height = Math.round(heightPx * density)
    drawHeightMap(canvas, { grid, range: shownRange, contourStepUm: step, cellPx: cellPx * density, density })
  }, [grid, shownRange, step, cellPx, widthPx, heightPx])

  const toPx = ({ xMm, yMm }: Place) => ({
    x: ((xMm - map.x0Mm) / map.stepMm + 0.5) * cellPx,
    y: ((yMm - map.y0Mm) / map.stepMm + 0.5) * cellPx,
  })
  return (
    <figure role="img" aria-label={label} className="relative" style={{ width: widthPx, height: heightPx }}>
      <canvas ref={canvasRef} className="block size-full" />
      <svg aria-hidden="true" className="absolute inset-0 size-full overflow-visible">
        {peak && <ExtremeMark {...toPx(peak)} isPeak />}
        {valley && <ExtremeMark {...toPx(valley)} isPeak={false} />}
      </svg>
    </figure>
  )
}

function ExtremeMark({ x, y, isPeak }: { x: number; y: number; isPeak: boolean }) {
  return (
    <g transform={`translate(${x} ${y})`} stroke="#12211c">
      <circle r="5.5" fill="#fff" strokeWidth="1.1" />
      <path d={isPeak ? 'M-2.5 0H2.5M0 -2.5V2.5' : 'M-2.5 0H2.5'} strokeWidth="1.3" />
    </g>
  )
}
