import { type RefObject, useCallback, useEffect, useRef, useState } from 'react'
import { fitBox, fitPhoto, type Size, type Viewport } from '../viewport'

/** The font of number chips, as `pen.ts` sets it. */
const canvasFont = '600 12px "Source Sans 3"'

export interface View {
  viewport: Viewport
  area: Size
  change: (change: (viewport: Viewport) => Viewport) => void
  latest: RefObject<Viewport>
  fitAll: () => void
}

/** The view of the photograph: fitted when it opens or its area changes before anybody has moved it. */
export function useViewport(
  areaRef: RefObject<HTMLElement | null>,
  photo: Size | null,
  faceBox: (Size & { x: number; y: number }) | null,
): View {
  const [area, setArea] = useState<Size>({ width: 0, height: 0 })
  const [viewport, setViewport] = useState<Viewport>({ scale: 1, offsetX: 0, offsetY: 0 })
  const latest = useRef(viewport)
  const isMoved = useRef(false)
  const openingBox = useRef(faceBox)

  useEffect(() => {
    const element = areaRef.current
    if (!element) return
    const observer = new ResizeObserver(() =>
      setArea({ width: element.clientWidth, height: element.clientHeight }),
    )
    observer.observe(element)
    return () => observer.disconnect()
  }, [areaRef])

  const put = useCallback((next: Viewport) => {
    latest.current = next
    setViewport(next)
  }, [])

  const change = useCallback(
    (by: (viewport: Viewport) => Viewport) => {
      isMoved.current = true
      put(by(latest.current))
    },
    [put],
  )

  const fitAll = useCallback(() => {
    if (!photo || area.width === 0) return
    isMoved.current = false
    put(fitPhoto(photo, area))
  }, [photo, area, put])

  useEffect(() => {
    if (!photo || area.width === 0 || isMoved.current) return
    put(openingBox.current ? fitBox(openingBox.current, area) : fitPhoto(photo, area))
  }, [photo, area, put])

  useEffect(() => {
    // A canvas takes whatever font is there when it is drawn, so it is drawn again once ours is.
    void document.fonts.load(canvasFont).then(() => put({ ...latest.current }))
  }, [put])

  return { viewport, area, change, latest, fitAll }
}
