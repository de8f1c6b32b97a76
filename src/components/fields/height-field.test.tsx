// @vitest-environment happy-dom
import '@/lib/i18n'
import type { TypedHeight } from '@shared/schemas/parts'
import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { afterEach, describe, expect, it } from 'vitest'
import { HeightField } from './height-field'

afterEach(cleanup)

function Form(props: { bandUm?: number; start?: TypedHeight; onValue: (value: TypedHeight | null) => void }) {
  const [value, setValue] = useState<TypedHeight | null>(props.start ?? null)
  const change = (next: TypedHeight | null) => {
    setValue(next)
    props.onValue(next)
  }
  return (
    <HeightField
      label="At most"
      hint="From the drawing."
      value={value}
      onChange={change}
      bandUm={props.bandUm}
    />
  )
}

function show(props: { bandUm?: number; start?: TypedHeight } = {}) {
  const values: (TypedHeight | null)[] = []
  render(<Form {...props} onValue={(value) => values.push(value)} />)
  return { input: screen.getByLabelText('At most'), last: () => values[values.length - 1] }
}

describe('a field for heights', () => {
  it('keeps what was typed beside what it means', async () => {
    const { input, last } = show()
    await userEvent.type(input, '11.6 µin')
    expect(last()?.typed).toBe('11.6 µin')
    expect(last()?.valueUm).toBeCloseTo(0.29464, 9)
    expect(screen.getByText(/That is 0\.295 µm\./)).toBeDefined()
  })

  it('takes a comma for a point and the real minus sign', async () => {
    const { input, last } = show()
    await userEvent.type(input, '−0,2 um')
    expect(last()).toEqual({ valueUm: -0.2, typed: '−0,2 um' })
  })

  it('takes bands where the height of one is known', async () => {
    const { input, last } = show({ bandUm: 0.3 })
    await userEvent.type(input, '1.5 bands')
    expect(last()?.valueUm).toBeCloseTo(0.45, 12)
  })

  it('refuses bands without a light and says why', async () => {
    const { input, last } = show()
    await userEvent.type(input, '2 bands')
    await userEvent.tab()
    expect(last()).toBeNull()
    expect(screen.getByRole('alert').textContent).toContain('only with a wavelength')
  })

  it('asks for the unit only once the field is left, and ties the sentence to the field', async () => {
    const { input, last } = show()
    await userEvent.type(input, '0.3')
    expect(screen.queryByRole('alert')).toBeNull()
    await userEvent.tab()
    expect(last()).toBeNull()
    const alert = screen.getByRole('alert')
    expect(alert.textContent).toContain('Add the unit')
    expect(input.getAttribute('aria-invalid')).toBe('true')
    expect(input.getAttribute('aria-describedby')).toContain(alert.id)
  })

  it('shows an earlier value as it was typed', () => {
    const { input } = show({ start: { valueUm: 0.6, typed: '0.6 um' } })
    expect(input).toHaveProperty('value', '0.6 um')
  })
})
