import type { ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { KeyCap } from '@/components/key-cap'
import { classNames } from '@/lib/class-names'
import { type ToolName, toolNames } from '../tools/tool'
import { CautionsButton } from './cautions-button'
import { ToolLine } from './tool-button'

/** Looking works for everybody. */
const forAll: readonly ToolName[] = ['pick', 'profile']

interface Props {
  mayEdit: boolean
  showMarks: boolean
  onShowMarks: () => void
  options: ReactNode
  bands: ReactNode
}

export function ToolsColumn({ mayEdit, showMarks, onShowMarks, options, bands }: Props) {
  const { t } = useTranslation('table')
  return (
    <div className="flex min-h-0 flex-col overflow-y-auto border-hairline border-r pt-3 pb-2">
      <section aria-label={t('tools.label')}>
        <Heading>{t('tools.mark')}</Heading>
        {toolNames.map((tool) => (
          <ToolLine key={tool} tool={tool} disabled={!mayEdit && !forAll.includes(tool)} />
        ))}
      </section>
      <Heading className="mt-4">{t('tools.show')}</Heading>
      <MarksSwitch isOn={showMarks} onToggle={onShowMarks} />
      {options}
      {bands}
      <div className="mt-auto px-4 pt-3">
        <CautionsButton />
      </div>
    </div>
  )
}

function Heading({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <h2 className={classNames('px-4 pb-1 font-semibold text-muted text-second', className)}>{children}</h2>
  )
}

function MarksSwitch({ isOn, onToggle }: { isOn: boolean; onToggle: () => void }) {
  const { t } = useTranslation('table')
  return (
    <button
      type="button"
      role="switch"
      aria-checked={isOn}
      aria-keyshortcuts="M"
      onClick={onToggle}
      className="flex h-7 w-full shrink-0 items-center gap-2 pr-3 pl-4 text-left text-body hover:bg-step-active"
    >
      <span className="flex-1">{t('tools.marks')}</span>
      <Tick isOn={isOn} />
      <span aria-hidden="true">
        <KeyCap>M</KeyCap>
      </span>
    </button>
  )
}

function Tick({ isOn }: { isOn: boolean }) {
  return (
    <svg aria-hidden="true" width="12" height="10" viewBox="0 0 12 10" fill="none" className="text-bottle">
      {isOn && <path d="M1 5.500L4.500 9L11 1" stroke="currentColor" strokeWidth="1.6" />}
    </svg>
  )
}
