import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import { useDisplayUnit } from '@/lib/settings'
import { lineColumns } from './reading-line'

/** Column heads over lists of readings. Rows say it all themselves, so these are for the eye. */
export function LineHeads({ what, when }: { what: string; when: string }) {
  const { t } = useTranslation()
  const unit = useDisplayUnit()
  return (
    <div aria-hidden="true" className={classNames(lineColumns, 'pb-2 text-axis text-muted')}>
      <span />
      <span className="-ml-[44px] desk:-ml-12">{t('heads.piece')}</span>
      <span>{what}</span>
      <span className="text-right max-desk:hidden">{when}</span>
      <span className="text-right">{t('heads.flatness', { unit: t(`unit.${unit}`) })}</span>
      <span />
      <span className="flex justify-between">
        <span>0</span>
        <span className="relative left-1/8 w-0 text-center">
          <span className="-translate-x-1/2 absolute">{t('heads.tolerance')}</span>
        </span>
        <span />
      </span>
      <span />
      <span>{t('heads.verdict')}</span>
    </div>
  )
}
