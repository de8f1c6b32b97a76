import { useTranslation } from 'react-i18next'
import { Outlet } from 'react-router-dom'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PlainNetworkWarning } from '@/features/shell/plain-network-warning'
import { SignIn } from '@/features/sign-in/sign-in'
import { useSession } from '@/lib/session'

/** Nobody signed in: the sign-in page, at the address that was asked for. */
export function SessionGate() {
  const session = useSession()
  const { t } = useTranslation()
  if (session.isPending) return <Loading />
  if (session.isError) {
    return (
      <main className="px-10 py-10" aria-label={t('nav:signIn.title')}>
        <ErrorState error={session.error} retry={session.refetch} />
      </main>
    )
  }
  if (session.data === null) return <SignIn />
  return (
    <>
      {session.data.plainNetwork && <PlainNetworkWarning />}
      <Outlet />
    </>
  )
}
