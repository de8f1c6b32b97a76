import { useTranslation } from 'react-i18next'
import { KeyCap } from '@/components/key-cap'
import { useMe } from '@/lib/session'
import { useKeySheet } from './key-sheet'

export function Footer() {
  const { t } = useTranslation()
  const me = useMe()
  const openKeys = useKeySheet()
  return (
    <footer className="mx-auto mt-10 w-full max-w-[1280px] px-6 desk:px-10">
      <div className="flex items-center gap-6 border-hairline border-t py-2 text-axis text-muted">
        <span>{t('nav:footer.name')}</span>
        <span>{me.shop.name}</span>
        <button
          type="button"
          onClick={openKeys}
          className="ml-auto flex min-h-8 items-center gap-1.5 hover:text-ink"
        >
          <KeyCap>?</KeyCap>
          {t('nav:footer.keys')}
        </button>
      </div>
    </footer>
  )
}
