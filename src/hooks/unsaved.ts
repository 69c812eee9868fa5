import { useEffect, useEffectEvent } from 'react'

/** Asks before the tab is closed or left while something is not saved. */
export function useUnsaved(unsaved: boolean): void {
  const hold = useEffectEvent((event: BeforeUnloadEvent) => {
    if (unsaved) event.preventDefault()
  })
  useEffect(() => {
    const listen = (event: BeforeUnloadEvent) => void hold(event)
    window.addEventListener('beforeunload', listen)
    return () => window.removeEventListener('beforeunload', listen)
  }, [])
}
