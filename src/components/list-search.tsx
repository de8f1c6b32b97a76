import { useEffect, useState } from 'react'
import { useSettled } from '@/lib/use-settled'
import { TextField } from './fields/text-field'

interface Props {
  label: string
  value: string
  onChange: (value: string) => void
}

const pauseMs = 250

/** Narrows a list once typing pauses. */
export function ListSearch({ label, value, onChange }: Props) {
  const [text, setText] = useState(value)
  const settled = useSettled(text, pauseMs)
  // biome-ignore lint/correctness/useExhaustiveDependencies: only what was typed moves the filter
  useEffect(() => {
    if (settled.trim() !== value) onChange(settled.trim())
  }, [settled])
  return (
    <TextField
      label={label}
      type="search"
      value={text}
      maxLength={100}
      onChange={(event) => setText(event.target.value)}
      className="w-64"
    />
  )
}
