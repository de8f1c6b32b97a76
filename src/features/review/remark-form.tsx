import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Button } from '@/components/button'
import { TextAreaField } from '@/components/fields/text-field'

interface Props {
  label: string
  submitLabel: string
  isBusy: boolean
  onSubmit: (text: string) => void
  onCancel: () => void
}

/** A few lines for a remark or an answer; they stay until they are kept or given up. */
export function RemarkForm({ label, submitLabel, isBusy, onSubmit, onCancel }: Props) {
  const { t } = useTranslation('review')
  const [text, setText] = useState('')
  return (
    <form
      className="py-2"
      onSubmit={(event) => {
        event.preventDefault()
        onSubmit(text)
      }}
    >
      <TextAreaField
        label={label}
        rows={2}
        maxLength={1000}
        autoFocus
        value={text}
        onChange={(event) => setText(event.target.value)}
      />
      <div className="mt-2 flex gap-2.5">
        <Button type="submit" disabled={isBusy || text.trim() === ''}>
          {submitLabel}
        </Button>
        <Button onClick={onCancel}>{t('common:cancel')}</Button>
      </div>
    </form>
  )
}
