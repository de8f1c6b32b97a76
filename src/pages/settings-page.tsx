import { useTranslation } from 'react-i18next'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { SettingsForm } from '@/features/settings/settings-form'
import { useMay } from '@/lib/session'
import { useSettings } from '@/lib/settings'
import { useDocumentTitle } from '@/lib/use-document-title'

export function SettingsPage() {
  const { t } = useTranslation('settings')
  const settings = useSettings()
  const mayEdit = useMay('settings:edit')
  useDocumentTitle(t('title'))
  if (settings.isPending) return <Loading />
  if (settings.isError) return <ErrorState error={settings.error} retry={settings.refetch} />
  return (
    <>
      <PageHead title={t('title')} />
      {mayEdit ? <SettingsForm settings={settings.data} /> : <EmptyState>{t('notAllowed')}</EmptyState>}
    </>
  )
}
