import { useTranslation } from 'react-i18next'
import { KeyCap } from '@/components/key-cap'
import { classNames } from '@/lib/class-names'
import { useTable, useTableStore } from '../table-store'
import type { ToolName } from '../tools/tool'
import { toolKeys } from '../use-table-keys'

interface Props {
  tool: ToolName
  disabled: boolean
}

/** A tool with its word and its key, down the side of the desk. */
export function ToolLine({ tool, disabled }: Props) {
  const { t } = useTranslation('table')
  const { isActive, choose } = useTool(tool)
  return (
    <button
      type="button"
      aria-pressed={isActive}
      aria-keyshortcuts={toolKeys[tool]}
      disabled={disabled}
      onClick={choose}
      className={classNames(
        'flex h-7 w-full items-center justify-between gap-2 border-transparent border-l-2 pr-3 pl-3.5 text-left text-body hover:bg-step-active disabled:opacity-45',
        isActive && 'border-iris bg-tool-active font-semibold hover:bg-tool-active',
      )}
    >
      <span className="whitespace-nowrap">{t(`tools.${tool}`)}</span>
      <span aria-hidden="true">
        <KeyCap>{toolKeys[tool]}</KeyCap>
      </span>
    </button>
  )
}

/** The same as a cell of the row under the photograph, wide enough for a finger. */
export function ToolCell({ tool, disabled, className }: Props & { className?: string }) {
  const { t, i18n } = useTranslation('table')
  const { isActive, choose } = useTool(tool)
  const short = `tools.short.${tool}`
  return (
    <button
      type="button"
      aria-pressed={isActive}
      disabled={disabled}
      onClick={choose}
      className={classNames(
        'h-14 min-w-[64px] flex-auto whitespace-nowrap border-hairline border-r px-3 text-body disabled:opacity-45',
        isActive && 'bg-tool-active font-semibold shadow-[inset_0_-2px_0_var(--iris)]',
        className,
      )}
    >
      {t(i18n.exists(`table:${short}`) ? short : `tools.${tool}`)}
    </button>
  )
}

function useTool(tool: ToolName) {
  const store = useTableStore()
  const isActive = useTable((table) => table.tool.tool === tool)
  return { isActive, choose: () => store.dispatch({ type: 'chooseTool', tool }) }
}
