import { useEffect, useEffectEvent } from 'react'

const typing = (target: EventTarget | null) => target instanceof HTMLElement && (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))

/** Runs on a single key anywhere on the page, except while somebody types. */
export function useHotkey(key: string, run: () => void): void {
  const act = useEffectEvent(run)
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.key !== key || event.ctrlKey || event.metaKey || event.altKey || typing(event.target)) return
      event.preventDefault()
      act()
    }
    window.addEventListener('keydown', listen)
    return () => window.removeEventListener('keydown', listen)
  }, [key])
}

/** Ctrl+S (Cmd+S) saves, wherever the cursor stands. */
export function useSaveKey(save: () => void): void {
  const act = useEffectEvent(save)
  useEffect(() => {
    const listen = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== 's' || !(event.ctrlKey || event.metaKey) || event.altKey) return
      event.preventDefault()
      // A field that reads its text when left must be read before the save.
      if (document.activeElement instanceof HTMLElement && typing(document.activeElement)) {
        const element = document.activeElement
        element.blur()
        element.focus()
      }
      act()
    }
    window.addEventListener('keydown', listen)
    return () => window.removeEventListener('keydown', listen)
  }, [])
}
