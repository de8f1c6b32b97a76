import { Popover } from 'radix-ui'
import { useState } from 'react'
import { useTranslation } from 'react-i18next'
import type { ToolName } from '../tools/tool'
import { ToolCell } from './tool-button'

const shown: readonly ToolName[] = [
  'pick',
  'face',
  'leaveOut',
  'pressArrow',
  'band',
  'number',
  'straightedge',
  'profile',
]
const more: readonly ToolName[] = ['copies', 'edgeBand', 'datum']
const forAll: readonly ToolName[] = ['pick', 'profile']

interface Props {
  mayEdit: boolean
  showMarks: boolean
  onShowMarks: () => void
}

/** The tools in a row under the photograph, each wide enough for a finger. */
export function ToolsRow({ mayEdit, showMarks, onShowMarks }: Props) {
  const { t } = useTranslation('table')
  const [isOpen, setOpen] = useState(false)
  const isLocked = (tool: ToolName) => !mayEdit && !forAll.includes(tool)
  return (
    <section aria-label={t('tools.label')} className="flex overflow-x-auto border-hairline border-y">
      {shown.map((tool) => (
        <ToolCell key={tool} tool={tool} disabled={isLocked(tool)} />
      ))}
      <Popover.Root open={isOpen} onOpenChange={setOpen}>
        <Popover.Trigger className="h-14 min-w-[64px] flex-auto px-3 text-body">
          {t('tools.more')}
        </Popover.Trigger>
        <Popover.Content
          data-surface="table"
          side="top"
          align="end"
          className="z-30 flex w-56 flex-col rounded border border-edge p-2"
          onClick={() => setOpen(false)}
        >
          {more.map((tool) => (
            <ToolCell
              key={tool}
              tool={tool}
              disabled={isLocked(tool)}
              className="flex-none border-r-0 text-left"
            />
          ))}
          <button
            type="button"
            role="switch"
            aria-checked={showMarks}
            onClick={onShowMarks}
            className="h-14 px-3 text-left text-body"
          >
            {t('tools.marks')} {showMarks ? '✓' : ''}
          </button>
        </Popover.Content>
      </Popover.Root>
    </section>
  )
}
