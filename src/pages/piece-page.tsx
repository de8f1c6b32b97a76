import type { Face } from '@shared/schemas/parts'
import type { PiecePage as PiecePageData } from '@shared/schemas/pieces'
import { useTranslation } from 'react-i18next'
import { Link, useParams } from 'react-router-dom'
import { EmptyState } from '@/components/empty-state'
import { ErrorState } from '@/components/error-state'
import { Facts } from '@/components/facts'
import { SelectField } from '@/components/fields/select-field'
import { Loading } from '@/components/loading'
import { NewReadingLink } from '@/components/new-reading-link'
import { PageHead } from '@/components/page-head'
import { useFaceWords } from '@/components/readings/face-words'
import { PlainReadingLine } from '@/components/readings/plain-reading-line'
import { Section } from '@/components/section'
import { CertificatesSection } from '@/features/pieces/certificates-section'
import { DispositionSection } from '@/features/pieces/disposition-section'
import { FaceHistory } from '@/features/pieces/face-history'
import { usePiece } from '@/lib/queries/pieces'
import { useDocumentTitle } from '@/lib/use-document-title'
import { useFilterParams } from '@/lib/use-filter-params'

export function PiecePage() {
  const { id = '' } = useParams()
  const { t } = useTranslation('pieces')
  const page = usePiece(id)
  const chosen = useFilterParams()
  const piece = page.data?.piece
  useDocumentTitle(piece && t('page.title', { part: piece.partNumber, serial: piece.serial }))
  if (page.isPending) return <Loading />
  if (page.isError) return <ErrorState error={page.error} retry={page.refetch} />
  const { faces, readings } = page.data
  const face = faces.find((one) => one.id === chosen.get('face')) ?? faces[0]
  return (
    <>
      <PieceHead page={page.data} face={face} chooseFace={(faceId) => chosen.set('face', faceId)} />
      {face && (
        <FaceHistory key={face.id} readings={readings.filter((reading) => reading.face.id === face.id)} />
      )}
      <DispositionSection page={page.data} />
      <CertificatesSection certificates={page.data.certificates} />
      <Section title={t('page.readings.title')} note={t('page.readings.note')}>
        {readings.length === 0 && <EmptyState>{t('page.readings.empty')}</EmptyState>}
        <ul>
          {readings.toReversed().map((reading) => (
            <PlainReadingLine key={reading.id} reading={reading} />
          ))}
        </ul>
      </Section>
    </>
  )
}

interface HeadProps {
  page: PiecePageData
  face: Face | undefined
  chooseFace: (id: string) => void
}

function PieceHead({ page: { piece, part, faces }, face, chooseFace }: HeadProps) {
  const { t } = useTranslation('pieces')
  return (
    <PageHead
      margin={piece.customerName}
      title={
        <span className="text-title">
          <span className="font-semibold">
            {t('page.title', { part: piece.partNumber, serial: piece.serial })}
          </span>{' '}
          <span className="ml-1 font-light">{piece.partName}</span>
        </span>
      }
      actions={<NewReadingLink pieceId={piece.id} />}
    >
      <div className="mt-3 flex flex-wrap items-end gap-x-10 gap-y-3">
        {faces.length > 1 && face && (
          <SelectField
            label={t('page.chooseFace')}
            choices={faces.map(({ id, name }) => ({ value: id, label: name }))}
            value={face.id}
            onChange={chooseFace}
            className="w-48"
          />
        )}
        <PieceFacts piece={piece} part={part} face={face} />
      </div>
    </PageHead>
  )
}

function PieceFacts({
  piece,
  part,
  face,
}: Pick<PiecePageData, 'piece' | 'part'> & { face: Face | undefined }) {
  const { t } = useTranslation('pieces')
  const words = useFaceWords()
  const drawing = part.revision
    ? t('page.facts.drawingValue', { number: part.number, revision: part.revision })
    : part.number
  return (
    <Facts
      facts={[
        {
          name: t('page.facts.drawing'),
          value: (
            <Link
              to={`/parts/${part.id}`}
              className="underline decoration-hairline underline-offset-3 hover:decoration-ink"
            >
              {drawing}
            </Link>
          ),
        },
        ...(face
          ? [
              { name: t('page.facts.face'), value: `${face.name}, ${words.size(face)}` },
              {
                name: t('page.facts.tolerance'),
                value: `${words.typedTolerance(face.tolerance)}, ${words.reference(face.reference)}`,
              },
              { name: t('page.facts.rule'), value: words.rule(face.rule) },
            ]
          : []),
        { name: t('page.facts.lot'), value: piece.lotNumber ?? t('page.facts.noLot') },
      ]}
    />
  )
}
