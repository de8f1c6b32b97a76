import type { FaceTemplate } from '@shared/schemas/parts'
import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import { centreOfShape } from '../geometry/shape-path'
import { isGestureOpen, marksOf } from '../table-state'
import { useTable, useTableStore } from '../table-store'
import { withCopies } from '../tools/copies-tool'
import type { FaceWay, LeaveOutWay, ToolName } from '../tools/tool'
import { SmallNumber } from './small-number'

const hasOptions: readonly ToolName[] = ['face', 'leaveOut', 'copies', 'edgeBand', 'number']

interface Props {
  template: FaceTemplate | null
  /** In a row under the photograph instead of a column beside it. */
  inRow?: boolean
}

/** What the tool in hand can be set to, and on a tablet what keys do elsewhere. */
export function ToolOptions({ template, inRow = false }: Props) {
  const { t } = useTranslation('table')
  const tool = useTable((table) => table.tool.tool)
  const isOpen = useTable(isGestureOpen)
  const hasSelection = useTable((table) => table.selection !== null)
  const settings = hasOptions.includes(tool)
  if (!settings && !(inRow && (isOpen || hasSelection))) return null
  return (
    <fieldset
      aria-label={t('options.label', { tool: t(`tools.${tool}`) })}
      className={classNames(
        'm-0 min-w-0 px-4',
        inRow ? 'flex flex-wrap items-center gap-x-5 gap-y-1 border-hairline border-t py-1' : 'pt-4',
      )}
    >
      {!inRow && <h2 className="pb-1 font-semibold text-muted text-second">{t(`tools.${tool}`)}</h2>}
      {settings && <Settings tool={tool} template={template} inRow={inRow} />}
      {inRow && isOpen && <GestureButtons />}
      {inRow && !isOpen && hasSelection && <DeleteButton />}
    </fieldset>
  )
}

function Settings({ tool, template, inRow }: Props & { tool: ToolName }) {
  switch (tool) {
    case 'face':
      return <FaceSettings template={template} inRow={inRow} />
    case 'leaveOut':
      return <LeaveOutSettings inRow={inRow} />
    case 'copies':
      return <CopiesSettings />
    case 'edgeBand':
      return <EdgeBandSetting />
    case 'number':
      return <NumberSetting />
    default:
      return null
  }
}

const faceWays: readonly FaceWay[] = ['circle', 'ellipse', 'corners', 'polygon']

function FaceSettings({ template, inRow }: Props) {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const way = useTable((table) => table.options.faceWay)
  const marks = useTable(marksOf)
  return (
    <>
      <Choices
        name="face-way"
        inRow={inRow}
        value={way}
        choices={faceWays.map((value) => ({ value, word: t(`options.${value}`) }))}
        onChoose={(faceWay) => store.dispatch({ type: 'setOptions', options: { faceWay } })}
      />
      {template && !marks.outline && (
        <QuietButton
          onClick={() =>
            store.dispatch({
              type: 'edit',
              marks: { ...marks, outline: template.outline, leaveOuts: template.leaveOuts },
            })
          }
        >
          {t('options.useTemplate')}
        </QuietButton>
      )}
    </>
  )
}

const leaveOutWays: readonly { value: LeaveOutWay; word: string }[] = [
  { value: 'circle', word: 'leaveOutCircle' },
  { value: 'ellipse', word: 'leaveOutEllipse' },
  { value: 'polygon', word: 'leaveOutPolygon' },
]

function LeaveOutSettings({ inRow }: { inRow?: boolean }) {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const way = useTable((table) => table.options.leaveOutWay)
  return (
    <Choices
      name="leave-out-way"
      inRow={inRow}
      value={way}
      choices={leaveOutWays.map(({ value, word }) => ({ value, word: t(`options.${word}`) }))}
      onChoose={(leaveOutWay) => store.dispatch({ type: 'setOptions', options: { leaveOutWay } })}
    />
  )
}

function CopiesSettings() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const wanted = useTable((table) => table.options.copyCount)
  const marks = useTable(marksOf)
  const selection = useTable((table) => table.selection)
  const chosen = selection?.kind === 'leaveOut' && marks.leaveOuts.find(({ id }) => id === selection.id)
  const copies = chosen ? chosen.copies : null
  const put = (count: number) => {
    store.dispatch({ type: 'setOptions', options: { copyCount: Math.max(2, count) } })
    if (!chosen || !copies) return
    store.dispatch({
      type: 'edit',
      marks: withCopies(marks, chosen.id, count, [copies.cx, copies.cy]),
    })
  }
  const apply = () => {
    if (!chosen || !marks.outline) return
    store.dispatch({
      type: 'edit',
      marks: withCopies(marks, chosen.id, wanted, centreOfShape(marks.outline)),
    })
  }
  return (
    <>
      <SmallNumber
        label={t('options.copyCount')}
        value={copies?.count ?? wanted}
        onCommit={(count) => count !== null && put(count)}
        least={2}
        most={360}
        whole
      />
      {!chosen && <p className="py-1 text-axis text-muted">{t('options.copyFirst')}</p>}
      {chosen && marks.outline && !copies && (
        <QuietButton onClick={apply}>{t('options.copyApply')}</QuietButton>
      )}
      {copies && <QuietButton onClick={() => put(0)}>{t('options.copyRemove')}</QuietButton>}
    </>
  )
}

function EdgeBandSetting() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const marks = useTable(marksOf)
  return (
    <SmallNumber
      label={t('options.edgeBandMm')}
      value={marks.edgeBandMm}
      least={0}
      most={100}
      onCommit={(mm) => mm !== null && store.dispatch({ type: 'edit', marks: { ...marks, edgeBandMm: mm } })}
    />
  )
}

function NumberSetting() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  const first = useTable((table) => table.options.firstNumber)
  return (
    <SmallNumber
      label={t('options.firstNumber')}
      value={first}
      least={-9999}
      most={9999}
      whole
      mayBeEmpty
      placeholder={t('options.firstNumberAuto')}
      onCommit={(firstNumber) => store.dispatch({ type: 'setOptions', options: { firstNumber } })}
    />
  )
}

function GestureButtons() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  return (
    <>
      <QuietButton onClick={() => store.dispatch({ type: 'end' })}>{t('options.finish')}</QuietButton>
      <QuietButton onClick={() => store.dispatch({ type: 'back' })}>{t('options.takeBack')}</QuietButton>
      <QuietButton onClick={() => store.dispatch({ type: 'cancel' })}>{t('options.cancel')}</QuietButton>
    </>
  )
}

function DeleteButton() {
  const { t } = useTranslation('table')
  const store = useTableStore()
  return <QuietButton onClick={() => store.dispatch({ type: 'delete' })}>{t('options.delete')}</QuietButton>
}

interface ChoicesProps<Value extends string> {
  name: string
  value: Value
  choices: readonly { value: Value; word: string }[]
  onChoose: (value: Value) => void
  inRow?: boolean
}

function Choices<Value extends string>({ name, value, choices, onChoose, inRow }: ChoicesProps<Value>) {
  return (
    <div className={inRow ? 'flex flex-wrap gap-x-5' : 'flex flex-col'}>
      {choices.map((choice) => (
        <label key={choice.value} className="flex min-h-7 items-center gap-2 text-second max-desk:min-h-11">
          <input
            type="radio"
            name={name}
            className="accent-iris"
            checked={choice.value === value}
            onChange={() => onChoose(choice.value)}
          />
          {choice.word}
        </label>
      ))}
    </div>
  )
}

function QuietButton({ children, onClick }: { children: ReactNode; onClick: () => void }) {
  return (
    <button
      type="button"
      onClick={onClick}
      className="min-h-7 text-left text-second underline decoration-edge underline-offset-3 hover:decoration-ink max-desk:min-h-11"
    >
      {children}
    </button>
  )
}
