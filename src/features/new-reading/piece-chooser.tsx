import type { PieceRow } from '@shared/schemas/pieces'
import { type ReactNode, useEffect, useState } from 'react'
import { useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Link } from 'react-router-dom'
import { Button } from '@/components/button'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { SelectField } from '@/components/fields/select-field'
import { TextField } from '@/components/fields/text-field'
import { useFaceWords } from '@/components/readings/face-words'
import { Section } from '@/components/section'
import { errorText } from '@/lib/form-errors'
import { usePiece, usePieceList } from '@/lib/queries/pieces'
import { useSettled } from '@/lib/use-settled'
import type { NewReadingForm } from './new-reading-form'

interface Props {
  renderAddPiece: (onAdded: (pieceId: string) => void) => ReactNode
}

/** A piece by a few letters of its number, serial or lot, or a new one; then which of its faces. */
export function PieceChooser({ renderAddPiece }: Props) {
  const { t } = useTranslation('readings')
  const form = useFormContext<NewReadingForm>()
  const pieceId = form.watch('pieceId')
  const choose = (id: string) => {
    form.setValue('pieceId', id, { shouldValidate: form.formState.isSubmitted })
    form.setValue('faceId', '')
    form.setValue('correctsId', null)
  }
  return (
    <Section title={t('new.piece.title')} note={t('new.piece.note')}>
      <div className="max-w-[48rem] pt-3">
        {pieceId ? (
          <ChosenPiece pieceId={pieceId} onChange={() => choose('')} />
        ) : (
          <PieceFinder onChoose={choose} addPiece={renderAddPiece(choose)} />
        )}
      </div>
    </Section>
  )
}

const pauseMs = 200
const mostShown = 6

function PieceFinder({ onChoose, addPiece }: { onChoose: (id: string) => void; addPiece: ReactNode }) {
  const { t } = useTranslation('readings')
  const { formState } = useFormContext<NewReadingForm>()
  const [text, setText] = useState('')
  const search = useSettled(text.trim(), pauseMs)
  const list = usePieceList({ search: search || undefined })
  const rows = (list.data?.pages[0]?.rows ?? []).slice(0, mostShown)
  return (
    <div className="flex flex-col gap-3">
      <div className="flex items-start gap-4">
        <TextField
          label={t('new.piece.label')}
          hint={t('new.piece.hint')}
          type="search"
          autoComplete="off"
          maxLength={100}
          value={text}
          onChange={(event) => setText(event.target.value)}
          onKeyDown={(event) => {
            // Enter takes the first that matches, and never sends the form half filled.
            if (event.key !== 'Enter') return
            event.preventDefault()
            if (rows[0] && search !== '') onChoose(rows[0].id)
          }}
          error={errorText(t, formState.errors.pieceId)}
          className="w-72"
        />
        <div className="pt-[22px]">{addPiece}</div>
      </div>
      {list.isSuccess && rows.length === 0 && (
        <p className="text-muted">{t('new.piece.nothing', { text: search })}</p>
      )}
      {rows.length > 0 && search === '' && <p className="text-axis text-muted">{t('new.piece.recent')}</p>}
      <ul>
        {rows.map((piece) => (
          <PieceChoice key={piece.id} piece={piece} onChoose={() => onChoose(piece.id)} />
        ))}
      </ul>
    </div>
  )
}

function PieceChoice({ piece, onChoose }: { piece: PieceRow; onChoose: () => void }) {
  return (
    <li className="border-hairline border-t">
      <button
        type="button"
        onClick={onChoose}
        className="grid w-full grid-cols-[13rem_minmax(0,1fr)_8rem] items-baseline gap-x-4 px-1 py-2 text-left hover:bg-step-active max-desk:py-3"
      >
        <span className="font-semibold">
          {piece.partNumber} · {piece.serial}
        </span>
        <span className="truncate text-muted">
          {piece.partName}, {piece.customerName}
        </span>
        <span className="text-muted text-second">{piece.lotNumber}</span>
      </button>
    </li>
  )
}

function ChosenPiece({ pieceId, onChange }: { pieceId: string; onChange: () => void }) {
  const { t } = useTranslation('readings')
  const words = useFaceWords()
  const form = useFormContext<NewReadingForm>()
  const page = usePiece(pieceId)
  const faces = page.data?.faces
  const faceId = form.watch('faceId')
  useEffect(() => {
    if (faces?.length === 1 && faceId === '') form.setValue('faceId', faces[0].id)
  }, [faces, faceId, form])
  const piece = page.data?.piece
  return (
    <div className="flex flex-col gap-4">
      <div className="flex flex-wrap items-baseline gap-x-4">
        <span className="font-semibold text-title">{piece && `${piece.partNumber} · ${piece.serial}`}</span>
        <span className="text-muted">{piece && `${piece.partName}, ${piece.customerName}`}</span>
        <Button kind="quiet" onClick={onChange}>
          {t('new.piece.change')}
        </Button>
      </div>
      {faces?.length === 0 && (
        <p className="text-chestnut">
          {t('new.piece.noFaces')}{' '}
          <Link to={`/parts/${page.data?.part.id}`} className="underline underline-offset-3">
            {t('new.piece.toPart')}
          </Link>
        </p>
      )}
      {faces && faces.length > 0 && (
        <SelectField
          label={t('new.piece.face')}
          placeholder={t('new.setUp.choose')}
          choices={faces.map((face) => ({ value: face.id, label: face.name, note: words.size(face) }))}
          value={faceId}
          onChange={(id) => form.setValue('faceId', id, { shouldValidate: form.formState.isSubmitted })}
          error={errorText(t, form.formState.errors.faceId)}
          className="w-96"
        />
      )}
      {page.data?.readings.some(({ face }) => face.id === faceId) && (
        <CheckboxField
          label={t('new.piece.lapped')}
          hint={t('new.piece.lappedHint')}
          checked={form.watch('lappedSince')}
          onChange={(checked) => form.setValue('lappedSince', checked)}
        />
      )}
    </div>
  )
}
