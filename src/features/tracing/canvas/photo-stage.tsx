import type { PartFrame } from '@shared/geometry/part-frame'
import type { Photo } from '@shared/schemas/readings'
import { memo, type ReactNode, type RefObject } from 'react'
import { useTranslation } from 'react-i18next'
import { Image as KonvaImage, Layer, Stage } from 'react-konva'
import type { Problem } from '../problems'
import { useTable } from '../table-store'
import { ActiveLayer } from './active-layer'
import { Magnifier } from './magnifier'
import { MarksLayer } from './marks-layer'
import { NotesLayer } from './notes-layer'
import { usePhoto } from './use-photo'
import type { View } from './use-viewport'

interface Props {
  areaRef: RefObject<HTMLDivElement | null>
  photo: Photo | null
  view: View
  frame: PartFrame | null
  problems: readonly Problem[]
  showMarks: boolean
  /** The photograph of the bands is marked; others are only looked at. */
  isMarked: boolean
  children?: ReactNode
}

/** The photograph with its marks. Tools work here by pointer and keyboard; the stage itself listens to nothing. */
export function PhotoStage({ areaRef, photo, view, frame, problems, showMarks, isMarked, children }: Props) {
  const { t } = useTranslation('table')
  const tool = useTable((table) => table.tool.tool)
  const { viewport, area } = view
  const { image, failed } = usePhoto(photo, wantsFull(photo, viewport.scale))
  return (
    <div className="relative size-full min-h-0 min-w-0 overflow-hidden bg-[#0f1113]">
      <div
        ref={areaRef}
        role="application"
        aria-label={t('stage.label')}
        aria-describedby="table-what-next"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: an application takes the keyboard itself.
        tabIndex={0}
        data-tool={tool}
        data-scale={viewport.scale}
        data-offset-x={viewport.offsetX}
        data-offset-y={viewport.offsetY}
        className={`absolute inset-0 touch-none select-none outline-none after:pointer-events-none after:absolute after:inset-0 focus-visible:after:shadow-[inset_0_0_0_2px_var(--iris)] ${cursorOf(tool)}`}
      >
        {area.width > 0 && (
          <Stage width={area.width} height={area.height} listening={false}>
            <PhotoLayer image={image} photo={photo} view={view} />
            {isMarked && showMarks && <MarksLayer view={view} frame={frame} />}
            {isMarked && <ActiveLayer view={view} />}
            {isMarked && showMarks && <NotesLayer view={view} problems={problems} />}
          </Stage>
        )}
      </div>
      {isMarked && image && photo && <Magnifier image={image} photo={photo} view={view} />}
      {!photo && <Notice>{t('stage.noPhoto')}</Notice>}
      {photo && !image && <Notice>{failed ? t('stage.failed') : t('stage.loading')}</Notice>}
      {children}
    </div>
  )
}

function cursorOf(tool: string): string {
  return tool === 'pick' || tool === 'copies' || tool === 'edgeBand' ? 'cursor-default' : 'cursor-crosshair'
}

/** The first preview is shown one to one here; beyond it only the full size is crisp. */
function wantsFull(photo: Photo | null, scale: number): boolean {
  if (!photo) return false
  const previewScale = 2048 / photo.widthPx
  return scale * Math.min(2, window.devicePixelRatio || 1) > 1.05 * previewScale
}

function Notice({ children }: { children: ReactNode }) {
  return (
    <p
      role="status"
      className="pointer-events-none absolute inset-x-0 top-1/2 -translate-y-1/2 text-center text-muted text-section"
    >
      {children}
    </p>
  )
}

interface PhotoLayerProps {
  image: HTMLImageElement | null
  photo: Photo | null
  view: View
}

/** Pixel centres stand at whole numbers, so the first pixel begins at −0.5. */
const PhotoLayer = memo(function PhotoLayer({ image, photo, view }: PhotoLayerProps) {
  const { scale, offsetX, offsetY } = view.viewport
  return (
    <Layer listening={false} imageSmoothingEnabled={scale < 4}>
      {image && photo && (
        <KonvaImage
          image={image}
          x={offsetX - 0.5 * scale}
          y={offsetY - 0.5 * scale}
          width={photo.widthPx * scale}
          height={photo.heightPx * scale}
          perfectDrawEnabled={false}
        />
      )}
    </Layer>
  )
})
