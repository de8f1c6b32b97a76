import type { TypedHeight } from '@shared/schemas/parts'
import { type HeightUnit, parseHeight } from '@shared/units/height'
import { type ComponentProps, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { Field, type FieldProps, inputLook } from './field'
import { heightInWords } from './height-words'

interface HeightFieldProps
  extends FieldProps,
    Pick<ComponentProps<'input'>, 'name' | 'disabled' | 'ref' | 'placeholder'> {
  value: TypedHeight | null
  /** null while empty or not yet a height. */
  onChange: (value: TypedHeight | null) => void
  onBlur?: () => void
  /** Unit of a bare number; without one a bare number is refused. */
  defaultUnit?: HeightUnit
  /** Height of one band; without one, bands are refused. */
  bandUm?: number
}

/** A height typed with its unit, kept beside what it means: "11.6 µin" is 0.295 µm. */
export function HeightField(props: HeightFieldProps) {
  const { label, hint, error, className, value, onChange, onBlur, defaultUnit, bandUm, ...input } = props
  const { t } = useTranslation()
  const [text, setText] = useState(value?.typed ?? '')
  const [left, setLeft] = useState(false)
  const parsed = parseHeight(text, { bandUm, defaultUnit })
  const isWrong = !parsed.ok && parsed.reason !== 'empty'
  // While somebody is still typing, "0.3" lacks only its unit: that is no mistake yet.
  const problem = isWrong && left ? t(`common:height.${parsed.reason}`) : error
  const meaning = parsed.ok ? heightInWords(parsed.value.valueUm, parsed.value.unit) : undefined
  const note = [hint, meaning && t('common:height.means', { height: meaning })].filter(Boolean).join(' ')
  return (
    <Field label={label} hint={note || undefined} error={problem} className={className}>
      {(wiring) => (
        <input
          {...input}
          {...wiring}
          type="text"
          autoComplete="off"
          value={text}
          onBlur={() => {
            setLeft(true)
            onBlur?.()
          }}
          onChange={(event) => {
            setText(event.target.value)
            const next = parseHeight(event.target.value, { bandUm, defaultUnit })
            onChange(next.ok ? { valueUm: next.value.valueUm, typed: next.value.typed } : null)
          }}
          className={inputLook}
        />
      )}
    </Field>
  )
}
