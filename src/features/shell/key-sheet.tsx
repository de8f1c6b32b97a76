import { createContext, type ReactNode, useContext, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Dialog } from '@/components/dialog'
import { KeyCap } from '@/components/key-cap'
import { useMay } from '@/lib/session'
import { useHotKey } from '@/lib/use-hot-key'

const OpenKeySheet = createContext<() => void>(() => {})

export function useKeySheet(): () => void {
  return useContext(OpenKeySheet)
}

/** "?" anywhere lists the keys. */
export function KeySheetProvider({ children }: { children: ReactNode }) {
  const [isOpen, setOpen] = useState(false)
  useHotKey('?', () => setOpen(true))
  return (
    <OpenKeySheet.Provider value={() => setOpen(true)}>
      {children}
      <KeySheet open={isOpen} onClose={() => setOpen(false)} />
    </OpenKeySheet.Provider>
  )
}

function KeySheet({ open, onClose }: { open: boolean; onClose: () => void }) {
  const { t } = useTranslation('nav')
  const mayRead = useMay('reading:create')
  const keys = [
    { key: '/', what: t('keys.search') },
    ...(mayRead ? [{ key: 'N', what: t('keys.newReading') }] : []),
    { key: 'H', what: t('keys.home') },
    { key: '?', what: t('keys.sheet') },
    { key: 'Esc', what: t('keys.escape') },
  ]
  return (
    <Dialog open={open} onClose={onClose} title={t('keys.title')} description={t('keys.description')}>
      <dl className="grid grid-cols-[auto_1fr] items-baseline gap-x-4 border-ink border-t">
        {keys.map(({ key, what }) => (
          <div key={key} className="col-span-2 grid grid-cols-subgrid border-hairline border-b py-2">
            <dt>
              <span className="sr-only">{key}</span>
              <KeyCap>{key}</KeyCap>
            </dt>
            <dd>{what}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 text-muted text-second">{t('keys.table')}</p>
    </Dialog>
  )
}
