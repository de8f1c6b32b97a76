import { useCallback } from 'react'
import { useSearchParams } from 'react-router-dom'

/** Filters live in the address, so that a list can be linked to and survives going back. */
export function useFilterParams() {
  const [params, setParams] = useSearchParams()
  const set = useCallback(
    (name: string, value: string) => {
      setParams(
        (before) => {
          const next = new URLSearchParams(before)
          if (value === '') next.delete(name)
          else next.set(name, value)
          return next
        },
        { replace: true },
      )
    },
    [setParams],
  )
  return { get: (name: string) => params.get(name) ?? '', set }
}
