import type Konva from 'konva'
import { useMemo } from 'react'
import { Shape } from 'react-konva'
import type { Viewport } from '../viewport'
import type { Pen } from './pen'

interface Props {
  viewport: Viewport
  /** Kept the same as long as what it draws is the same: the layer is drawn anew only when it changes. */
  draw: (pen: Pen) => void
}

/** One canvas shape drawn by hand: hundreds of bands are one node, not hundreds. */
export function Painted({ viewport, draw }: Props) {
  const sceneFunc = useMemo(
    () => (context: Konva.Context) => {
      const plain = context._context
      plain.save()
      draw({ context: plain, viewport })
      plain.restore()
    },
    [draw, viewport],
  )
  return <Shape sceneFunc={sceneFunc} listening={false} perfectDrawEnabled={false} />
}
