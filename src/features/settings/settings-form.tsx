import { type Settings, settingsSchema } from '@shared/schemas/settings'
import { Controller, FormProvider, useForm, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { toast } from 'sonner'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { NumberField } from '@/components/fields/number-field'
import { SelectField } from '@/components/fields/select-field'
import { TextAreaField, TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { Section } from '@/components/section'
import { api } from '@/lib/api-client'
import { candidateResolver } from '@/lib/candidate-resolver'
import { errorText, showFailure } from '@/lib/form-errors'
import { queryClient } from '@/lib/query-client'
import { queryKeys } from '@/lib/query-keys'

/** Shares are typed in percent. */
type SettingsForm = Omit<Settings, 'leastSupportedShare'> & { leastSupportedPercent: number | null }

const resolver = candidateResolver(
  settingsSchema,
  ({ leastSupportedPercent, ...rest }: SettingsForm) => ({
    ...rest,
    leastSupportedShare: leastSupportedPercent === null ? null : leastSupportedPercent / 100,
  }),
  (path) => (path === 'leastSupportedShare' ? 'leastSupportedPercent' : (path as keyof SettingsForm)),
)

export function SettingsForm({ settings }: { settings: Settings }) {
  const { t } = useTranslation('settings')
  const { leastSupportedShare, ...rest } = settings
  const form = useForm<SettingsForm, unknown, Settings>({
    resolver,
    defaultValues: { ...rest, leastSupportedPercent: Number((leastSupportedShare * 100).toPrecision(6)) },
  })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async (change) => {
    try {
      const saved = await api('PATCH', '/settings', settingsSchema, { body: change })
      queryClient.setQueryData(queryKeys.settings, saved)
      await queryClient.invalidateQueries({ queryKey: queryKeys.session })
      toast(t('saved'))
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <FormProvider {...form}>
      <form onSubmit={submit} noValidate>
        <ShopFields />
        <ReadingFields />
        <CertificateFields />
        <NetworkFields />
        <div className="pb-4 desk:pl-margin">
          <FormFoot submitLabel={t('submit')} isBusy={isSubmitting} error={errorText(t, errors.root)} />
        </div>
      </form>
    </FormProvider>
  )
}

const columns = 'grid max-w-[44rem] grid-cols-2 gap-4 pt-3'

function ShopFields() {
  const { t } = useTranslation('settings')
  const { register, formState } = useFormContext<SettingsForm>()
  const { errors } = formState
  return (
    <Section title={t('shop.title')} note={t('shop.note')}>
      <div className={columns}>
        <TextField label={t('shopName')} error={errorText(t, errors.shopName)} {...register('shopName')} />
        <TextField
          label={t('shopEmail')}
          type="email"
          error={errorText(t, errors.shopEmail)}
          {...register('shopEmail')}
        />
        <TextAreaField
          label={t('shopAddress')}
          className="col-span-2"
          error={errorText(t, errors.shopAddress)}
          {...register('shopAddress')}
        />
      </div>
    </Section>
  )
}

const units = ['um', 'nm', 'uin', 'tenths', 'bands'] as const

function ReadingFields() {
  const { t } = useTranslation('settings')
  const { control } = useFormContext<SettingsForm>()
  return (
    <Section title={t('reading.title')} note={t('reading.note')}>
      <div className={columns}>
        <Controller
          control={control}
          name="displayUnit"
          render={({ field }) => (
            <SelectField
              label={t('displayUnit')}
              choices={units.map((unit) => ({ value: unit, label: t(`units.${unit}`) }))}
              value={field.value}
              onChange={field.onChange}
            />
          )}
        />
        <Controller
          control={control}
          name="leastSupportedPercent"
          render={({ field, fieldState }) => (
            <NumberField
              label={t('leastSupported')}
              unit="%"
              hint={t('leastSupportedHint')}
              value={field.value}
              onChange={field.onChange}
              onBlur={field.onBlur}
              ref={field.ref}
              error={errorText(t, fieldState.error)}
            />
          )}
        />
        <SwitchOf name="onePersonShop" />
      </div>
    </Section>
  )
}

function CertificateFields() {
  const { t } = useTranslation('settings')
  const { register, formState } = useFormContext<SettingsForm>()
  const { errors } = formState
  return (
    <Section title={t('certificates.title')} note={t('certificates.note')}>
      <div className={columns}>
        <TextField
          label={t('certificatePrefix')}
          hint={t('certificatePrefixHint')}
          maxLength={8}
          error={errorText(t, errors.certificatePrefix)}
          {...register('certificatePrefix')}
        />
        <TextField
          label={t('procedure')}
          hint={t('procedureHint')}
          maxLength={120}
          error={errorText(t, errors.procedure)}
          {...register('procedure')}
        />
        <TextField
          label={t('publicAddress')}
          hint={t('publicAddressHint')}
          className="col-span-2"
          maxLength={200}
          error={errorText(t, errors.publicAddress)}
          {...register('publicAddress')}
        />
      </div>
    </Section>
  )
}

function NetworkFields() {
  const { t } = useTranslation('settings')
  return (
    <Section title={t('network.title')} note={t('network.note')}>
      <div className={columns}>
        <SwitchOf name="allowPlainNetwork" />
      </div>
    </Section>
  )
}

function SwitchOf({ name }: { name: 'onePersonShop' | 'allowPlainNetwork' }) {
  const { t } = useTranslation('settings')
  const { control } = useFormContext<SettingsForm>()
  return (
    <Controller
      control={control}
      name={name}
      render={({ field }) => (
        <CheckboxField
          label={t(name)}
          hint={t(`${name}Hint`)}
          checked={field.value}
          onChange={field.onChange}
          className="col-span-2"
        />
      )}
    />
  )
}
