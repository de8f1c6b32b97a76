import { useTranslation } from 'react-i18next'
import { NavLink } from 'react-router-dom'
import { classNames } from '@/lib/class-names'
import { useMay } from '@/lib/session'

const before = ['home', 'readings'] as const
const after = ['certificates', 'pieces', 'parts', 'equipment'] as const

export function Navigation() {
  const { t } = useTranslation('nav')
  const reviews = useMay('reading:review')
  const managesPeople = useMay('person:manage')
  const editsSettings = useMay('settings:edit')
  const entries = [
    ...before,
    ...(reviews ? (['review'] as const) : []),
    ...after,
    ...(managesPeople ? (['people'] as const) : []),
    ...(editsSettings ? (['settings'] as const) : []),
  ]
  return (
    <nav aria-label={t('main')} className="max-desk:order-last max-desk:w-full desk:h-full">
      <ul className="flex h-11 gap-5 overflow-x-auto desk:h-full desk:gap-6">
        {entries.map((entry) => (
          <li key={entry} className="h-full">
            <NavLink
              to={entry === 'home' ? '/' : `/${entry}`}
              end={entry === 'home'}
              className={({ isActive }) =>
                classNames(
                  'flex h-full items-center border-transparent border-y-2 text-body text-muted hover:text-ink',
                  isActive && 'border-b-ink font-semibold text-ink',
                )
              }
            >
              {t(entry)}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  )
}
