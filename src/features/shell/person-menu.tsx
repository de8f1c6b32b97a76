import { DropdownMenu } from 'radix-ui'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { apiNothing } from '@/lib/api-client'
import { queryClient } from '@/lib/query-client'
import { queryKeys } from '@/lib/query-keys'
import { useMe } from '@/lib/session'
import { PasswordDialog } from './password-dialog'

const item =
  'block w-full cursor-pointer border-hairline border-b px-3 py-2 text-left outline-none last:border-b-0 data-highlighted:bg-tool-active max-desk:py-3'

/** Own password and signing out. */
export function PersonMenu() {
  const { t } = useTranslation('nav')
  const me = useMe()
  const [isChanging, setChanging] = useState(false)
  return (
    <>
      <DropdownMenu.Root>
        <DropdownMenu.Trigger
          aria-label={t('person.menu', { name: me.name })}
          className="min-h-11 shrink-0 text-right leading-tight"
        >
          <span className="block font-semibold text-second">{me.name}</span>
          <span className="block text-axis text-muted">{me.shop.name}</span>
        </DropdownMenu.Trigger>
        <DropdownMenu.Portal>
          <DropdownMenu.Content
            align="end"
            sideOffset={6}
            className="z-50 min-w-48 rounded border border-ink bg-field text-body"
          >
            <DropdownMenu.Item className={item} onSelect={() => setChanging(true)}>
              {t('person.password')}
            </DropdownMenu.Item>
            <DropdownMenu.Item className={item} onSelect={signOut}>
              {t('person.signOut')}
            </DropdownMenu.Item>
          </DropdownMenu.Content>
        </DropdownMenu.Portal>
      </DropdownMenu.Root>
      {isChanging && <PasswordDialog onClose={() => setChanging(false)} />}
    </>
  )
}

/** Nothing of this person stays in the store for whoever signs in next. */
async function signOut(): Promise<void> {
  try {
    await apiNothing('DELETE', '/session')
  } catch (error) {
    toast.error(error instanceof Error ? error.message : String(error))
    return
  }
  // The session's own entry stays: pages that watch it learn from it that they are over.
  queryClient.setQueryData(queryKeys.session, null)
  queryClient.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== queryKeys.session[0] })
}
