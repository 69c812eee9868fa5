import { useCallback, useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'

/** A list's filters, kept in the address so that a view can be shared and the back button works. Empty values leave the address. */
export function useFilters<K extends string>(keys: readonly K[]): { values: Record<K, string>; set: (changes: Partial<Record<K, string>>) => void; clear: () => void; any: boolean } {
  const [search, setSearch] = useSearchParams()
  const names = keys.join(' ')
  const values = useMemo(() => {
    const read: Record<string, string> = {}
    for (const key of names.split(' ')) read[key] = search.get(key) ?? ''
    return read as Record<K, string>
  }, [names, search])
  const set = useCallback(
    (changes: Partial<Record<K, string>>) =>
      setSearch(
        (before) => {
          const next = new URLSearchParams(before)
          for (const [key, value] of Object.entries(changes) as [string, string | undefined][]) {
            if (value) next.set(key, value)
            else next.delete(key)
          }
          return next
        },
        { replace: true },
      ),
    [setSearch],
  )
  const clear = useCallback(() => set(Object.fromEntries(names.split(' ').map((key) => [key, ''])) as Partial<Record<K, string>>), [names, set])
  return { values, set, clear, any: Object.values(values).some((value) => value !== '') }
}
