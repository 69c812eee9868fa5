import { useState } from 'react'

/** State kept on this device under a key; falls back to plain state where the browser keeps nothing. */
export function useRemembered<T>(key: string | undefined, initial: T, valid: (value: unknown) => value is T): [T, (next: T) => void] {
  const name = key && `sidebend.${key}`
  const [value, setValue] = useState<T>(() => {
    if (!name) return initial
    try {
      const kept: unknown = JSON.parse(localStorage.getItem(name) ?? 'null')
      return valid(kept) ? kept : initial
    } catch {
      return initial
    }
  })
  const keep = (next: T) => {
    setValue(next)
    if (!name) return
    try {
      localStorage.setItem(name, JSON.stringify(next))
    } catch {
      // Kept for this visit only.
    }
  }
  return [value, keep]
}
