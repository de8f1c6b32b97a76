import { gaussianBlur } from './gaussian-blur'
import { pixelNoise } from './pixel-noise'
import type { Scene } from './scene'
import { type SeededRandom, seededRandom } from './seeded-random'

/** Sizes below are for a photo of this width and grow with it. */
const REFERENCE_WIDTH_PX = 1600

interface Picture {
  light: Float32Array
  widthPx: number
  heightPx: number
}

/** Calls back for the pixels within `reach` of a place, with their distance from it. */
function eachPixelAbout(
  picture: Picture,
  place: { x: number; y: number; reach: number },
  visit: (index: number, distancePx: number) => void,
): void {
  const { widthPx, heightPx } = picture
  const { x, y, reach } = place
  const bottom = Math.min(heightPx - 1, Math.ceil(y + reach))
  const right = Math.min(widthPx - 1, Math.ceil(x + reach))
  for (let row = Math.max(0, Math.floor(y - reach)); row <= bottom; row++) {
    for (let column = Math.max(0, Math.floor(x - reach)); column <= right; column++) {
      visit(row * widthPx + column, Math.hypot(column - x, row - y))
    }
  }
}

function randomPlace({ widthPx, heightPx }: Picture, random: SeededRandom) {
  return { x: random.between(0, widthPx), y: random.between(0, heightPx) }
}

/** Dark grains with soft edges, anywhere in the picture: they lie on the flat. */
function addDust(picture: Picture, count: number, random: SeededRandom): void {
  const scale = picture.widthPx / REFERENCE_WIDTH_PX
  for (let grain = 0; grain < count; grain++) {
    const place = randomPlace(picture, random)
    const radius = scale * random.between(3, 10)
    const depth = random.between(0.5, 0.9)
    eachPixelAbout(picture, { ...place, reach: 2.2 * radius }, (index, distance) => {
      picture.light[index] *= 1 - depth * Math.exp(-1.6 * (distance / radius) ** 4)
    })
  }
}

/** Fine bright lines: scratches in the flat's lower side scatter the lamp's light. */
function addScratches(picture: Picture, count: number, random: SeededRandom): void {
  const { widthPx, heightPx, light } = picture
  const scale = widthPx / REFERENCE_WIDTH_PX
  for (let scratch = 0; scratch < count; scratch++) {
    const direction = random.between(0, 2 * Math.PI)
    const length = scale * random.between(150, 900)
    const glow = random.between(0.6, 1.6)
    const start = { x: random.between(0.2, 0.8) * widthPx, y: random.between(0.1, 0.9) * heightPx }
    for (let along = 0; along < length; along += 0.5) {
      const x = Math.round(start.x + along * Math.cos(direction))
      const y = Math.round(start.y + along * Math.sin(direction))
      if (x < 0 || y < 0 || x >= widthPx || y >= heightPx) continue
      // Two steps fall on most pixels, so each adds half.
      light[y * widthPx + x] += 0.5 * glow
    }
  }
}

/** Glints that overdrive the sensor. */
function addHotspots(picture: Picture, count: number, random: SeededRandom): void {
  const scale = picture.widthPx / REFERENCE_WIDTH_PX
  for (let spot = 0; spot < count; spot++) {
    const x = random.between(0.25, 0.75) * picture.widthPx
    const y = random.between(0.2, 0.8) * picture.heightPx
    const radius = scale * random.between(8, 30)
    const glow = random.between(0.6, 1.6)
    eachPixelAbout(picture, { x, y, reach: 3.5 * radius }, (index, distance) => {
      picture.light[index] += glow * Math.exp(-0.5 * (distance / radius) ** 2)
    })
  }
}

/** Grain of a matte face: light of each grain multiplied by noise that runs over a few pixels. */
function addSpeckle(picture: Picture, scene: Scene): void {
  const contrast = scene.surface.speckle
  if (contrast === 0) return
  const { light, widthPx } = picture
  const grainPx = (1.3 * widthPx) / REFERENCE_WIDTH_PX
  const noise = pixelNoise(scene.seed, 'speckle')
  const grain = new Float32Array(light.length)
  for (let i = 0; i < grain.length; i++) grain[i] = noise()
  gaussianBlur(grain, widthPx, grainPx)
  // Blurring by s leaves white noise 1/(2s√π) of its deviation.
  const gain = contrast * 2 * grainPx * Math.sqrt(Math.PI)
  for (let i = 0; i < light.length; i++) light[i] *= Math.max(0, 1 + gain * grain[i])
}

/** Puts the scene's speckle, dust, scratches and glints into its light, before the lens. */
export function addBlemishes(scene: Scene, light: Float32Array): void {
  const random = seededRandom(scene.seed, 'blemishes')
  const picture = { light, widthPx: scene.camera.widthPx, heightPx: scene.camera.heightPx }
  addSpeckle(picture, scene)
  addScratches(picture, scene.surface.scratchCount, random)
  addHotspots(picture, scene.light.hotspots, random)
  addDust(picture, scene.surface.dustCount, random)
}
