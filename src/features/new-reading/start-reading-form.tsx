import type { NewReading, Reading } from '@shared/schemas/readings'
import type { ReactNode } from 'react'
import { FormProvider, useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { errorText, showFailure } from '@/lib/form-errors'
import { useEquipment } from '@/lib/queries/equipment'
import { startReading } from '@/lib/queries/readings'
import { Cautions } from './cautions'
import { ConditionFields } from './condition-fields'
import { blankReading, type NewReadingForm, newReadingResolver } from './new-reading-form'
import { PieceChooser } from './piece-chooser'
import { SetUpFields } from './set-up-fields'
import { useOnlyEquipment } from './use-only-equipment'

interface Props {
  /** Chosen before the page opened, such as on the piece's page. */
  pieceId: string
  /** Chosen before as well, where a reading of it is corrected; '' otherwise. */
  faceId: string
  /** The reading that the new one corrects. */
  correctsId: string | null
  onStarted: (reading: Reading) => void
  /** Opens whatever adds a piece; gives its id back. */
  renderAddPiece: (onAdded: (pieceId: string) => void) => ReactNode
}

/** Piece and face, what it is photographed with, conditions; then the reading is started. */
export function StartReadingForm({ pieceId, faceId, correctsId, onStarted, renderAddPiece }: Props) {
  const { t } = useTranslation('readings')
  const equipment = useEquipment()
  const form = useForm<NewReadingForm, unknown, NewReading>({
    resolver: newReadingResolver,
    defaultValues: { ...blankReading, pieceId, faceId, correctsId },
  })
  useOnlyEquipment(form, equipment.data?.rows)
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      onStarted(await startReading(input))
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  const refusal = errorText(t, errors.root)
  return (
    <FormProvider {...form}>
      <form onSubmit={submit} noValidate>
        <PieceChooser renderAddPiece={renderAddPiece} />
        <SetUpFields rows={equipment.data?.rows ?? []} isLoaded={equipment.isSuccess} />
        <ConditionFields />
        <Cautions />
        <div className="flex flex-col items-start gap-3 desk:pl-margin">
          {refusal && (
            <p role="alert" className="text-chestnut text-second">
              {refusal}
            </p>
          )}
          <Button type="submit" kind="main" disabled={isSubmitting}>
            {isSubmitting ? t('new.starting') : t('new.start')}
          </Button>
        </div>
      </form>
    </FormProvider>
  )
}
