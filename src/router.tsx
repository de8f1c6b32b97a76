import { createBrowserRouter } from 'react-router-dom'
import { NotFoundPage } from './pages/not-found-page'
import { RouteErrorPage } from './pages/route-error-page'
import { SessionGate } from './pages/session-gate'
import { ShellLayout } from './pages/shell-layout'

/** Each page is a bundle of its own, loaded when it is first opened. */
export const router = createBrowserRouter([
  {
    path: '/check/:code?',
    ErrorBoundary: RouteErrorPage,
    HydrateFallback: () => null,
    lazy: async () => ({ Component: (await import('./pages/check-page')).CheckPage }),
  },
  {
    Component: SessionGate,
    ErrorBoundary: RouteErrorPage,
    HydrateFallback: () => null,
    children: [
      {
        path: '/readings/:id/table',
        ErrorBoundary: RouteErrorPage,
        lazy: async () => ({ Component: (await import('@/features/tracing/tracing-page')).default }),
      },
      {
        path: '/certificates/:id/print',
        ErrorBoundary: RouteErrorPage,
        lazy: async () => ({
          Component: (await import('./pages/certificate-print-page')).CertificatePrintPage,
        }),
      },
      {
        Component: ShellLayout,
        children: [
          {
            ErrorBoundary: RouteErrorPage,
            children: [
              {
                index: true,
                lazy: async () => ({ Component: (await import('./pages/home-page')).HomePage }),
              },
              {
                path: 'readings',
                lazy: async () => ({ Component: (await import('./pages/readings-page')).ReadingsPage }),
              },
              {
                path: 'readings/new',
                lazy: async () => ({ Component: (await import('./pages/new-reading-page')).NewReadingPage }),
              },
              {
                path: 'readings/:id',
                lazy: async () => ({ Component: (await import('./pages/reading-page')).ReadingPage }),
              },
              {
                path: 'review',
                lazy: async () => ({ Component: (await import('./pages/review-page')).ReviewPage }),
              },
              {
                path: 'review/:id',
                lazy: async () => ({ Component: (await import('./pages/review-desk-page')).ReviewDeskPage }),
              },
              {
                path: 'certificates',
                lazy: async () => ({
                  Component: (await import('./pages/certificates-page')).CertificatesPage,
                }),
              },
              {
                path: 'certificates/:id',
                lazy: async () => ({ Component: (await import('./pages/certificate-page')).CertificatePage }),
              },
              {
                path: 'pieces',
                lazy: async () => ({ Component: (await import('./pages/pieces-page')).PiecesPage }),
              },
              {
                path: 'pieces/:id',
                lazy: async () => ({ Component: (await import('./pages/piece-page')).PiecePage }),
              },
              {
                path: 'parts',
                lazy: async () => ({ Component: (await import('./pages/parts-page')).PartsPage }),
              },
              {
                path: 'parts/:id',
                lazy: async () => ({ Component: (await import('./pages/part-page')).PartPage }),
              },
              {
                path: 'equipment',
                lazy: async () => ({ Component: (await import('./pages/equipment-page')).EquipmentPage }),
              },
              {
                path: 'people',
                lazy: async () => ({ Component: (await import('./pages/people-page')).PeoplePage }),
              },
              {
                path: 'settings',
                lazy: async () => ({ Component: (await import('./pages/settings-page')).SettingsPage }),
              },
              { path: '*', Component: NotFoundPage },
            ],
          },
        ],
      },
    ],
  },
])
