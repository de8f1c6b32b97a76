import { useTranslation } from 'react-i18next'
import { ErrorState } from '@/components/error-state'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { EquipmentSection } from '@/features/equipment/equipment-section'
import { useEquipment } from '@/lib/queries/equipment'
import { useDocumentTitle } from '@/lib/use-document-title'

const kinds = ['lightSource', 'referenceFlat', 'cameraSetUp', 'thermometer'] as const

export function EquipmentPage() {
  const { t } = useTranslation('equipment')
  const equipment = useEquipment()
  useDocumentTitle(t('title'))
  if (equipment.isPending) return <Loading />
  if (equipment.isError) return <ErrorState error={equipment.error} retry={equipment.refetch} />
  return (
    <>
      <PageHead title={t('title')} />
      {kinds.map((kind) => (
        <EquipmentSection
          key={kind}
          kind={kind}
          rows={equipment.data.rows.filter((row) => row.details.kind === kind)}
        />
      ))}
    </>
  )
}
