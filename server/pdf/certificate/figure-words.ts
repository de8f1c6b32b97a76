import type { CertificateSnapshot } from '@shared/schemas/certificates'
import { formatNumber, formatWithUncertainty, parseHeight } from '@shared/units/height'

/** The figure as it is printed, and the decimals that all heights beside it have. */
export function figureWords({ flatnessUm, figure }: CertificateSnapshot): {
  value: string
  u: string
  decimals: number
} {
  const { value, u } = formatWithUncertainty(flatnessUm, figure.expandedUncertaintyUm, 'um')
  return { value, u: u.replace('±', '± '), decimals: value.split('.')[1]?.length ?? 0 }
}

/** As many decimals as a limit on a drawing has: 0.60, 0.3125 and 25. */
export function limitNumber(valueUm: number, signed = false): string {
  const size = Math.abs(valueUm)
  const least = size < 10 ? 2 : size < 100 ? 1 : 0
  const exact = [0, 1, 2, 3, 4].find((n) => Math.abs(valueUm - Number(valueUm.toFixed(n))) < 1e-6)
  return formatNumber(valueUm, Math.max(least, exact ?? 3), signed)
}

/** What was typed on the drawing's behalf, where it isn't in micrometres. */
export function typedElsewise(typed: string): string | null {
  const parsed = parseHeight(typed, { defaultUnit: 'um', bandUm: 1 })
  return parsed.ok && parsed.value.unit === 'um' ? null : typed
}
