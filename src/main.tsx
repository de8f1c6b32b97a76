import './styles/fonts'
import './styles/index.css'
import './lib/i18n'
import { QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { RouterProvider } from 'react-router-dom'
import { Toaster } from 'sonner'
import { queryClient } from './lib/query-client'
import { router } from './router'

const root = document.getElementById('root')
if (!root) throw new Error('index.html has no #root')

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
      <Toaster
        position="bottom-center"
        toastOptions={{
          unstyled: true,
          classNames: {
            toast:
              'flex items-center gap-3 rounded border border-ink bg-field px-4 py-2.5 font-sans text-body text-ink',
          },
        }}
      />
    </QueryClientProvider>
  </StrictMode>,
)
