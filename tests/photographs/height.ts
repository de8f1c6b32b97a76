import { type Bump, type Form, faceRadiusMm, type RolledRim, type Scene } from './scene'
import { wavinessUm } from './waviness'

/**
 * Height of the face in µm, up out of the face towards the flat.
 *
 * Form, with u = x/R, v = y/R, ρ² = u² + v² and R half the face's longer side (a disc's radius to its very rim, the edge
 * band included; a block's half length):
 *
 *   power·(2ρ² − 1) + astig0·(u² − v²) + astig45·2uv + (3ρ² − 2)·(comaX·u + comaY·v) + spherical·(6ρ⁴ − 6ρ² + 1)
 *
 * So each coefficient is the term's height at the rim, in µm. Negative power is high in the middle.
 *
 * Rolled rim, with d the distance in from a disc's or annulus's outer rim: −drop·e^(−d/width), so that the drop is reached
 * at the rim itself and decays inwards without end; a bore doesn't roll.
 */
export type HeightUm = (xMm: number, yMm: number) => number

function formUm(form: Form, u: number, v: number): number {
  const rho2 = u * u + v * v
  return (
    form.powerUm * (2 * rho2 - 1) +
    form.astig0Um * (u * u - v * v) +
    form.astig45Um * 2 * u * v +
    (3 * rho2 - 2) * (form.comaXUm * u + form.comaYUm * v) +
    form.sphericalUm * (6 * rho2 * rho2 - 6 * rho2 + 1)
  )
}

function rimDropUm(rim: RolledRim, radiusMm: number, xMm: number, yMm: number): number {
  const fromMiddleMm = Math.hypot(xMm, yMm)
  // Off the face the drop stops growing: no band is drawn there, and e^(d/width) would run away.
  const inwardsMm = Math.max(radiusMm - fromMiddleMm, -0.5 * rim.widthMm)
  return rim.dropUm * rimSwing(rim, xMm, yMm) * Math.exp(-inwardsMm / rim.widthMm)
}

function rimSwing(rim: RolledRim, xMm: number, yMm: number): number {
  if (rim.lobeShare === 0) return 1
  const angle = Math.atan2(yMm, xMm) - (rim.lobeDeg * Math.PI) / 180
  return 1 + rim.lobeShare * Math.cos(rim.lobeCount * angle)
}

function bumpUm(bump: Bump, xMm: number, yMm: number): number {
  const across = (xMm - bump.xMm) / bump.sigmaMm
  const down = (yMm - bump.yMm) / bump.sigmaMm
  return bump.heightUm * Math.exp(-0.5 * (across * across + down * down))
}

/** The scene's height at a part place; everything random in it is drawn once, here. */
export function heightUm(scene: Scene): HeightUm {
  const radiusMm = faceRadiusMm(scene.face)
  const waves = wavinessUm(scene.waviness, radiusMm)
  const { form, rolledRim, bumps } = scene
  const rolls = rolledRim.dropUm !== 0 && scene.face.shape !== 'block'
  return (xMm, yMm) => {
    let height = formUm(form, xMm / radiusMm, yMm / radiusMm) + waves(xMm, yMm)
    if (rolls) height -= rimDropUm(rolledRim, radiusMm, xMm, yMm)
    for (const bump of bumps) height += bumpUm(bump, xMm, yMm)
    return height
  }
}
