import type { Photo, Reading } from '@shared/schemas/readings'
import type { Figure } from '@shared/schemas/results'
import type { PointPx } from '@shared/schemas/shapes'
import { isEditable } from '@shared/workflow/reading-states'
import { useCallback, useMemo, useRef, useState } from 'react'
import { useTranslation } from 'react-i18next'
import { DepartureDialog } from '@/components/departure-dialog'
import { useIsDesk } from '@/lib/use-is-desk'
import { PhotoStage } from './canvas/photo-stage'
import { useTablePointer } from './canvas/use-table-pointer'
import { useViewport } from './canvas/use-viewport'
import { boxOf } from './geometry/paths'
import { rimOf } from './geometry/shape-path'
import type { OpenedTable } from './open-table'
import { BandList } from './panels/band-list'
import { CautionsButton } from './panels/cautions-button'
import { ChecklistBar } from './panels/checklist-bar'
import { ConflictView } from './panels/conflict-view'
import { PhotoChoice } from './panels/photo-choice'
import { ResultColumn } from './panels/result-column'
import { StatusLine, WhatNext } from './panels/status-line'
import { ToolOptions } from './panels/tool-options'
import { ToolsColumn } from './panels/tools-column'
import { ToolsRow } from './panels/tools-row'
import { TableTopBar } from './panels/top-bar'
import { ViewButtons } from './panels/view-buttons'
import type { Circumstances } from './result/read-marks'
import { useAutosave } from './saving/use-autosave'
import { useTableStore } from './table-store'
import { useComputeOnLeaving } from './use-compute-on-leaving'
import { useSend } from './use-send'
import { useTableKeys } from './use-table-keys'
import { useTableResult } from './use-table-result'
import { lookAt, zoomAbout } from './viewport'

interface Props {
  reading: Reading
  circumstances: Circumstances
  setUpWords: readonly string[]
  overtaken: OpenedTable['overtaken']
}

/** Top bar, checklist, tools, photograph, result, status line; on a tablet one below the other. */
export function Desk({ reading, circumstances, setUpWords, overtaken }: Props) {
  const isDesk = useIsDesk()
  const [showMarks, setShowMarks] = useState(true)
  const saving = useAutosave(useTableStore(), reading, overtaken)
  const result = useTableResult(reading, circumstances)
  const send = useSend(reading, saving.flush)
  useComputeOnLeaving(reading, saving.flush, result.figure !== null, send.isSuccess)
  const toggleMarks = useCallback(() => setShowMarks((isOn) => !isOn), [])
  const photo = usePhotoChoice(reading)
  const desk = useDeskView(reading, photo.shown, photo.isMarked, toggleMarks)
  const { mayEdit } = reading
  const { t } = useTranslation('table')
  const why = t(isEditable(reading.state) ? 'next.notYours' : 'next.leftDraft')
  const readOnly = mayEdit ? null : t('next.readOnly', { why })
  const notice = photo.isMarked ? readOnly : t('next.otherPhoto')

  const stage = (
    <PhotoStage
      areaRef={desk.areaRef}
      photo={photo.shown}
      view={desk.view}
      frame={result.frame}
      problems={result.living.read?.problems ?? noProblems}
      showMarks={showMarks}
      isMarked={photo.isMarked}
    >
      <PhotoChoice photos={reading.photos} shownId={photo.shown?.id ?? null} onShow={photo.show} />
      <ViewButtons view={desk.view} />
      {!isDesk && (
        <WhatNext
          notice={notice}
          className="pointer-events-none absolute bottom-3 left-3 max-w-[58%] rounded bg-ground/85 px-3 py-1.5 text-second"
        />
      )}
      <ConflictView saving={saving} />
    </PhotoStage>
  )
  const template = reading.face.template
  return (
    <main
      data-surface="table"
      className="flex min-h-dvh flex-col overflow-x-hidden desk:grid desk:h-dvh desk:min-h-0 desk:grid-rows-[46px_50px_minmax(0,1fr)] desk:overflow-hidden"
    >
      <TableTopBar
        reading={reading}
        setUpWords={setUpWords}
        saving={saving.state}
        isSending={send.isPending}
        onSend={send.send}
      />
      {send.asksReason && <DepartureDialog onSubmit={send.sendWithReason} onClose={send.giveUp} />}
      <ChecklistBar steps={result.steps} isShort={!isDesk} />
      <div className="min-h-0 desk:grid desk:grid-cols-[176px_minmax(0,1fr)_312px]">
        {isDesk && (
          <ToolsColumn
            mayEdit={mayEdit}
            showMarks={showMarks}
            onShowMarks={toggleMarks}
            options={<ToolOptions template={template} />}
            bands={<BandList mayEdit={mayEdit} />}
          />
        )}
        <div className="flex min-h-0 min-w-0 flex-col">
          <div className="h-[620px] max-h-[70dvh] desk:h-auto desk:max-h-none desk:flex-1">{stage}</div>
          {isDesk && (
            <StatusLine
              frame={result.frame}
              spacingPx={medianSpacingPx(result.figure)}
              scale={desk.view.viewport.scale}
              notice={notice}
            />
          )}
          {!isDesk && <ToolsRow mayEdit={mayEdit} showMarks={showMarks} onShowMarks={toggleMarks} />}
          {!isDesk && <ToolOptions template={template} inRow />}
        </div>
        <ResultColumn
          reading={reading}
          living={result.living}
          bandUm={result.bandUm}
          line={result.line}
          isFinal={result.isFinal}
          isWide={!isDesk}
          onShow={desk.show}
        >
          {!isDesk && (
            <div className="col-span-2 pt-2">
              <BandList mayEdit={mayEdit} />
              <CautionsButton />
            </div>
          )}
        </ResultColumn>
      </div>
    </main>
  )
}

const noProblems: readonly never[] = []

/** The photograph of the bands is the one that is marked; others are looked at. */
function usePhotoChoice({ photos }: Reading) {
  const marked = photos.find(({ role }) => role === 'bands') ?? null
  const store = useTableStore()
  const [shownId, setShownId] = useState(marked?.id ?? photos[0]?.id ?? null)
  const show = (id: string) => {
    // Nothing out of sight stays in the hand.
    store.dispatch({ type: 'select', selection: null })
    setShownId(id)
  }
  const shown = photos.find(({ id }) => id === shownId) ?? null
  return { shown, show, isMarked: shown !== null && shown === marked }
}

/** The view of the photograph, and the hands on it. */
function useDeskView(reading: Reading, photo: Photo | null, isMarked: boolean, toggleMarks: () => void) {
  const store = useTableStore()
  const areaRef = useRef<HTMLDivElement>(null)
  const isPanning = useRef(false)
  const size = useMemo(() => photo && { width: photo.widthPx, height: photo.heightPx }, [photo])
  const view = useViewport(areaRef, size, faceBox(reading))
  const { change, latest, area, fitAll } = view
  useTablePointer({ areaRef, store, viewport: latest, changeView: change, isPanning, isMarked })
  useTableKeys({
    store,
    areaRef,
    isPanning,
    actions: {
      zoomBy: (factor) =>
        change((viewport) => zoomAbout(viewport, { x: area.width / 2, y: area.height / 2 }, factor)),
      fitPhoto: fitAll,
      toggleMarks,
    },
  })
  const show = useCallback(
    (place: PointPx | null, traceIds: readonly string[]) => {
      if (place) change((viewport) => lookAt(viewport, { x: place[0], y: place[1] }, area))
      const [id] = traceIds
      if (id) store.dispatch({ type: 'select', selection: { kind: 'trace', id, point: null } })
      areaRef.current?.focus()
    },
    [change, area, store],
  )
  return { areaRef, view, show }
}

function faceBox({ marks: { outline } }: Reading) {
  if (!outline) return null
  const { left, top, right, bottom } = boxOf(rimOf(outline))
  return { x: left, y: top, width: right - left, height: bottom - top }
}

function medianSpacingPx(figure: Figure | null): number | null {
  const spacings = figure?.bandReadings.map(({ spacingPx }) => spacingPx).toSorted((a, b) => a - b) ?? []
  return spacings[spacings.length >> 1] ?? null
}
