import type { PartPage as PartPageData } from '@shared/schemas/pieces'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { useParams } from 'react-router-dom'
import { Button } from '@/components/button'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Facts } from '@/components/facts'
import { Loading } from '@/components/loading'
import { PageHead } from '@/components/page-head'
import { PieceLine } from '@/components/readings/piece-line'
import { Section } from '@/components/section'
import { FaceDialog } from '@/features/parts/face-dialog'
import { FaceRow } from '@/features/parts/face-row'
import { LotDialog } from '@/features/parts/lot-dialog'
import { PartDialog } from '@/features/parts/part-dialog'
import { AddPieceDialog } from '@/features/pieces/add-piece-dialog'
import { usePart } from '@/lib/queries/parts'
import { useMay } from '@/lib/session'
import { useDocumentTitle } from '@/lib/use-document-title'

export function PartPage() {
  const { id = '' } = useParams()
  const page = usePart(id)
  useDocumentTitle(page.data?.part.number)
  if (page.isPending) return <Loading />
  if (page.isError) return <ErrorState error={page.error} retry={page.refetch} />
  return (
    <>
      <PartHead page={page.data} />
      <PartFaces page={page.data} />
      <PartPieces page={page.data} />
      <PartLots page={page.data} />
    </>
  )
}

function PartHead({ page: { part, pieces } }: { page: PartPageData }) {
  const { t } = useTranslation('parts')
  const mayEdit = useMay('part:edit')
  const [isEditing, setEditing] = useState(false)
  return (
    <PageHead
      margin={part.customerName}
      title={
        <span className="text-title">
          <span className="font-semibold">{part.number}</span> <span className="font-light">{part.name}</span>
        </span>
      }
      actions={mayEdit && <Button onClick={() => setEditing(true)}>{t('part.edit')}</Button>}
    >
      <div className="mt-3">
        <Facts
          facts={[
            { name: t('facts.customer'), value: part.customerName },
            { name: t('facts.revision'), value: part.revision || t('common:none') },
            { name: t('facts.material'), value: part.material || t('common:notStated') },
            { name: t('facts.pieces'), value: pieces.length },
          ]}
        />
      </div>
      {isEditing && <PartDialog part={part} onClose={() => setEditing(false)} />}
    </PageHead>
  )
}

function PartFaces({ page: { part, faces } }: { page: PartPageData }) {
  const { t } = useTranslation('parts')
  const mayEdit = useMay('part:edit')
  const [isAdding, setAdding] = useState(false)
  return (
    <Section title={t('face.title')} note={t('face.note')}>
      {faces.length === 0 && <EmptyState>{t('face.empty')}</EmptyState>}
      <ul>
        {faces.map((face) => (
          <FaceRow key={face.id} face={face} />
        ))}
      </ul>
      {mayEdit && (
        <Button kind={faces.length === 0 ? 'main' : 'plain'} onClick={() => setAdding(true)}>
          {t('face.add')}
        </Button>
      )}
      {isAdding && <FaceDialog partId={part.id} onClose={() => setAdding(false)} />}
    </Section>
  )
}

function PartPieces({ page: { part, pieces } }: { page: PartPageData }) {
  const { t } = useTranslation('parts')
  const mayAdd = useMay('piece:create')
  const [isAdding, setAdding] = useState(false)
  return (
    <Section title={t('pieces.title')} note={t('pieces.note')}>
      {pieces.length === 0 && <EmptyState>{t('pieces.empty')}</EmptyState>}
      <ul>
        {pieces.map((piece) => (
          <PieceLine key={piece.id} piece={piece} />
        ))}
      </ul>
      {mayAdd && (
        <Button className="mt-2" onClick={() => setAdding(true)}>
          {t('pieces.add')}
        </Button>
      )}
      {isAdding && <AddPieceDialog partId={part.id} onClose={() => setAdding(false)} />}
    </Section>
  )
}

function PartLots({ page: { part, lots } }: { page: PartPageData }) {
  const { t } = useTranslation('parts')
  const mayAdd = useMay('piece:create')
  const [isAdding, setAdding] = useState(false)
  return (
    <Section title={t('lots.title')}>
      {lots.length === 0 && <EmptyState>{t('lots.empty')}</EmptyState>}
      <ul>
        {lots.map((lot) => (
          <li key={lot.id} className="flex gap-6 border-hairline border-t py-2 first:border-t-0">
            <span className="w-40 font-semibold">{lot.number}</span>
            <span className="text-muted">{lot.order && t('lots.orderOf', { order: lot.order })}</span>
          </li>
        ))}
      </ul>
      {mayAdd && (
        <Button className="mt-2" onClick={() => setAdding(true)}>
          {t('lots.add')}
        </Button>
      )}
      {isAdding && <LotDialog partId={part.id} onClose={() => setAdding(false)} />}
    </Section>
  )
}
