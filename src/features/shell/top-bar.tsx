import { useTranslation } from 'react-i18next'
import { Link, useNavigate } from 'react-router-dom'
import { LapwingMark } from '@/components/lapwing-mark'
import { useMay } from '@/lib/session'
import { useHotKey } from '@/lib/use-hot-key'
import { Navigation } from './navigation'
import { PersonMenu } from './person-menu'
import { SearchBox } from './search-box'

export function TopBar() {
  const { t } = useTranslation('nav')
  const navigate = useNavigate()
  useHotKey('n', () => navigate('/readings/new'), useMay('reading:create'))
  useHotKey('h', () => navigate('/'))
  return (
    <header className="border-hairline border-b">
      <div className="mx-auto flex max-w-[1280px] flex-wrap items-center px-6 max-desk:pt-1.5 desk:h-[52px] desk:flex-nowrap desk:px-10">
        <Link
          to="/"
          aria-label={`Lapwing: ${t('home')}`}
          className="flex min-h-11 w-margin shrink-0 items-center gap-2.5 font-semibold text-[1.0625rem]"
        >
          <LapwingMark />
          Lapwing
        </Link>
        <Navigation />
        <div className="ml-auto flex min-w-0 items-center gap-6 max-desk:flex-1 max-desk:justify-end">
          <SearchBox />
          <PersonMenu />
        </div>
      </div>
    </header>
  )
}
