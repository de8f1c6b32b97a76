import { formatHeight, formatWithUncertainty, unitSymbol } from '@shared/units/height'
import { classNames } from '@/lib/class-names'
import { useDisplayUnit } from '@/lib/settings'

interface Props {
  valueUm: number
  /** null where nobody can state it; then no ± stands. */
  uUm: number | null
  bandUm?: number | null
  /** Unit after the figure; columns name it in their head instead. */
  withUnit?: boolean
  className?: string
}

/** A figure in 600 with its ± U muted after it. */
export function Quantity({ valueUm, uUm, bandUm, withUnit = false, className }: Props) {
  const wanted = useDisplayUnit()
  const band = bandUm ?? undefined
  const unit = wanted === 'bands' && band === undefined ? 'um' : wanted
  const shown =
    uUm === null
      ? { value: formatHeight(valueUm, unit, { bandUm: band, bare: true }), u: '', unit: unitSymbol(unit) }
      : formatWithUncertainty(valueUm, uUm, unit, band)
  return (
    <span className={classNames('whitespace-nowrap text-figure', className)}>
      <span className="font-semibold">{shown.value}</span>
      {shown.u && <span className="text-muted"> {shown.u.replace('±', '±\u2009')}</span>}
      {(withUnit || unit !== wanted) && <span className="text-muted"> {shown.unit}</span>}
    </span>
  )
}
