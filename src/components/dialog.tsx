import { X } from 'lucide-react'
import { Dialog as Primitive } from 'radix-ui'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'

interface Props {
  open: boolean
  onClose: () => void
  title: string
  /** One sentence below the title. */
  description?: string
  children: ReactNode
  wide?: boolean
}

/** A sheet of paper over the page: focus stays within, Escape closes. */
export function Dialog({ open, onClose, title, description, children, wide = false }: Props) {
  const { t } = useTranslation()
  return (
    <Primitive.Root open={open} onOpenChange={(next) => !next && onClose()}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[#12211c]/35" />
        <Primitive.Content
          {...(description ? {} : { 'aria-describedby': undefined })}
          className={classNames(
            'fixed top-[6vh] left-1/2 z-50 max-h-[88vh] w-[min(92vw,30rem)] -translate-x-1/2 overflow-y-auto rounded border border-ink bg-ground px-6 pt-5 pb-6 text-ink',
            wide && 'w-[min(94vw,46rem)]',
          )}
        >
          <Primitive.Title className="mb-4 pr-10 text-headline">{title}</Primitive.Title>
          {description && (
            <Primitive.Description className="mb-4 max-w-[60ch] text-body text-muted">
              {description}
            </Primitive.Description>
          )}
          {children}
          {/* Last in the order, so that the first field has the focus when it opens. */}
          <Primitive.Close
            aria-label={t('common:close')}
            className="absolute top-5 right-4 flex size-9 items-center justify-center rounded text-muted hover:text-ink max-desk:size-11"
          >
            <X aria-hidden="true" size={18} />
          </Primitive.Close>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  )
}
