import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import type { ChecklistStep, StepName } from '../checklist'
import { useTable } from '../table-store'
import type { ToolName } from '../tools/tool'

const stepOfTool: Record<ToolName, StepName> = {
  pick: 'bands',
  face: 'face',
  leaveOut: 'leaveOuts',
  copies: 'leaveOuts',
  edgeBand: 'leaveOuts',
  pressArrow: 'pressArrow',
  datum: 'leaveOuts',
  band: 'bands',
  number: 'bands',
  straightedge: 'bands',
  profile: 'result',
}

/** Any step may be done in any order; each says what is still missing. */
export function ChecklistBar({ steps, isShort }: { steps: readonly ChecklistStep[]; isShort: boolean }) {
  const { t } = useTranslation('table')
  const tool = useTable((table) => table.tool.tool)
  return (
    <ol
      aria-label={t('checklist.label')}
      className="grid h-[58px] grid-cols-5 border-hairline border-y desk:h-[50px]"
    >
      {steps.map((step) => {
        const isActive = stepOfTool[tool] === step.name && tool !== 'pick'
        return (
          <li
            key={step.name}
            data-step={step.name}
            data-state={step.state}
            aria-current={isActive ? 'step' : undefined}
            className={classNames(
              'min-w-0 border-hairline border-l px-3 pt-1.5 first:border-l-0 desk:px-4',
              isActive && 'bg-step-active shadow-[inset_0_2px_0_var(--iris)]',
            )}
          >
            <p className="flex items-center gap-2 font-semibold text-body">
              <StepSign state={step.state} />
              {t(`checklist.${step.name}`)}
              <span className="sr-only">{t(`checklist.${step.state}`)}</span>
            </p>
            <p
              title={step.words}
              className={classNames(
                'truncate text-second',
                step.state === 'attention' ? 'text-chestnut' : 'text-muted',
              )}
            >
              {(isShort && step.shortWords) || step.words}
            </p>
          </li>
        )
      })}
    </ol>
  )
}

function StepSign({ state }: { state: ChecklistStep['state'] }) {
  if (state === 'open') return null
  return (
    <svg aria-hidden="true" width="12" height="10" viewBox="0 0 12 10" fill="none" className="shrink-0">
      {state === 'done' ? (
        <path d="M1 5.500L4.500 9L11 1" stroke="var(--bottle)" strokeWidth="1.6" />
      ) : (
        <path d="M6 0L10.500 5L6 10L1.500 5Z" fill="var(--chestnut)" />
      )}
    </svg>
  )
}
