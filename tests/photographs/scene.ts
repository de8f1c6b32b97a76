/**
 * What a drawn photograph of interference bands is made of. Everything that is known about the face, the set-up, the
 * camera and the file stands in a `Scene`; drawing it, its traces and its true figures follow from it and nothing else.
 *
 * Part place: mm, origin at the face's middle, axes fixed to the piece. Photo place: pixels, x right, y down, pixel
 * centres at whole numbers. Angles go from x towards y, so clockwise as seen.
 */

/** Wavelength in air of each lamp, nm. */
export const lampWavelengthsNm = {
  heneLaser: 632.816,
  helium: 587.5618,
  sodium: 589.294,
  mercuryGreen: 546.074,
  greenLaser: 532,
} as const

export type Lamp = keyof typeof lampWavelengthsNm

export type PlaceMm = readonly [xMm: number, yMm: number]

/** Radial slots, all alike, evenly round the middle. */
export interface Slots {
  count: number
  innerRadiusMm: number
  outerRadiusMm: number
  widthMm: number
  firstDeg: number
}

/** Kidney-shaped port of a valve plate: an arc of even width with round ends. */
export interface KidneyPort {
  radiusMm: number
  widthMm: number
  middleDeg: number
  spanDeg: number
}

export interface Face {
  shape: 'disc' | 'annulus' | 'block'
  /** Width and height; a disc or annulus has its diameter twice. */
  sizeMm: readonly [number, number]
  boreMm: number
  edgeBandMm: number
  slots: Slots | null
  kidneyPorts: readonly KidneyPort[]
  datumMarksMm: readonly PlaceMm[]
}

/** Form terms in µm over the radius that encloses the face's longer side; `height.ts` has the formula. */
export interface Form {
  powerUm: number
  astig0Um: number
  astig45Um: number
  comaXUm: number
  comaYUm: number
  sphericalUm: number
}

/** Drop towards the outer rim; lobes make it uneven round the rim. */
export interface RolledRim {
  dropUm: number
  widthMm: number
  /** Share of the drop by which it swings round the rim, 0 to 1. */
  lobeShare: number
  lobeCount: number
  lobeDeg: number
}

/** Random smooth field; its seed is its own, so that two photographs of one piece can share it. */
export interface Waviness {
  rmsUm: number
  /** Width at half height of the kernel that smooths it. */
  lengthMm: number
  seed: number
}

/** Gaussian hill, or hollow where the height is negative. */
export interface Bump {
  xMm: number
  yMm: number
  heightUm: number
  sigmaMm: number
}

/** Air wedge between face and flat, in the photograph's axes. */
export interface Wedge {
  bandsAcross: number
  towardsDeg: number
  /** Gap at the face's middle, the face's own height there not counted, in bands. */
  middleBands: number
}

export interface Camera {
  widthPx: number
  heightPx: number
  /** A disc's diameter over the photo's shorter side; a block's length over the photo's width. */
  fill: number
  /** Turn of the piece in the photograph. */
  turnDeg: number
  /** Where the face's middle lies off the photo's middle. */
  offsetMm: PlaceMm
  viewingAngleDeg: number
  /** Direction in the photo in which a tilted face recedes from the camera. */
  recedesDeg: number
  distanceInFaceSizes: number
  /** Radial lens distortion: share by which the photo's corners are pushed outwards. */
  distortion: number
}

export interface Light {
  visibility: number
  /** Share of second harmonic, as an uncoated flat over bright metal gives it. */
  harmonic: number
  /** Loss of light from the middle to the photo's corner. */
  vignette: number
  lightSlope: number
  /** Share of a second, weak set of bands from the flat's upper side. */
  ghost: number
  /** Count of clipped glints. */
  hotspots: number
  /** Brightness of the middle, before the bands, as share of white. */
  exposure: number
}

export interface Surface {
  /** Relative contrast of speckle. */
  speckle: number
  dustCount: number
  scratchCount: number
}

export interface Sensor {
  blurPx: number
  electronsAtWhite: number
  readNoise: number
  /** Strength of a phone's contrast curve, 0 for none. */
  toneCurve: number
}

export type PhotoFormat = 'jpeg' | 'png8' | 'png16' | 'tiff8' | 'webp'

/** How the photograph is kept. 16 bits hold linear light, 8 bits sRGB. */
export interface StoredFile {
  format: PhotoFormat
  colours: 'rgb' | 'grey'
  quality: number
  exifOrientation: 1 | 2 | 3 | 4 | 5 | 6 | 7 | 8
}

export interface Scene {
  name: string
  family: string
  seed: number
  lamp: Lamp
  face: Face
  form: Form
  rolledRim: RolledRim
  waviness: Waviness
  bumps: readonly Bump[]
  wedge: Wedge
  camera: Camera
  light: Light
  surface: Surface
  sensor: Sensor
  file: StoredFile
}

/** Height of one band in µm at the scene's viewing angle. */
export function bandHeightUm(scene: Scene): number {
  const cosine = Math.cos((scene.camera.viewingAngleDeg * Math.PI) / 180)
  return lampWavelengthsNm[scene.lamp] / 2000 / cosine
}

/** Half the face's longer side, mm: a disc's radius. */
export function faceRadiusMm(face: Face): number {
  return Math.max(face.sizeMm[0], face.sizeMm[1]) / 2
}

/** A flat 40 mm disc under helium light in a plain photograph; scenes are made from it by changing parts. */
export function plainScene(name: string, seed: number): Scene {
  return {
    name,
    family: 'plain',
    seed,
    lamp: 'helium',
    face: {
      shape: 'disc',
      sizeMm: [40, 40],
      boreMm: 0,
      edgeBandMm: 0.8,
      slots: null,
      kidneyPorts: [],
      datumMarksMm: [],
    },
    form: { powerUm: 0, astig0Um: 0, astig45Um: 0, comaXUm: 0, comaYUm: 0, sphericalUm: 0 },
    rolledRim: { dropUm: 0, widthMm: 2, lobeShare: 0, lobeCount: 3, lobeDeg: 0 },
    waviness: { rmsUm: 0, lengthMm: 8, seed },
    bumps: [],
    wedge: { bandsAcross: 15, towardsDeg: 60, middleBands: 12.4 },
    camera: {
      widthPx: 1600,
      heightPx: 1200,
      fill: 0.82,
      turnDeg: 0,
      offsetMm: [0, 0],
      viewingAngleDeg: 0,
      recedesDeg: 90,
      distanceInFaceSizes: 6,
      distortion: 0,
    },
    light: {
      visibility: 0.6,
      harmonic: 0,
      vignette: 0.25,
      lightSlope: 0.15,
      ghost: 0,
      hotspots: 0,
      exposure: 0.55,
    },
    surface: { speckle: 0, dustCount: 6, scratchCount: 0 },
    sensor: { blurPx: 0.9, electronsAtWhite: 9000, readNoise: 0.004, toneCurve: 0 },
    file: { format: 'jpeg', colours: 'rgb', quality: 92, exifOrientation: 1 },
  }
}

/** The same scene in a photograph of another width, its height, blur and offsets in proportion. */
export function withPhotoWidth(scene: Scene, widthPx: number): Scene {
  const share = widthPx / scene.camera.widthPx
  const heightPx = Math.round(scene.camera.heightPx * share)
  return {
    ...scene,
    camera: { ...scene.camera, widthPx, heightPx },
    sensor: { ...scene.sensor, blurPx: scene.sensor.blurPx * share },
  }
}
