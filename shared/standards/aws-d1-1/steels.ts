/**
 * Steels of Table 5.3 by group, code-approved steels of Table 6.9, and the preheat categories of Table 5.8.
 * Group I was read in the 2015 edition; the other lists are from memory and not complete.
 */
import type { Basis } from '../../schemas/assessment.ts'
import type { Quantity } from '../../schemas/common.ts'
import type { BaseMetal, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figures, isStated, type Figures } from '../common/reading.ts'
import { remember } from '../common/remember.ts'

export type Group = 'I' | 'II' | 'III' | 'IV' | 'PQR'

const LIST: readonly (readonly [Group, string])[] = [
  ['I', 'A36; A53 B; A106 B; A131 A,B,CS,D,DS,E; A139 B; A381 Y35; A500 A,B,C; A501 A; A516 55,60; A524 I,II; A573 58,65; A709 36; A1008 SS30,SS33-1,SS40-1; A1011 SS30,SS33,SS36-1,SS40,SS45; A1018 SS30,SS33,SS36,SS40; API5L B,X42; ABS A,B,D,CS,DS,E'],
  ['II', 'A131 AH32,DH32,EH32,AH36,DH36,EH36; A501 B; A516 65,70; A529 50,55; A537 1; A572 42,50,55; A588; A606; A618; A633 A,C,D; A709 50,50W,50S,HPS50W; A913 50; A992; A1085; API2H 42,50; API2W 42,50; API2Y 42,50; API5L X52'],
  ['III', 'A572 60,65; A537 2; A633 E; A710 A2,A3; A913 60,65; API2W 60; API2Y 60'],
  ['IV', 'A709 HPS70W; A913 70'],
  ['PQR', 'A514; A517; A709 HPS100W; A1043'],
]

/** Specification as the list writes it: A572, API5L. */
export const specKey = (metal: BaseMetal): string | null => (metal.specification ? plainSpecification(metal.specification) : null)

const plainSpecification = remember((specification) => {
  const plain = specification.toUpperCase().replace(/\b(ASTM|ASME)\b/g, '').replace(/:.*$/, '').replace(/\s+/g, '').replace(/^A\/S?A-?/, 'A').replace(/^SA-?/, 'A').replace(/^(A)-/, '$1').replace(/\/S?A-?\d+M?$/, '')
  return plain.replace(/^(A\d+)M$/, '$1')
})

/** Grade without the words around it: `Type E Gr. B` → B, `Grade 50` → 50, `HPS 70W` → HPS70W; '' where there is none. */
export const gradeKey = (metal: BaseMetal): string => plainGrade(metal.grade ?? '')

const plainGrade = remember((grade) => {
  const text = grade.toUpperCase().replace(/\(.*?\)/g, ' ').replace(/—/g, ' ').replace(/\bTYPE\s+[ESF]\b/g, ' ').replace(/\b(GRADE|GR|CLASS|CL|TYPE)\b\.?/g, ' ').replace(/\/\s*L\d+/, ' ')
  return text.replace(/\s+/g, '')
})

const BY_KEY = new Map<string, Group>()
for (const [group, list] of LIST) {
  for (const entry of list.split('; ')) {
    const [spec = '', grades = ''] = entry.split(' ')
    for (const grade of grades === '' ? [''] : grades.split(',')) BY_KEY.set(`${spec} ${grade}`, group)
  }
}

/** Listed in Group I up to 20 mm (3/4 in.) and in Group II above (read 2015). */
const splits = (metal: BaseMetal): boolean => {
  const spec = specKey(metal)
  return spec === 'A36' || (spec === 'A709' && gradeKey(metal) === '36')
}
export const SPLIT = { SI: 20, US: 0.75 } as const
/** A710 Grade A class 2 is listed up to 2 in. (memory; 50 mm is its usual twin). */
const A710_TOP = { SI: 50, US: 2 } as const

/** As the list has it, whatever the thickness; null where the list kept here does not name it. */
export function listedGroup(metal: BaseMetal): Group | null {
  const spec = specKey(metal)
  if (spec === null) return null
  return BY_KEY.get(`${spec} ${gradeKey(metal)}`) ?? BY_KEY.get(`${spec} `) ?? null
}

const GROUP_TEXT: Readonly<Record<string, Group>> = { I: 'I', II: 'II', III: 'III', IV: 'IV', '1': 'I', '2': 'II', '3': 'III', '4': 'IV' }

/**
 * Groups that a metal may stand in over a span of thickness; both I and II where the span crosses the dividing thickness.
 * @returns null when it is neither recorded nor listed, or when the thickness that divides the groups is not known
 */
export function groupsOf(metal: BaseMetal, thickness: Figures, system: UnitSystem): readonly Group[] | null {
  const recorded = metal.d11Group ? GROUP_TEXT[metal.d11Group.trim().toUpperCase().replace(/^GROUP\s*/, '')] : undefined
  const group = listedGroup(metal) ?? recorded ?? null
  if (group === null) return null
  const top = thickness.all ? Infinity : (thickness.max ?? thickness.min)
  if (identity(metal) === 'A710 A2' && top !== null && top > A710_TOP[system]) return null
  if (!splits(metal)) return [group]
  if (thickness.all) return ['I', 'II']
  const low = thickness.min ?? thickness.max
  const high = thickness.max ?? thickness.min
  if (low === null || high === null) return null
  return low > SPLIT[system] ? ['II'] : high <= SPLIT[system] ? ['I'] : ['I', 'II']
}

export const groupBasis = (group: Group): Basis => (group === 'I' ? 'read' : 'memory')

/** The second member: itself, or the first where nothing is said of a second. */
export function secondMetal(variables: WeldingVariables): BaseMetal {
  const { a, b } = variables.baseMetals
  return b.specification || b.grade || b.uns || b.d11Group ? b : a
}

/** The system in which a stress was typed: the printed pairs of strengths are rounded, not converted. */
export const systemOf = (quantity: Pick<Quantity, 'unit'>): UnitSystem => (quantity.unit === 'ksi' || quantity.unit === 'psi' ? 'US' : 'SI')

/** Both members with the thickness of each. */
export function members(variables: WeldingVariables, system: UnitSystem): readonly [{ metal: BaseMetal; thickness: Figures }, { metal: BaseMetal; thickness: Figures }] {
  const a = figures(variables.thickness, 'length', system)
  const b = isStated(variables.thicknessB) ? figures(variables.thicknessB, 'length', system) : a
  return [{ metal: variables.baseMetals.a, thickness: a }, { metal: secondMetal(variables), thickness: b }]
}

/** Specification and grade as one name, e.g. `A572 65`; null where the metal isn't named. */
export function identity(metal: BaseMetal): string | null {
  const spec = specKey(metal)
  const grade = gradeKey(metal)
  if (spec !== null) return grade ? `${spec} ${grade}` : spec
  return metal.uns ? metal.uns.trim().toUpperCase() : null
}

const CATEGORY_C: ReadonlySet<string> = new Set(['A572 60', 'A572 65', 'A633 E', 'A913 60', 'A913 65', 'A710 A2', 'A710 A3', 'API5L X52', 'API2W 60', 'API2Y 60', 'A709 HPS70W'])
const CATEGORY_D: ReadonlySet<string> = new Set(['A710 A', 'A710 A2', 'A710 A3', 'A913 50', 'A913 60', 'A913 65'])
const CATEGORY_A_EXTRA: ReadonlySet<string> = new Set(['A1011 50', 'A1011 55', 'A1011 SS50', 'A1011 SS55'])

export type Category = 'A' | 'B' | 'C' | 'D'

/**
 * Preheat category of Table 5.8 for a steel. A steel of C that is also in D takes D only with consumables of H8 or less.
 * @param lowHydrogen of the process: false for SMAW with other electrodes, null when not known
 * @param hydrogen designator of the consumable in mL/100 g, null when none is stated
 */
export function preheatCategory(metal: BaseMetal, groups: readonly Group[], lowHydrogen: boolean | null, hydrogen: number | null): { category: Category; basis: Basis } | null {
  const name = identity(metal) ?? ''
  if (lowHydrogen === null) return null
  if (!lowHydrogen) return groups.every((group) => group === 'I' || splits(metal)) || CATEGORY_A_EXTRA.has(name) ? { category: 'A', basis: 'read' } : null
  if (CATEGORY_D.has(name) && hydrogen !== null && hydrogen <= 8) return { category: 'D', basis: 'memory' }
  if (CATEGORY_C.has(name)) return { category: 'C', basis: 'secondary' }
  return groups.every((group) => group === 'I' || group === 'II') ? { category: 'B', basis: 'read' } : null
}
