import type { DecisionRule, Face, Tolerance } from '@shared/schemas/parts'
import { formatHeight, type HeightUnit, parseHeight } from '@shared/units/height'
import { useTranslation } from 'react-i18next'
import { useDisplayUnit } from '@/lib/settings'

const mm = (value: number) => String(Number(value.toFixed(3)))

/** Shape, sizes, tolerance and rule of a face in words. */
export function useFaceWords() {
  const { t } = useTranslation('parts')
  const wanted = useDisplayUnit()
  const unit = wanted === 'bands' ? 'um' : wanted
  const height = (um: number, signed = false) =>
    formatHeight(um, unit, { signed, decimals: decimalsFor(um, unit) })

  const tolerance = (value: Tolerance): string => {
    switch (value.kind) {
      case 'none':
        return t('words.noTolerance')
      case 'plain':
        return height(value.max.valueUm)
      case 'signed':
        return t('words.signed', {
          least: height(value.least.valueUm, true),
          most: height(value.most.valueUm, true),
        })
    }
  }
  return {
    size: ({ size, edgeBandMm }: Pick<Face, 'size' | 'edgeBandMm'>): string => {
      const words = t(`words.${size.shape}`, numbersOf(size))
      return edgeBandMm > 0 ? t('words.withEdgeBand', { size: words, edgeBand: mm(edgeBandMm) }) : words
    },
    tolerance,
    /** As on the drawing: what was typed, and what it means where that isn't the same. */
    typedTolerance: (value: Tolerance): string => {
      const typed = typedOf(value)
      const meant = tolerance(value)
      if (typed.every((text) => isInUnit(text, unit))) return meant
      return t('words.typed', { meant, typed: typed.join(', ') })
    },
    rule: (rule: DecisionRule): string => t(`readings:rule.${rule.kind}`, { factor: rule.guardFactor }),
    reference: (reference: Face['reference']): string => t(`reference.${reference}`),
  }
}

function numbersOf(size: Face['size']): Record<string, string> {
  return Object.fromEntries(
    Object.entries(size).flatMap(([key, value]) => (typeof value === 'number' ? [[key, mm(value)]] : [])),
  )
}

function typedOf(tolerance: Tolerance): string[] {
  switch (tolerance.kind) {
    case 'none':
      return []
    case 'plain':
      return [tolerance.max.typed]
    case 'signed':
      return [tolerance.least.typed, tolerance.most.typed]
  }
}

/** Typed in the unit shown: nothing is added by saying it again. */
function isInUnit(typed: string, unit: HeightUnit): boolean {
  const parsed = parseHeight(typed, { bandUm: 1 })
  return parsed.ok && parsed.value.unit === unit
}

/** Limits have the decimals that they need, two at least in µm. */
function decimalsFor(um: number, unit: 'um' | 'nm' | 'uin' | 'tenths'): number | undefined {
  if (unit !== 'um') return undefined
  return Math.abs(um * 100 - Math.round(um * 100)) < 1e-6 ? 2 : 3
}
