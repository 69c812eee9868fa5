import { useCallback, useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'

/** A list's filters, kept in the address so that a view can be shared and the back button works. Empty values leave the address. */
export function useFilters<K extends string>(keys: readonly K[]): { values: Record<K, string>; set: (changes: Partial<Record<K, string>>) => void; clear: () => void; any: boolean } {
  const [search, setSearch] = useSearchParams()
  const names = keys.join(' ')
  const each = useCallback(
    (value: (key: string) => string): Record<K, string> => {
      const made: Record<string, string> = {}
      for (const key of names.split(' ')) made[key] = value(key)
      return made
    },
    [names],
  )
  const values = useMemo(() => each((key) => search.get(key) ?? ''), [each, search])
  const set = useCallback(
    (changes: Partial<Record<K, string>>) =>
      setSearch(
        (before) => {
          const next = new URLSearchParams(before)
          for (const [key, value] of Object.entries<string | undefined>(changes)) {
            if (value) next.set(key, value)
            else next.delete(key)
          }
          return next
        },
        { replace: true },
      ),
    [setSearch],
  )
  const clear = useCallback(() => set(each(() => '')), [each, set])
  return { values, set, clear, any: Object.values(values).some((value) => value !== '') }
}
