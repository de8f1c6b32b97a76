import { formatHeight } from '@shared/units/height'
import { Controller, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { HeightField } from '@/components/fields/height-field'
import { errorText } from '@/lib/form-errors'
import { ChoiceOf } from './face-fields'
import type { FaceForm } from './face-form'
import { useShopBand } from './use-shop-band'

export function FaceTolerance() {
  const { t } = useTranslation('parts')
  const kind = useFormContext<FaceForm>().watch('toleranceKind')
  const band = useShopBand()
  const bandHint = band
    ? t('face.bandHint', { height: formatHeight(band.bandUm, 'um', { decimals: 4 }), name: band.lightName })
    : ''
  return (
    <div>
      <div className="grid grid-cols-3 gap-4">
        <ChoiceOf
          name="toleranceKind"
          label={t('face.tolerance')}
          values={['none', 'plain', 'signed']}
          words="face.tolerances"
        />
        {kind === 'plain' && <LimitOf name="max" bandUm={band?.bandUm} />}
        {kind === 'signed' && <LimitOf name="least" bandUm={band?.bandUm} />}
        {kind === 'signed' && <LimitOf name="most" bandUm={band?.bandUm} />}
      </div>
      {kind !== 'none' && (
        <p className="mt-1.5 text-axis text-muted">
          {[t('face.toleranceHint'), bandHint, kind === 'signed' ? t('face.signedHint') : ''].join(' ')}
        </p>
      )}
    </div>
  )
}

function LimitOf({ name, bandUm }: { name: 'max' | 'least' | 'most'; bandUm: number | undefined }) {
  const { t } = useTranslation('parts')
  const { control } = useFormContext<FaceForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field, fieldState }) => (
        <HeightField
          label={t(`face.${name}`)}
          value={field.value}
          onChange={field.onChange}
          onBlur={field.onBlur}
          ref={field.ref}
          bandUm={bandUm}
          error={errorText(t, fieldState.error)}
        />
      )}
    />
  )
}
