import { useEffect } from 'react'

/** Names the page in the tab: "VP-43 · 1182 – Lapwing". */
export function useDocumentTitle(title: string | undefined): void {
  useEffect(() => {
    document.title = title ? `${title} – Lapwing` : 'Lapwing'
  }, [title])
}
