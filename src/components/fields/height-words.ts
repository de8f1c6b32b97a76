import { formatHeight, type HeightUnit } from '@shared/units/height'

/** A height in µm where it was typed in another unit; nothing to add where it was typed in µm. */
export function heightInWords(valueUm: number, typedUnit: HeightUnit): string | undefined {
  if (typedUnit === 'um') return undefined
  return formatHeight(valueUm, 'um', { decimals: 3 })
}
