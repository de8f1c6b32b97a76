import { riskOfAcceptance } from '@shared/metrology'
import type { Face, NewFace } from '@shared/schemas/parts'
import { FormProvider, useForm, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Dialog } from '@/components/dialog'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { errorText, showFailure } from '@/lib/form-errors'
import { saveFace } from '@/lib/queries/parts'
import { ChoiceOf, NumberOf } from './face-fields'
import { type FaceForm, faceResolver, fixedGuardFactors, toFaceForm } from './face-form'
import { FaceTolerance } from './face-tolerance'

interface Props {
  partId: string
  face?: Face
  onClose: () => void
}

export function FaceDialog({ partId, face, onClose }: Props) {
  const { t } = useTranslation('parts')
  const form = useForm<FaceForm, unknown, NewFace>({
    resolver: faceResolver(face),
    defaultValues: toFaceForm(face),
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (input) => {
    try {
      await saveFace(partId, input, face?.id)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={face ? t('face.editTitle') : t('face.add')} wide>
      <FormProvider {...form}>
        <form onSubmit={submit} noValidate className="flex flex-col gap-5">
          <TextField
            label={t('face.name')}
            hint={t('face.nameHint')}
            error={errorText(t, errors.name)}
            {...form.register('name')}
          />
          <FaceSizes />
          <FaceTolerance />
          <FaceDecision />
          <FormFoot
            submitLabel={t('face.submit')}
            isBusy={isSubmitting}
            error={errorText(t, errors.root)}
            onCancel={onClose}
          />
        </form>
      </FormProvider>
    </Dialog>
  )
}

function FaceSizes() {
  const { t } = useTranslation('parts')
  const shape = useFormContext<FaceForm>().watch('shape')
  return (
    <div className="grid grid-cols-3 gap-4">
      <ChoiceOf
        name="shape"
        label={t('face.shape')}
        values={['disc', 'annulus', 'block', 'free']}
        words="face.shapes"
      />
      {(shape === 'disc' || shape === 'annulus') && (
        <NumberOf name="diameterMm" label={t('face.diameter')} unit="mm" />
      )}
      {shape === 'annulus' && <NumberOf name="boreMm" label={t('face.bore')} unit="mm" />}
      {shape === 'block' && <NumberOf name="widthMm" label={t('face.width')} unit="mm" />}
      {shape === 'block' && <NumberOf name="heightMm" label={t('face.height')} unit="mm" />}
      {shape === 'free' && <NumberOf name="longestSideMm" label={t('face.longestSide')} unit="mm" />}
    </div>
  )
}

function FaceDecision() {
  const { t } = useTranslation('parts')
  const form = useFormContext<FaceForm>()
  const kind = form.watch('ruleKind')
  const factor = kind === 'own' ? form.watch('guardFactor') : fixedGuardFactors[kind]
  const risk = factor === null || Number.isNaN(factor) ? null : riskOfAcceptance(factor) * 100
  return (
    <>
      <div className="grid grid-cols-3 gap-4">
        <ChoiceOf
          name="ruleKind"
          label={t('face.rule')}
          values={['simpleAcceptance', 'iso14253_2017', 'iso14253_older', 'own']}
          words="face.rules"
          className={kind === 'own' ? 'col-span-2' : 'col-span-3'}
          hint={risk === null ? undefined : t('face.ruleRisk', { percent: Number(risk.toPrecision(2)) })}
        />
        {kind === 'own' && <NumberOf name="guardFactor" label={t('face.guardFactor')} />}
      </div>
      <div className="grid grid-cols-3 gap-4">
        <ChoiceOf
          name="reference"
          label={t('face.reference')}
          values={['minimumZone', 'leastSquares']}
          words="reference"
        />
        <NumberOf name="edgeBandMm" label={t('face.edgeBand')} unit="mm" />
        <ChoiceOf name="support" label={t('face.support')} values={['free', 'held']} words="face.supports" />
      </div>
    </>
  )
}
