/** Aluminium alloys by M-Number (secondary; those marked in the comments from memory), fillers by F-Number, and as-welded strength of Table 3.2. */
import type { Basis } from '../../schemas/assessment.ts'
import type { BaseMetal, Filler, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figures, isStated, type Figures } from '../common/reading.ts'

export interface Alloy { alloy: string; temper: string | null }

/** `6061-T6`, `AW-6082 T6`, `EN AW-5083-H111` → alloy and temper; null where no four-figure alloy is named. */
export function readAlloy(metal: BaseMetal): Alloy | null {
  const text = `${metal.grade ?? ''} ${metal.uns ?? ''} ${metal.specification ?? ''}`.toUpperCase()
  const found = /(?:^|[^\d.])(?:A9)?([1-9]\d{3}A?)(?!\d)(?:[\s-]*(O|F|H\d{1,3}|T\d{1,4}))?(?![\dA-Z])/.exec(text)
  if (!found?.[1]) return null
  const stated = metal.condition?.trim().toUpperCase().replace(/^-/, '')
  return { alloy: found[1], temper: stated ? stated : (found[2] ?? null) }
}

const M_NUMBERS: readonly (readonly [string, readonly string[], Basis])[] = [
  ['21', ['1060', '1100', '3003'], 'secondary'],
  ['22', ['3004', '5052', '5154', '5254', '5454', '5652'], 'secondary'],
  ['23', ['6061', '6063'], 'secondary'],
  ['23', ['6005A', '6082', '6351'], 'memory'],
  ['24', ['2219'], 'secondary'],
  ['25', ['5083', '5086', '5456'], 'secondary'],
  ['25', ['5383'], 'memory'],
  ['27', ['7005'], 'secondary'],
]
const BY_ALLOY = new Map(M_NUMBERS.flatMap(([m, alloys, basis]) => alloys.map((alloy) => [alloy, { m, basis }] as const)))

/** M-Number: as the alloy is listed, else as recorded; null where neither tells. */
export function mNumber(metal: BaseMetal): { m: string; basis: Basis } | null {
  const listed = BY_ALLOY.get(readAlloy(metal)?.alloy ?? '')
  if (listed) return listed
  const recorded = /^(?:M-?)?(\d{2})$/i.exec(metal.d12MNumber?.trim() ?? '')?.[1]
  return recorded ? { m: recorded, basis: 'memory' } : null
}

export function secondMetal(variables: WeldingVariables): BaseMetal {
  const { a, b } = variables.baseMetals
  return b.grade || b.uns || b.specification || b.d12MNumber ? b : a
}

export const metals = (variables: WeldingVariables): readonly [BaseMetal, BaseMetal] => [variables.baseMetals.a, secondMetal(variables)]

const F_NUMBERS: readonly (readonly [string, readonly string[]])[] = [
  ['21', ['1100', '1188']],
  ['22', ['5183', '5356', '5554', '5556', '5654']],
  ['23', ['4009', '4010', '4043', '4047', '4145', '4643']],
  ['25', ['2319']],
]
const BY_FILLER = new Map(F_NUMBERS.flatMap(([f, alloys]) => alloys.map((alloy) => [alloy, f] as const)))

/** Alloy of a filler: `ER4043`, `R5356`, `AlMg5 (5356)` → 4043, 5356. */
export const fillerAlloy = (filler: Pick<Filler, 'classification'>): string | null => /(?:^|[^\d])(\d{4})(?!\d)/.exec(filler.classification ?? '')?.[1] ?? null

/** F-Number by the filler's alloy, else as recorded. */
export function fNumber(filler: Pick<Filler, 'classification' | 'fNumber'>): string | null {
  const listed = BY_FILLER.get(fillerAlloy(filler) ?? '')
  return listed ?? /^(?:F-?(?:NO\.?\s*)?)?(\d{2})$/i.exec(filler.fNumber?.trim() ?? '')?.[1] ?? null
}

interface Strength { tempers: readonly string[] | 'any'; US: number; SI: number; basis: Basis }
const strength = (US: number, SI: number, basis: Basis, tempers: Strength['tempers'] = 'any'): Strength => ({ US, SI, basis, tempers })

const TENSILE: Readonly<Record<string, readonly Strength[]>> = {
  '6061': [strength(24, 165, 'secondary', ['T6', 'T651', 'T4'])],
  '5083': [strength(40, 275, 'secondary', ['O', 'H116', 'H321', 'H131']), strength(39, 270, 'secondary', ['H111'])],
  '5086': [strength(35, 240, 'secondary')],
  '5454': [strength(31, 215, 'secondary')],
  '5456': [strength(42, 290, 'secondary', ['H116', 'H321']), strength(41, 285, 'secondary', ['H111', 'H112'])],
  '5052': [strength(25, 170, 'memory')],
  '6063': [strength(17, 115, 'memory', ['T5', 'T6'])],
  '6005A': [strength(24, 165, 'memory', ['T61'])],
  '3003': [strength(14, 95, 'memory')],
  '3004': [strength(22, 150, 'memory')],
  '2219': [strength(35, 240, 'memory')],
  '7005': [strength(40, 275, 'memory')],
}

/** As-welded strength that a groove specimen of the metal must reach, in the system's unit; null when alloy and temper give none. */
export function asWelded(metal: BaseMetal, system: UnitSystem): { value: number; basis: Basis } | null {
  const read = readAlloy(metal)
  const row = read && TENSILE[read.alloy]?.find(({ tempers }) => tempers === 'any' || (read.temper !== null && tempers.includes(read.temper)))
  return row ? { value: row[system], basis: row.basis } : null
}

/** Of two alloys the lower figure (memory); null when one of them gives none. */
export function requiredStrength(variables: WeldingVariables, system: UnitSystem): { value: number; basis: Basis } | null {
  const [a, b] = metals(variables).map((metal) => asWelded(metal, system))
  if (!a || !b) return null
  const lower = a.value <= b.value ? a : b
  return a.value === b.value ? lower : { value: lower.value, basis: 'memory' }
}

/** Alloys of at most 3 % magnesium among those listed; the next line holds those of more (nominal compositions). */
const LOW_MAGNESIUM: ReadonlySet<string> = new Set(['5052', '5454', '5652'])
const HIGH_MAGNESIUM: ReadonlySet<string> = new Set(['5083', '5086', '5456', '5383', '5154', '5254'])

/** Heat-treatable, or 5xxx with over 3 % magnesium: held to a highest temperature; null where the alloy isn't named or its magnesium isn't kept here. */
export function isHeatLimited(metal: BaseMetal): boolean | null {
  const alloy = readAlloy(metal)?.alloy
  if (alloy === undefined) return null
  if (alloy.startsWith('5')) return HIGH_MAGNESIUM.has(alloy) ? true : LOW_MAGNESIUM.has(alloy) ? false : null
  return /^[267]/.test(alloy) ? true : /^[134]/.test(alloy) ? false : null
}

export const thicknessOf = (variables: WeldingVariables, system: UnitSystem): readonly Figures[] => [variables.thickness, variables.thicknessB].filter((interval) => isStated(interval)).map((interval) => figures(interval, 'length', system))
