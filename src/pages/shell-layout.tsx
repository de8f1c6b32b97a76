import { Suspense } from 'react'
import { useTranslation } from 'react-i18next'
import { Outlet } from 'react-router-dom'
import { Loading } from '@/components/loading'
import { Footer } from '@/features/shell/footer'
import { KeySheetProvider } from '@/features/shell/key-sheet'
import { TopBar } from '@/features/shell/top-bar'

/** Top bar, the page, footer. */
export function ShellLayout() {
  const { t } = useTranslation()
  return (
    <KeySheetProvider>
      <a
        href="#content"
        className="absolute -top-12 left-4 z-50 rounded bg-ink px-3 py-2 font-semibold text-on-ink focus:top-2"
      >
        {t('skipToContent')}
      </a>
      <div className="flex min-h-screen flex-col">
        <TopBar />
        <main id="content" tabIndex={-1} className="mx-auto w-full max-w-[1280px] flex-1 px-6 desk:px-10">
          <Suspense fallback={<Loading />}>
            <Outlet />
          </Suspense>
        </main>
        <Footer />
      </div>
    </KeySheetProvider>
  )
}
