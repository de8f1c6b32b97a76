import type { PartFrame } from '@shared/geometry/part-frame'
import { formatNumber } from '@shared/units/height'
import type { TFunction } from 'i18next'
import { useTranslation } from 'react-i18next'
import type { TableState } from '../table-state'
import { useTable } from '../table-store'
import { clicksNeeded } from '../tools/face-tool'
import type { Selection, ToolOptions } from '../tools/tool'

interface Props {
  frame: PartFrame | null
  spacingPx: number | null
  scale: number
  /** Said instead of what to do next, where nothing can be done. */
  notice: string | null
}

/** What to do next; where the pointer is; how coarse the picture is. */
export function StatusLine({ frame, spacingPx, scale, notice }: Props) {
  const { t } = useTranslation('table')
  return (
    <footer className="flex h-[30px] items-center gap-7 border-hairline border-t px-4 text-second">
      <WhatNext notice={notice} className="min-w-0 flex-1 truncate" />
      <PointerPlace frame={frame} />
      {spacingPx !== null && (
        <span className="whitespace-nowrap text-muted">
          {t('status.pxABand', { px: spacingPx < 20 ? spacingPx.toFixed(1) : Math.round(spacingPx) })}
        </span>
      )}
      <span className="whitespace-nowrap text-muted">
        {t('status.zoom', { percent: Math.round(scale * 100) })}
      </span>
    </footer>
  )
}

interface WhatNextProps {
  notice: string | null
  className: string
}

/** One sentence on what to do next with the tool in hand. */
export function WhatNext({ notice, className }: WhatNextProps) {
  const { t } = useTranslation('table')
  const tool = useTable((table) => table.tool)
  const options = useTable((table) => table.options)
  const selection = useTable((table) => table.selection)
  return (
    <p id="table-what-next" className={className}>
      {notice ?? whatNext(t, tool, options, selection)}
    </p>
  )
}

function PointerPlace({ frame }: { frame: PartFrame | null }) {
  const { t } = useTranslation('table')
  const pointer = useTable((table) => table.pointer)
  if (!pointer) return null
  const [x, y] = frame ? frame.toMm(...pointer) : pointer
  if (!Number.isFinite(x) || !Number.isFinite(y)) return null
  const decimals = frame ? 2 : 0
  return (
    <span className="whitespace-pre text-muted">
      {t(frame ? 'status.place' : 'status.placePx', {
        x: formatNumber(x, decimals),
        y: formatNumber(y, decimals),
      })}
    </span>
  )
}

function whatNext(
  t: TFunction<'table'>,
  tool: TableState['tool'],
  options: ToolOptions,
  selection: Selection | null,
): string {
  switch (tool.tool) {
    case 'pick':
      return t(selection ? 'next.pickSelected' : 'next.pick')
    case 'face':
      return faceNext(t, options, tool.points.length)
    case 'leaveOut':
      return leaveOutNext(t, options, tool.points.length)
    case 'copies':
      return t(selection?.kind === 'leaveOut' ? 'next.copiesCentre' : 'next.copies')
    case 'band':
      return t(tool.phase === 'idle' ? 'next.band' : 'next.bandGoing')
    case 'number':
      return t(selection?.kind === 'trace' ? 'next.numberTyping' : 'next.number')
    case 'straightedge':
      return t(straightedgeNext[tool.points.length] ?? 'next.straightedge')
    case 'edgeBand':
    case 'pressArrow':
    case 'datum':
    case 'profile':
      return t(`next.${tool.tool}`)
  }
}

const straightedgeNext = [
  'next.straightedge',
  'next.straightedgeTo',
  'next.straightedgeBow',
  'next.straightedgeNext',
] as const

function faceNext(t: TFunction<'table'>, { faceWay }: ToolOptions, clicks: number): string {
  const count = clicksNeeded[faceWay] - clicks
  switch (faceWay) {
    case 'polygon':
      return t('next.facePolygon')
    case 'corners':
      return t('next.faceCorners', { count })
    case 'circle':
      return count > 0 ? t('next.faceCircle', { count }) : t('next.faceRefine')
    case 'ellipse':
      return count > 0 ? t('next.faceEllipse', { count }) : t('next.faceRefine')
  }
}

function leaveOutNext(t: TFunction<'table'>, { leaveOutWay }: ToolOptions, clicks: number): string {
  switch (leaveOutWay) {
    case 'circle':
      return t('next.leaveOutCircle')
    case 'ellipse':
      return t('next.leaveOutEllipse', { count: 5 - clicks })
    case 'polygon':
      return t('next.leaveOutPolygon')
  }
}
