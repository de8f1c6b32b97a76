import { type DragEvent, useState } from 'react'

/** Handlers of a place where files may be dropped, and whether some hover there. */
export function useFileDrop(onFiles: (files: File[]) => void) {
  const [isOver, setOver] = useState(false)
  const handlers = {
    onDragOver: (event: DragEvent) => {
      if (!event.dataTransfer.types.includes('Files')) return
      event.preventDefault()
      setOver(true)
    },
    onDragLeave: (event: DragEvent) => {
      const into = event.relatedTarget
      if (into instanceof Node && event.currentTarget.contains(into)) return
      setOver(false)
    },
    onDrop: (event: DragEvent) => {
      event.preventDefault()
      setOver(false)
      onFiles([...event.dataTransfer.files])
    },
  }
  return { isOver, handlers }
}
