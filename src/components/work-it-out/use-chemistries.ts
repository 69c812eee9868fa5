import { useQueries } from '@tanstack/react-query'
import { useState } from 'react'
import { ELEMENTS, ELEMENT_SYMBOLS, type Chemistry, type Element } from '@shared/calculations/chemistry.ts'
import type { Chemistries } from '@shared/calculations/from-record.ts'
import type { HeatRow } from '@shared/schemas/heats.ts'
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { useMay } from '@/hooks/session.ts'
import { query } from '@/lib/query.ts'

export type Part = 'a' | 'b' | 'filler'
export interface Analyses {
  part: Part
  label: string
  /** Heats or lots of that grade with an analysis. */
  heats: readonly HeatRow[]
  chosen: HeatRow | null
}

const BY_SYMBOL = new Map(ELEMENTS.map((element) => [ELEMENT_SYMBOLS[element], element]))
/** A certificate's analysis as the calculations read it; elements that no formula knows are left out. */
const analysisOf = ({ chemistry }: Pick<HeatRow, 'chemistry'>): Chemistry => Object.fromEntries(chemistry.flatMap(({ element, percent }): [Element, number][] => (BY_SYMBOL.has(element) ? [[BY_SYMBOL.get(element) as Element, percent]] : [])))

/** The heat that the record names, else the only one of its grade; with several, somebody chooses. */
const usual = (heats: readonly HeatRow[], number: string | null): HeatRow | null => heats.find((heat) => number !== null && heat.number === number) ?? (heats.length === 1 ? (heats[0] ?? null) : null)

/**
 * Analyses of the weld's metals from the heats and lots that the firm keeps.
 * @param enabled reads them only once somebody works something out
 */
export function useChemistries({ baseMetals: { a, b } }: WeldingVariables, block: ProcessBlock | null, enabled: boolean): { chemistries: Chemistries; analyses: Analyses[]; choose: (part: Part, id: string) => void } {
  const may = useMay('heats.read')
  const [picked, setPicked] = useState<Partial<Record<Part, string>>>({})
  const sameMetal = b.libraryId !== null && b.libraryId === a.libraryId && b.heatNumber === a.heatNumber
  const parts: readonly { part: Part; label: string; libraryId: string | null; number: string | null }[] = [
    { part: 'a', label: 'Analysis of metal A', libraryId: a.libraryId, number: a.heatNumber },
    { part: 'b', label: 'Analysis of metal B', libraryId: sameMetal ? null : b.libraryId, number: b.heatNumber },
    { part: 'filler', label: 'Analysis of the filler', libraryId: block?.filler.libraryId ?? null, number: block?.filler.lot ?? null },
  ]
  const ids = [...new Set(parts.map(({ libraryId }) => libraryId).filter((id) => id !== null))]
  const lists = useQueries({ queries: (enabled && may ? ids : []).map((libraryId) => ({ ...query('listHeats', { query: { libraryId, limit: 50 } }), staleTime: 60_000 })) })
  const listOf = (libraryId: string | null) => (libraryId === null ? [] : (lists[ids.indexOf(libraryId)]?.data?.items ?? []))
  const analyses = parts.flatMap(({ part, label, libraryId, number }): Analyses[] => {
    const heats = listOf(libraryId).filter(({ chemistry }) => chemistry.length > 0)
    const own = picked[part]
    return heats.length === 0 ? [] : [{ part, label, heats, chosen: own === undefined ? usual(heats, number) : (heats.find(({ id }) => id === own) ?? null) }]
  })
  const chosenOf = (part: Part) => analyses.find((each) => each.part === part)?.chosen
  const of = (part: Part): Chemistry | null => {
    const chosen = chosenOf(part)
    return chosen ? analysisOf(chosen) : null
  }
  const names = Object.fromEntries(parts.flatMap(({ part }): [Part, string][] => {
    const chosen = chosenOf(part === 'b' && sameMetal ? 'a' : part)
    return chosen ? [[part, `${chosen.kind} ${chosen.number}`]] : []
  }))
  return { analyses, choose: (part, id) => setPicked((before) => ({ ...before, [part]: id })), chemistries: { a: of('a'), b: sameMetal ? of('a') : of('b'), filler: of('filler'), names } }
}
