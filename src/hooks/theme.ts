import { useEffect } from 'react'

export type Theme = 'day' | 'night'
const KEY = 'sidebend.theme'

/** The theme last used on this device, so that the first paint is already right. */
export function rememberedTheme(): Theme {
  try {
    return localStorage.getItem(KEY) === 'night' ? 'night' : 'day'
  } catch {
    return 'day'
  }
}

/** Puts the theme's class on the page. */
export function applyTheme(theme: Theme): void {
  document.documentElement.classList.toggle('night', theme === 'night')
}

/** Follows the person's theme and remembers it on this device. */
export function useTheme(theme: Theme | undefined): void {
  useEffect(() => {
    if (!theme) return
    applyTheme(theme)
    try {
      localStorage.setItem(KEY, theme)
    } catch {
      // A browser that keeps nothing still shows the theme for this visit.
    }
  }, [theme])
}
