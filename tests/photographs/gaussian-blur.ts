/** Half of the weights of a gaussian, from its middle outwards; with all mirrored they sum to one. */
function halfKernel(sigmaPx: number): Float64Array {
  const reach = Math.max(1, Math.ceil(3 * sigmaPx))
  const weights = Float64Array.from({ length: reach + 1 }, (_, step) =>
    Math.exp(-0.5 * (step / sigmaPx) ** 2),
  )
  const sum = weights.reduce((total, weight) => total + 2 * weight, -weights[0])
  return weights.map((weight) => weight / sum)
}

/**
 * Blurs lines of `length` pixels that lie `stride` apart; `between` leads from one line to the next. Places beyond an end count
 * as the end.
 */
function blurLines(
  from: Float32Array,
  to: Float32Array,
  kernel: Float64Array,
  { lines, between, length, stride }: { lines: number; between: number; length: number; stride: number },
): void {
  const reach = kernel.length - 1
  const last = length - 1
  for (let line = 0; line < lines; line++) {
    const start = line * between
    for (let i = 0; i < length; i++) {
      let sum = kernel[0] * from[start + i * stride]
      for (let step = 1; step <= reach; step++) {
        const before = Math.max(i - step, 0)
        const after = Math.min(i + step, last)
        sum += kernel[step] * (from[start + before * stride] + from[start + after * stride])
      }
      to[start + i * stride] = sum
    }
  }
}

/** Blurs a picture of one value a pixel by a gaussian, in place. */
export function gaussianBlur(picture: Float32Array, widthPx: number, sigmaPx: number): void {
  if (sigmaPx <= 0) return
  const kernel = halfKernel(sigmaPx)
  const heightPx = picture.length / widthPx
  const rowsDone = new Float32Array(picture.length)
  blurLines(picture, rowsDone, kernel, { lines: heightPx, between: widthPx, length: widthPx, stride: 1 })
  blurLines(rowsDone, picture, kernel, { lines: widthPx, between: 1, length: heightPx, stride: widthPx })
}
