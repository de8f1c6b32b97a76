import { type Role, roleSchema } from '@shared/access/permissions'
import {
  type NewPerson,
  newPersonSchema,
  type Person,
  type PersonChange,
  personChangeSchema,
} from '@shared/schemas/people'
import { Controller, FormProvider, useForm, useFormContext } from 'react-hook-form'
import { useTranslation } from 'react-i18next'
import { Dialog } from '@/components/dialog'
import { CheckboxField } from '@/components/fields/checkbox-field'
import { TextField } from '@/components/fields/text-field'
import { FormFoot } from '@/components/form-foot'
import { candidateResolver } from '@/lib/candidate-resolver'
import { errorText, showFailure } from '@/lib/form-errors'
import { addPerson, changePerson } from '@/lib/queries/people'

interface PersonForm {
  name: string
  email: string
  password: string
  roles: Role[]
  active: boolean
}

const blank: PersonForm = { name: '', email: '', password: '', roles: ['inspector'], active: true }

const fieldOf = (path: string) => (path.split('.')[0] || 'name') as keyof PersonForm
const newResolver = candidateResolver(newPersonSchema, (form: PersonForm) => form, fieldOf)
/** The e-mail stays, and an empty password means no new one. */
const changeResolver = candidateResolver(
  personChangeSchema,
  ({ name, roles, active, password }: PersonForm) => ({
    name,
    roles,
    active,
    password: password || undefined,
  }),
  fieldOf,
)

export function AddPersonDialog({ onClose }: { onClose: () => void }) {
  const { t } = useTranslation('people')
  const form = useForm<PersonForm, unknown, NewPerson>({ resolver: newResolver, defaultValues: blank })
  const submit = form.handleSubmit(async (person) => {
    try {
      await addPerson(person)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={t('add')}>
      <FormProvider {...form}>
        <form onSubmit={submit} noValidate className="flex flex-col gap-4">
          <PersonFields isNew />
          <PersonFoot onClose={onClose} />
        </form>
      </FormProvider>
    </Dialog>
  )
}

export function ChangePersonDialog({ person, onClose }: { person: Person; onClose: () => void }) {
  const { t } = useTranslation('people')
  const { name, email, roles, active } = person
  const form = useForm<PersonForm, unknown, PersonChange>({
    resolver: changeResolver,
    defaultValues: { name, email, roles, active, password: '' },
  })
  const submit = form.handleSubmit(async (change) => {
    try {
      await changePerson(person.id, change)
      onClose()
    } catch (error) {
      showFailure(error, form.setError, t('common:unexpected'))
    }
  })
  return (
    <Dialog open onClose={onClose} title={t('editTitle')}>
      <FormProvider {...form}>
        <form onSubmit={submit} noValidate className="flex flex-col gap-4">
          <PersonFields isNew={false} />
          <PersonFoot onClose={onClose} />
        </form>
      </FormProvider>
    </Dialog>
  )
}

function PersonFoot({ onClose }: { onClose: () => void }) {
  const { t } = useTranslation('people')
  const { errors, isSubmitting } = useFormContext<PersonForm>().formState
  return (
    <FormFoot
      submitLabel={t('form.submit')}
      isBusy={isSubmitting}
      error={errorText(t, errors.root)}
      onCancel={onClose}
    />
  )
}

function PersonFields({ isNew }: { isNew: boolean }) {
  const { t } = useTranslation('people')
  const { register, control, formState } = useFormContext<PersonForm>()
  const { errors } = formState
  return (
    <>
      <TextField label={t('form.name')} error={errorText(t, errors.name)} {...register('name')} />
      <TextField
        label={t('form.email')}
        type="email"
        readOnly={!isNew}
        hint={isNew ? undefined : t('form.emailFixed')}
        error={errorText(t, errors.email)}
        {...register('email')}
      />
      <TextField
        label={isNew ? t('form.password') : t('form.newPassword')}
        type="password"
        autoComplete="new-password"
        hint={isNew ? t('form.passwordHint') : t('form.newPasswordHint')}
        error={errorText(t, errors.password)}
        {...register('password')}
      />
      <RoleFields />
      {!isNew && (
        <Controller
          control={control}
          name="active"
          render={({ field }) => (
            <CheckboxField
              label={t('form.active')}
              hint={t('form.activeHint')}
              checked={field.value}
              onChange={field.onChange}
            />
          )}
        />
      )}
    </>
  )
}

function RoleFields() {
  const { t } = useTranslation('people')
  const { control } = useFormContext<PersonForm>()
  return (
    <Controller
      control={control}
      name="roles"
      render={({ field, fieldState }) => (
        <fieldset className="flex flex-col gap-2">
          <legend className="mb-1 text-muted text-second">{t('form.roles')}</legend>
          {roleSchema.options.map((role) => (
            <CheckboxField
              key={role}
              label={t(`role.${role}`)}
              hint={t(`roleHint.${role}`)}
              checked={field.value.includes(role)}
              onChange={(checked) =>
                field.onChange(checked ? [...field.value, role] : field.value.filter((held) => held !== role))
              }
            />
          ))}
          {fieldState.error && (
            <p role="alert" className="text-chestnut text-second">
              {errorText(t, fieldState.error)}
            </p>
          )}
        </fieldset>
      )}
    />
  )
}
