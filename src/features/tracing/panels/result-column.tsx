import type { Reading } from '@shared/schemas/readings'
import type { PointPx } from '@shared/schemas/shapes'
import { memo, type ReactNode } from 'react'
import { useTranslation } from 'react-i18next'
import { classNames } from '@/lib/class-names'
import type { LineMm } from '../result/profile-along'
import type { LivingResult } from '../result/use-living-result'
import { FigureBudget, FigureFacts, FormWords } from './figure-facts'
import { FigureHead } from './figure-head'
import { FigureMap } from './figure-map'
import { FindingsList, hasFindings } from './findings-list'
import { StraightedgeWords } from './straightedge-words'

interface Props {
  reading: Reading
  living: LivingResult
  /** null without a light source. */
  bandUm: number | null
  line: LineMm | null
  isFinal: boolean
  /** Two columns below the photograph instead of one beside it. */
  isWide: boolean
  onShow: (place: PointPx | null, traceIds: readonly string[]) => void
  children?: ReactNode
}

/** What the marks come to, as they are marked. */
export const ResultColumn = memo(function ResultColumn(props: Props) {
  const { t } = useTranslation('table')
  const { reading, living, bandUm, line, isFinal, isWide, onShow, children } = props
  const figure = living.read?.figure ?? null
  // What needs a person stands above the map, that there is nothing to report below it.
  const isFirst = living.read !== null && hasFindings(living.read)
  const faded = classNames('transition-opacity delay-150', !living.isCurrent && 'opacity-45')
  return (
    <section
      aria-label={t('result.label')}
      // biome-ignore lint/a11y/noNoninteractiveTabindex: it scrolls, and a keyboard scrolls only what takes the focus
      tabIndex={0}
      className={classNames(
        'min-h-0 min-w-0 overflow-y-auto px-5 pt-2.5 pb-5',
        isWide ? 'grid grid-cols-2 gap-x-9 px-6 pt-4' : 'border-hairline border-l',
      )}
    >
      <Stack>
        {figure ? (
          <FigureHead figure={figure} reading={reading} isCurrent={living.isCurrent} isFinal={isFinal} />
        ) : (
          <NoFigure hasLight={bandUm !== null} />
        )}
        {figure && (
          <div className={faded}>
            <FormWords figure={figure} />
          </div>
        )}
        {figure && isWide && <FigureFacts figure={figure} reading={reading} />}
        {living.read && (isWide || isFirst) && <FindingsList read={living.read} onShow={onShow} />}
      </Stack>
      <Stack isSecond={!isWide}>
        {figure && (
          <div className={faded}>
            <FigureMap figure={figure} line={line} sizePx={isWide ? 172 : 134} />
          </div>
        )}
        {figure && !isWide && <FigureFacts figure={figure} reading={reading} />}
        <StraightedgeWords bandUm={bandUm} />
        {living.read && !isWide && !isFirst && <FindingsList read={living.read} onShow={onShow} />}
        {figure && <FigureBudget figure={figure} />}
      </Stack>
      {children}
    </section>
  )
})

/** Parts with a hairline between them. */
function Stack({ children, isSecond = false }: { children: ReactNode; isSecond?: boolean }) {
  return (
    <div
      className={classNames(
        'min-w-0 [&>*+*]:mt-3 [&>*+*]:border-hairline [&>*+*]:border-t [&>*+*]:pt-2.5',
        isSecond &&
          '[&>*:first-child]:mt-3 [&>*:first-child]:border-hairline [&>*:first-child]:border-t [&>*:first-child]:pt-3',
      )}
    >
      {children}
    </div>
  )
}

function NoFigure({ hasLight }: { hasLight: boolean }) {
  const { t } = useTranslation('table')
  return (
    <div>
      <p className="font-semibold text-muted text-second">{t('result.label')}</p>
      <p className="pt-2 text-headline">{t('result.none')}</p>
      <p className="pt-1 text-muted text-second">{t(hasLight ? 'result.noneLead' : 'result.noLight')}</p>
    </div>
  )
}
