import { useEffect } from 'react'

/** Names the page in the browser's tab and history: "WPS-014 rev B · Sidebend". */
export function useTitle(title: string): void {
  useEffect(() => {
    document.title = title ? `${title} · Sidebend` : 'Sidebend'
  }, [title])
}
