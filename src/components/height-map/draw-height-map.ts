import { type HeightField, sampleGrid } from '@shared/look/height-field'
import { heightRgb } from '@shared/look/height-scale'
import { contours } from 'd3-contour'
import { shareOutline } from './share-outline'

export interface MapRange {
  leastUm: number
  mostUm: number
}

export interface MapDrawing {
  grid: HeightField
  range: MapRange
  contourStepUm: number
  /** Canvas pixels per grid step, the same both ways. */
  cellPx: number
  /** Canvas pixels per CSS pixel: line widths are in CSS pixels. */
  density: number
}

/** Colours, contours with the plane heavier, and hatching where nothing supports the surface; clipped to what is measured. */
export function drawHeightMap(canvas: HTMLCanvasElement, drawing: MapDrawing): void {
  const context = canvas.getContext('2d')
  if (!context) return
  context.clearRect(0, 0, canvas.width, canvas.height)
  paintColours(context, drawing)
  drawContours(context, drawing)
  drawHatching(context, drawing)
  clipToMeasured(context, drawing)
}

function paintColours(context: CanvasRenderingContext2D, { grid, range, cellPx }: MapDrawing): void {
  const { width, height } = context.canvas
  const image = context.createImageData(width, height)
  const span = range.mostUm - range.leastUm || 1
  for (let y = 0, at = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1, at += 4) {
      const um = heightAt(grid, (x + 0.5) / cellPx - 0.5, (y + 0.5) / cellPx - 0.5)
      const [r, g, b] = heightRgb((um - range.leastUm) / span)
      image.data[at] = r
      image.data[at + 1] = g
      image.data[at + 2] = b
      image.data[at + 3] = 255
    }
  }
  context.putImageData(image, 0, 0)
}

function heightAt(grid: HeightField, column: number, row: number): number {
  return sampleGrid(grid.heightsUm, grid, column, row)
}

function drawContours(context: CanvasRenderingContext2D, drawing: MapDrawing): void {
  const { grid, range, contourStepUm, density } = drawing
  const first = Math.ceil(range.leastUm / contourStepUm)
  const last = Math.floor(range.mostUm / contourStepUm)
  const levels = Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => (first + i) * contourStepUm)
  const span = range.mostUm - range.leastUm || 1
  const lines = contours().size([grid.columns, grid.rows]).thresholds(levels)(Array.from(grid.heightsUm))
  for (const line of lines) {
    const isPlane = Math.abs(line.value) < contourStepUm / 2
    const low = (line.value - range.leastUm) / span < 0.55
    context.lineWidth = (isPlane ? 1.3 : 0.75) * density
    context.strokeStyle = low
      ? `rgb(255 255 255 / ${isPlane ? 0.95 : 0.42})`
      : `rgb(18 33 28 / ${isPlane ? 0.95 : 0.42})`
    context.beginPath()
    for (const polygon of line.coordinates) for (const ring of polygon) tracePath(context, ring, drawing)
    context.stroke()
  }
}

/** d3-contour closes its rings along the grid's edge; those stretches are no contour. */
function tracePath(context: CanvasRenderingContext2D, ring: number[][], { grid, cellPx }: MapDrawing): void {
  const onEdge = ([x, y]: number[]) => x <= 0 || y <= 0 || x >= grid.columns || y >= grid.rows
  let isDown = false
  for (let i = 0; i < ring.length; i += 1) {
    const [x, y] = ring[i]
    const alongEdge = i > 0 && onEdge(ring[i]) && onEdge(ring[i - 1])
    if (isDown && !alongEdge) context.lineTo(x * cellPx, y * cellPx)
    else context.moveTo(x * cellPx, y * cellPx)
    isDown = true
  }
}

function drawHatching(context: CanvasRenderingContext2D, { grid, cellPx, density }: MapDrawing): void {
  if (!grid.unsupported.includes(1)) return
  const { width, height } = context.canvas
  const layer = layerOf(width, height)
  layer.strokeStyle = 'rgb(247 246 242 / 0.75)'
  layer.lineWidth = density
  layer.beginPath()
  for (let x = -height; x < width; x += 5 * density) {
    layer.moveTo(x, height)
    layer.lineTo(x + height, 0)
  }
  layer.stroke()
  const outline = shareOutline(grid.unsupported, grid, cellPx)
  if (!outline) return
  keepWithin(layer, outline)
  context.drawImage(layer.canvas, 0, 0)
}

function clipToMeasured(context: CanvasRenderingContext2D, { grid, cellPx, density }: MapDrawing): void {
  const outline = shareOutline(grid.coverage, grid, cellPx)
  if (!outline) return
  keepWithin(context, outline)
  context.strokeStyle = 'rgb(18 33 28 / 0.55)'
  context.lineWidth = 0.75 * density
  context.stroke(outline)
}

/** Erases what lies outside. */
function keepWithin(context: CanvasRenderingContext2D, outline: Path2D): void {
  context.globalCompositeOperation = 'destination-in'
  context.fillStyle = '#000'
  context.fill(outline, 'evenodd')
  context.globalCompositeOperation = 'source-over'
}

function layerOf(width: number, height: number): CanvasRenderingContext2D {
  const canvas = document.createElement('canvas')
  canvas.width = width
  canvas.height = height
  const context = canvas.getContext('2d')
  if (!context) throw new Error('This browser draws no canvas')
  return context
}
