import { type RefObject, useEffect, useRef } from 'react'
import type { TableStore } from '../table-store'
import type { PointerAt } from '../tools/tool'
import { pan, pinch, toPhoto, type Viewport, zoomAbout } from '../viewport'

/** How near counts as on it, screen px: fingers are broader. */
const reachPx = { mouse: 8, pen: 10, touch: 18 } as const

type ChangeView = (change: (viewport: Viewport) => Viewport) => void
type Finger = { x: number; y: number }

interface Parts {
  areaRef: RefObject<HTMLElement | null>
  store: TableStore
  viewport: RefObject<Viewport>
  changeView: ChangeView
  /** Space held: the pointer pans. */
  isPanning: RefObject<boolean>
  /** False for a photograph that is only looked at: there the pointer always pans. */
  isMarked: boolean
}

/** Pointer, pen and fingers on the photograph: tools with one, panning with space or the middle button, two fingers zoom. */
export function useTablePointer({ areaRef, store, viewport, changeView, isPanning, isMarked }: Parts): void {
  const fingers = useRef(new Map<number, Finger>())

  useEffect(() => {
    const area = areaRef.current
    if (!area) return
    let panFrom: Finger | null = null
    let toolPointer: number | null = null

    const placeOf = (event: MouseEvent): Finger => {
      const box = area.getBoundingClientRect()
      return { x: event.clientX - box.left - area.clientLeft, y: event.clientY - box.top - area.clientTop }
    }
    const at = (event: MouseEvent): PointerAt => {
      const { x, y } = toPhoto(viewport.current, placeOf(event))
      const kind = event instanceof PointerEvent && event.pointerType in reachPx ? event.pointerType : 'mouse'
      const reach = reachPx[kind as keyof typeof reachPx] / viewport.current.scale
      return { place: [x, y], reachPx: reach, shift: event.shiftKey }
    }
    const twoFingers = () => [...fingers.current.values()].slice(0, 2) as [Finger, Finger]

    const onDown = (event: PointerEvent) => {
      area.focus({ preventScroll: true })
      if (event.pointerType === 'touch') fingers.current.set(event.pointerId, placeOf(event))
      if (fingers.current.size === 2) {
        // The first finger was no click.
        if (toolPointer !== null) store.dispatch({ type: 'cancel' })
        toolPointer = null
        return
      }
      if (fingers.current.size > 2) return
      area.setPointerCapture(event.pointerId)
      if (event.button === 1 || isPanning.current || !isMarked) {
        event.preventDefault()
        panFrom = placeOf(event)
        return
      }
      if (event.button !== 0) return
      event.preventDefault()
      toolPointer = event.pointerId
      store.dispatch({ type: 'pointerDown', ...at(event) })
    }
    const onMove = (event: PointerEvent) => {
      if (fingers.current.has(event.pointerId) && fingers.current.size >= 2) {
        const from = twoFingers()
        fingers.current.set(event.pointerId, placeOf(event))
        const to = twoFingers()
        changeView((view) => pinch(view, from, to))
        return
      }
      if (fingers.current.has(event.pointerId)) fingers.current.set(event.pointerId, placeOf(event))
      if (panFrom) {
        const from = panFrom
        const to = placeOf(event)
        panFrom = to
        changeView((view) => pan(view, to.x - from.x, to.y - from.y))
        return
      }
      if (isMarked) store.dispatch({ type: 'pointerMove', ...at(event) })
    }
    const onUp = (event: PointerEvent) => {
      fingers.current.delete(event.pointerId)
      panFrom = null
      if (toolPointer !== event.pointerId) return
      toolPointer = null
      store.dispatch({ type: 'pointerUp', ...at(event) })
      if (event.pointerType !== 'mouse') store.dispatch({ type: 'pointerLeave' })
    }
    const onCancel = (event: PointerEvent) => {
      fingers.current.delete(event.pointerId)
      panFrom = null
      if (toolPointer === event.pointerId) store.dispatch({ type: 'cancel' })
      toolPointer = null
    }
    const onDoubleClick = (event: MouseEvent) => {
      if (isMarked) store.dispatch({ type: 'doubleClick', ...at(event) })
    }
    const onLeave = () => toolPointer === null && store.dispatch({ type: 'pointerLeave' })
    const onWheel = (event: WheelEvent) => {
      event.preventDefault()
      const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 33 : 1
      const factor = Math.exp(-event.deltaY * lines * (event.ctrlKey ? 0.01 : 0.0018))
      const pointer = placeOf(event)
      changeView((view) => zoomAbout(view, pointer, factor))
    }
    const noMenu = (event: Event) => event.preventDefault()

    area.addEventListener('pointerdown', onDown)
    area.addEventListener('pointermove', onMove)
    area.addEventListener('pointerup', onUp)
    area.addEventListener('pointercancel', onCancel)
    area.addEventListener('pointerleave', onLeave)
    area.addEventListener('dblclick', onDoubleClick)
    area.addEventListener('wheel', onWheel, { passive: false })
    area.addEventListener('contextmenu', noMenu)
    return () => {
      area.removeEventListener('pointerdown', onDown)
      area.removeEventListener('pointermove', onMove)
      area.removeEventListener('pointerup', onUp)
      area.removeEventListener('pointercancel', onCancel)
      area.removeEventListener('pointerleave', onLeave)
      area.removeEventListener('dblclick', onDoubleClick)
      area.removeEventListener('wheel', onWheel)
      area.removeEventListener('contextmenu', noMenu)
    }
  }, [areaRef, store, viewport, changeView, isPanning, isMarked])
}
