import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Dialog } from '@/components/dialog'

const cautions = ['lamps', 'warm', 'lift', 'stick', 'rules'] as const

export function CautionsButton() {
  const { t } = useTranslation('table')
  const [isOpen, setOpen] = useState(false)
  return (
    <>
      <button
        type="button"
        onClick={() => setOpen(true)}
        className="text-muted text-second underline decoration-edge underline-offset-3 hover:text-ink max-desk:min-h-11"
      >
        {t('cautions.title')}
      </button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={t('cautions.title')}>
        <ul>
          {cautions.map((caution) => (
            <li key={caution} className="border-hairline border-t py-1.5 first:border-t-0">
              {t(`cautions.${caution}`)}
            </li>
          ))}
        </ul>
      </Dialog>
    </>
  )
}
