import { Check, ChevronDown } from 'lucide-react'
import { Select } from 'radix-ui'
import { classNames } from '@/lib/class-names'
import { Field, type FieldProps, inputLook } from './field'

export interface Choice {
  value: string
  label: string
  /** Second line, muted. */
  note?: string
}

interface SelectFieldProps extends FieldProps {
  value: string
  onChange: (value: string) => void
  onBlur?: () => void
  choices: readonly Choice[]
  placeholder?: string
  disabled?: boolean
}

/** radix keeps the empty string for "nothing chosen"; a choice that means nothing needs another word. */
const nothing = '\u2013'

export function SelectField(props: SelectFieldProps) {
  const { label, hint, error, className, value, onChange, onBlur, choices, placeholder, disabled } = props
  const hasNothing = choices.some((choice) => choice.value === '')
  return (
    <Field label={label} hint={hint} error={error} className={className}>
      {(wiring) => (
        <Select.Root
          value={value === '' && hasNothing ? nothing : value}
          onValueChange={(next) => onChange(next === nothing ? '' : next)}
          disabled={disabled}
        >
          <Select.Trigger
            {...wiring}
            onBlur={onBlur}
            className={classNames(
              inputLook,
              'flex items-center justify-between gap-2 text-left data-placeholder:text-muted',
            )}
          >
            <span className="truncate">
              <Select.Value placeholder={placeholder} />
            </span>
            <Select.Icon>
              <ChevronDown aria-hidden="true" size={14} className="text-muted" />
            </Select.Icon>
          </Select.Trigger>
          <Options choices={choices} />
        </Select.Root>
      )}
    </Field>
  )
}

function Options({ choices }: { choices: readonly Choice[] }) {
  return (
    <Select.Portal>
      <Select.Content
        position="popper"
        sideOffset={4}
        className="z-50 max-h-(--radix-select-content-available-height) min-w-(--radix-select-trigger-width) overflow-hidden rounded border border-ink bg-field text-ink"
      >
        <Select.Viewport>
          {choices.map((choice) => (
            <Select.Item
              key={choice.value}
              value={choice.value === '' ? nothing : choice.value}
              className="flex cursor-pointer items-baseline gap-2 border-hairline border-b px-2.5 py-1.5 outline-none last:border-b-0 data-highlighted:bg-tool-active max-desk:py-3"
            >
              <span className="w-3.5 shrink-0 self-center">
                <Select.ItemIndicator>
                  <Check aria-hidden="true" size={13} className="text-iris" />
                </Select.ItemIndicator>
              </span>
              <Select.ItemText>{choice.label}</Select.ItemText>
              {choice.note && <span className="text-muted text-second">{choice.note}</span>}
            </Select.Item>
          ))}
        </Select.Viewport>
      </Select.Content>
    </Select.Portal>
  )
}
