import type { Tolerance } from '@shared/schemas/parts'
import { formatNumber, fromUm } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { gateDecimals } from '@/components/tolerance-rule/rule-graduations'
import { useDisplayUnit } from '@/lib/settings'

/** A tolerance as a list has it, in the shop's unit: "T 0.60" or "T −0.60 to −0.20". Bands say no limit by themselves: µm then. */
export function useToleranceWords(): (tolerance: Tolerance) => string {
  const { t } = useTranslation()
  const wanted = useDisplayUnit()
  const unit = wanted === 'bands' ? 'um' : wanted
  const number = (valueUm: number, signed: boolean) => {
    const value = fromUm(valueUm, unit)
    return formatNumber(value, gateDecimals(value), signed)
  }
  return (tolerance) => {
    switch (tolerance.kind) {
      case 'none':
        return t('tolerance.none')
      case 'plain':
        return t('tolerance.plain', { max: number(tolerance.max.valueUm, false) })
      case 'signed':
        return t('tolerance.signed', {
          least: number(tolerance.least.valueUm, true),
          most: number(tolerance.most.valueUm, true),
        })
    }
  }
}
