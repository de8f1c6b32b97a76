import { type RefObject, useEffect, useRef, useState } from 'react'

/** The width of an element in whole CSS pixels, kept up to date; 0 before it is laid out. */
export function useWidth<T extends HTMLElement>(): [RefObject<T | null>, number] {
  const ref = useRef<T>(null)
  const [widthPx, setWidthPx] = useState(0)
  useEffect(() => {
    const element = ref.current
    if (!element) return
    const observer = new ResizeObserver(() => setWidthPx(Math.floor(element.clientWidth)))
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return [ref, widthPx]
}
