/**
 * Height that one band of gap stands for: λ ÷ (2 cos θ), µm, with λ the wavelength in the gap's air (nm) and θ
 * the angle in the gap from the face's normal (degrees).
 *
 * @throws RangeError for a wavelength that isn't positive or an angle of 90° and more
 */
export function bandHeightUm(wavelengthNm: number, viewingAngleDeg: number): number {
  if (!(wavelengthNm > 0)) throw new RangeError('the wavelength must be above 0 nm')
  if (!(Math.abs(viewingAngleDeg) < 90)) throw new RangeError('the viewing angle must be below 90°')
  return wavelengthNm / 2000 / Math.cos((viewingAngleDeg * Math.PI) / 180)
}
