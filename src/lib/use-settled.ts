import { useEffect, useState } from 'react'

/** The value once it has stayed the same for a while. */
export function useSettled<T>(value: T, pauseMs: number): T {
  const [settled, setSettled] = useState(value)
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), pauseMs)
    return () => clearTimeout(timer)
  }, [value, pauseMs])
  return settled
}
