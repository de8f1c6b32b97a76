import { addBlemishes } from './blemishes'
import { gaussianBlur } from './gaussian-blur'
import { lightField } from './light-field'
import { pixelNoise } from './pixel-noise'
import type { Lamp, Scene } from './scene'

/** A photograph in linear light, 1 is white; three values a pixel, row by row. */
export interface DrawnPhotograph {
  width: number
  height: number
  rgb: Float32Array
}

/** What a camera's three channels see of each lamp, the brightest being 1. */
const lampColours: Record<Lamp, readonly [number, number, number]> = {
  heneLaser: [1, 0.1, 0.015],
  helium: [1, 0.585, 0.032],
  sodium: [1, 0.53, 0.03],
  mercuryGreen: [0.25, 1, 0.097],
  greenLaser: [0.077, 1, 0.114],
}

/** Which of the three channels sees most of a lamp. */
export function brightestChannel(lamp: Lamp): number {
  return lampColours[lamp].indexOf(1)
}

/** Each channel's light with the noise of counted electrons and of reading them out. */
function sensed(light: Float32Array, scene: Scene): Float32Array {
  const { electronsAtWhite, readNoise } = scene.sensor
  const colour = lampColours[scene.lamp]
  const noise = pixelNoise(scene.seed, 'sensor')
  const readNoise2 = readNoise * readNoise
  const rgb = new Float32Array(3 * light.length)
  for (let i = 0; i < light.length; i++) {
    for (let channel = 0; channel < 3; channel++) {
      const level = light[i] * colour[channel]
      const value = level + Math.sqrt(readNoise2 + level / electronsAtWhite) * noise()
      rgb[3 * i + channel] = Math.min(Math.max(value, 0), 1)
    }
  }
  return rgb
}

/** Draws the photograph of a scene: the light of its bands, its dirt, the lens, the sensor. The same scene, the same picture. */
export function drawPhotograph(scene: Scene): DrawnPhotograph {
  const { widthPx, heightPx } = scene.camera
  const light = lightField(scene)
  addBlemishes(scene, light)
  gaussianBlur(light, widthPx, scene.sensor.blurPx)
  return { width: widthPx, height: heightPx, rgb: sensed(light, scene) }
}
