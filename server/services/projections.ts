import { squeeze } from '@shared/library/search.ts'
import type { AskedMetal } from '@shared/lookup/joint-question.ts'
import type { Interval } from '@shared/schemas/common.ts'
import type { BaseMetal, WeldingVariables } from '@shared/schemas/welding.ts'
import type { Projections } from '../models/projection-columns.ts'

const distinct = <T>(values: readonly T[]): T[] => [...new Set(values)]
const word = (text: string | null): string[] => (text ? [text.toLowerCase()] : [])

/** A written metal with its signs taken out, marked as such: `=a51670`. */
const written = (text: string | null): string[] => (text && squeeze(text) !== '' ? [`=${squeeze(text)}`] : [])

/** Tokens by which a metal that somebody asks for finds the procedures that may cover it: the same row, name or P-Number. */
export const askedMetalTokens = ({ text, libraryIds, pNumber }: AskedMetal): string[] => distinct([...libraryIds.map((id) => `id:${id}`), ...written(text), ...(pNumber ? [`p:${pNumber.toLowerCase()}`] : [])])

/** By what a metal is found: its library row, grade, specification, UNS and P-Number (`p:1`, and `p:1/2` with its group). */
function metalTokens(metal: BaseMetal): string[] {
  const { pNumber, groupNumber } = metal
  return distinct([
    ...word(metal.specification),
    ...word(metal.grade),
    ...word(metal.specification && metal.grade ? `${metal.specification} ${metal.grade}` : null),
    ...word(metal.uns),
    ...(metal.libraryId ? [`id:${metal.libraryId}`] : []),
    ...written(metal.grade),
    ...written(`${metal.specification ?? ''}${metal.grade ?? ''}`),
    ...written(metal.uns),
    ...(pNumber ? [`p:${pNumber.toLowerCase()}`] : []),
    ...(pNumber && groupNumber ? [`p:${pNumber.toLowerCase()}/${groupNumber}`] : []),
    ...(metal.d12MNumber ? [`m:${metal.d12MNumber.toLowerCase()}`] : []),
  ])
}

const metalName = ({ specification, grade, pNumber }: BaseMetal): string => [specification, grade].filter((part) => part).join(' ') || (pNumber ? `P-No. ${pNumber}` : '')

/** The interval that holds all of them, in storage units; `all` is every size. null at an end = not given. */
function hull(intervals: readonly (Interval | null)[]): [number | null, number | null] {
  const given = intervals.filter((one): one is Interval => one !== null && (one.all || one.min !== null || one.max !== null))
  if (given.length === 0) return [null, null]
  if (given.some((one) => one.all)) return [0, null]
  const lows = given.map((one) => one.min?.si ?? null)
  const highs = given.map((one) => one.max?.si ?? null)
  return [lows.includes(null) ? null : Math.min(...(lows as number[])), highs.includes(null) ? null : Math.max(...(highs as number[]))]
}

/** What is searched of a record's content, as columns. */
export function projectionsOf(title: string, variables: WeldingVariables): Projections {
  const { a, b } = variables.baseMetals
  const [thicknessMin, thicknessMax] = hull([variables.thickness, variables.thicknessB])
  const [diameterMin, diameterMax] = hull([variables.diameter])
  return {
    title,
    processes: distinct(variables.processes.flatMap(({ process }) => (process ? [process] : []))),
    metals: distinct([...metalTokens(a), ...metalTokens(b)]),
    metalsLabel: distinct([metalName(a), metalName(b)].filter((name) => name !== '')).join(' to '),
    positions: distinct(variables.processes.flatMap(({ positions }) => positions)),
    standards: distinct(variables.standards.map(({ standard }) => standard)),
    weld: variables.joint.weld,
    thicknessMin,
    thicknessMax,
    diameterMin,
    diameterMax,
  }
}
