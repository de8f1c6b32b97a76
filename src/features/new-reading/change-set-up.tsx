import type { NewReading, Reading } from '@shared/schemas/readings'
import { useState } from 'react'
import { FormProvider, useForm } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { Button } from '@/components/button'
import { Dialog } from '@/components/dialog'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { useEquipment } from '@/lib/queries/equipment'
import { changeReading, computeReading } from '@/lib/queries/readings'
import { ConditionFields } from './condition-fields'
import { formOf, type NewReadingForm, newReadingResolver } from './new-reading-form'
import { SetUpFields } from './set-up-fields'

/** Set-up and conditions of a started reading, changed while it is still a draft. */
export function ChangeSetUp({ reading }: { reading: Reading }) {
  const { t } = useTranslation('readings')
  const [isOpen, setOpen] = useState(false)
  return (
    <>
      <Button onClick={() => setOpen(true)}>{t('new.change.open')}</Button>
      {isOpen && <ChangeDialog reading={reading} onClose={() => setOpen(false)} />}
    </>
  )
}

function ChangeDialog({ reading, onClose }: { reading: Reading; onClose: () => void }) {
  const { t } = useTranslation('readings')
  const equipment = useEquipment()
  const form = useForm<NewReadingForm, unknown, NewReading>({
    resolver: newReadingResolver,
    defaultValues: formOf(reading),
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async ({ setUp, conditions }) => {
    try {
      const changed = await changeReading(reading.id, { setUp, conditions })
      onClose()
      if (changed.figureIsStale) await readAnew(reading.id)
      else toast(t('new.change.kept'))
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  const readAnew = async (id: string) => {
    try {
      await computeReading(id)
      toast(t('new.change.kept'))
    } catch (error) {
      const reason = error instanceof Error ? error.message : t('common:unexpected')
      toast.error(t('new.change.noFigure', { reason }))
    }
  }
  return (
    <Dialog open onClose={onClose} title={t('new.change.title')} description={t('new.change.note')} wide>
      <FormProvider {...form}>
        <form onSubmit={submit} noValidate>
          <SetUpFields rows={equipment.data?.rows ?? []} isLoaded={equipment.isSuccess} />
          <ConditionFields />
          <FormFoot
            submitLabel={t('new.change.submit')}
            isBusy={isSubmitting}
            error={errorText(t, errors.root)}
            onCancel={onClose}
          />
        </form>
      </FormProvider>
    </Dialog>
  )
}
