import { Check } from 'lucide-react'
import { Checkbox } from 'radix-ui'
import { type ReactNode, useId } from 'react'
import { classNames } from '@/lib/class-names'

interface Props {
  label: string
  hint?: ReactNode
  checked: boolean
  onChange: (checked: boolean) => void
  disabled?: boolean
  className?: string
}

export function CheckboxField({ label, hint, checked, onChange, disabled, className }: Props) {
  const id = useId()
  return (
    <div className={classNames('flex items-start gap-2 max-desk:py-2', className)}>
      <Checkbox.Root
        id={id}
        checked={checked}
        disabled={disabled}
        onCheckedChange={(next) => onChange(next === true)}
        aria-describedby={hint ? `${id}-hint` : undefined}
        className="mt-0.5 flex size-4 shrink-0 items-center justify-center rounded border border-edge bg-field data-[state=checked]:border-ink data-[state=checked]:bg-ink"
      >
        <Checkbox.Indicator>
          <Check aria-hidden="true" size={12} strokeWidth={3} className="text-on-ink" />
        </Checkbox.Indicator>
      </Checkbox.Root>
      <div>
        <label htmlFor={id} className="text-body">
          {label}
        </label>
        {hint && (
          <p id={`${id}-hint`} className="text-axis text-muted">
            {hint}
          </p>
        )}
      </div>
    </div>
  )
}
