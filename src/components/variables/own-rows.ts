import { useQuery } from '@tanstack/react-query'
import type { AdviceLibrary } from '@shared/library/filler-advice-facts.ts'
import { baseMetalRowSchema, fillerRowSchema } from '@shared/library/rows.ts'
import type { BaseMetal, Filler } from '@shared/schemas/welding.ts'
import { query } from '@/lib/query.ts'

/** Content of an organization's own row by its key; null for reference rows, which the program has at hand, and until it is read. */
function useOwnRow(kind: 'base-metals' | 'filler-metals', key: string | null, called: string): unknown {
  const own = key?.startsWith('own-') ?? false
  const found = useQuery({ ...query('listLibrary', { params: { kind }, query: { q: called.slice(0, 200), limit: 50 } }), enabled: own && called !== '', staleTime: 60_000 })
  return own ? (found.data?.items.find((item) => item.key === key)?.content ?? null) : null
}

const called = ({ specification, grade }: BaseMetal): string => [specification, grade].filter(Boolean).join(' ')

/** The organization's own rows behind two metals and a filler, for the advice on fillers. */
export function useOwnRows(a: BaseMetal, b: BaseMetal, filler: Filler): AdviceLibrary {
  const metals = [useOwnRow('base-metals', a.libraryId, called(a)), useOwnRow('base-metals', b.libraryId, called(b))].flatMap((content) => baseMetalRowSchema.safeParse(content).data ?? [])
  const wire = fillerRowSchema.safeParse(useOwnRow('filler-metals', filler.libraryId, filler.classification ?? '')).data ?? null
  return { metal: (id) => metals.find((row) => row.id === id) ?? null, filler: (id) => (wire?.id === id ? wire : null) }
}
