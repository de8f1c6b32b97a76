import { Minus, Plus } from 'lucide-react'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import type { View } from '../canvas/use-viewport'
import { oneToOne, zoomAbout, zoomTo } from '../viewport'

/** Zoom for hands without a wheel. */
export function ViewButtons({ view }: { view: View }) {
  const { t } = useTranslation('table')
  const middle = { x: view.area.width / 2, y: view.area.height / 2 }
  return (
    <fieldset
      aria-label={t('status.viewLabel')}
      className="absolute m-0 min-w-0 right-3 bottom-3 flex rounded border border-edge bg-ground/90"
    >
      <Cell label={t('status.zoomOut')} onClick={() => view.change((v) => zoomAbout(v, middle, 0.8))}>
        <Minus aria-hidden="true" size={14} />
      </Cell>
      <span className="flex min-w-[52px] items-center justify-center border-hairline border-l px-2 text-second max-desk:min-w-[62px]">
        {t('status.zoom', { percent: Math.round(view.viewport.scale * 100) })}
      </span>
      <Cell label={t('status.zoomIn')} onClick={() => view.change((v) => zoomAbout(v, middle, 1.25))}>
        <Plus aria-hidden="true" size={14} />
      </Cell>
      <Cell onClick={view.fitAll}>{t('status.fit')}</Cell>
      <Cell onClick={() => view.change((v) => zoomTo(v, middle, oneToOne))}>{t('status.oneToOne')}</Cell>
    </fieldset>
  )
}

interface CellProps {
  label?: string
  onClick: () => void
  children: ReactNode
}

function Cell({ label, onClick, children }: CellProps) {
  return (
    <button
      type="button"
      aria-label={label}
      onClick={onClick}
      className="flex h-7 min-w-8 items-center justify-center border-hairline border-l px-2.5 text-second first:border-l-0 hover:bg-step-active max-desk:h-[46px] max-desk:min-w-[46px] max-desk:text-section max-desk:font-normal"
    >
      {children}
    </button>
  )
}
