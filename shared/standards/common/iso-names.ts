/** What ISO welding standards call things: process numbers of ISO 4063, positions of ISO 6947, gas symbols of ISO 14175, groups of ISO/TR 15608. */
import { classifyGas } from '../../library/gases.ts'
import { isoPosition } from '../../library/positions.ts'
import type { BaseMetal, GasMixture, ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import type { Interval, Quantity } from '../../schemas/common.ts'
import type { Dimension } from '../../units/types.ts'
import { figureOrNull, figures, gasName, isInert, isNoGas, sameText, single, type Figures } from './reading.ts'

/** ISO prints SI only: every figure is judged in mm, °C, kJ/mm and MPa, whatever units the record is written in. */
export const siFigures = (interval: Interval | null | undefined, dimension: Dimension): Figures => figures(interval, dimension, 'SI')
export const siSingle = (interval: Interval | null | undefined, dimension: Dimension): number | null => single(interval, dimension, 'SI')
export const siFigure = (value: Quantity | null | undefined, dimension: Dimension): number | null => figureOrNull(value, dimension, 'SI')

/** An interval asked of a procedure; one figure typed alone is that figure, not "from there on". */
export function askedInterval(interval: Interval | null | undefined, dimension: Dimension): { min: number | null; max: number | null } | null | 'fault' {
  const read = siFigures(interval, dimension)
  if (read.fault) return 'fault'
  if (read.all) return { min: null, max: null }
  if (read.min === null && read.max === null) return null
  return { min: read.min ?? read.max, max: read.max ?? read.min }
}

const GAS_SHIELDED = { solid: ['131', '135'], 'metal-cored': ['133', '138'], 'flux-cored': ['132', '136'] } as const

/**
 * ISO 4063 number of a process block, from its process, product form and gas; `15` and `12` groups without variants that the record can't tell.
 * @returns null where the record does not say enough
 */
export function isoProcessNumber(block: ProcessBlock): string | null {
  const { process, filler, shieldingGas } = block
  const form = filler.productForm
  if (process === 'SMAW') return '111'
  if (process === 'PAW') return '15'
  if (process === 'SAW') {
    if (filler.supplemental === true) return '124'
    return form === 'solid' ? '121' : form === 'flux-cored' || form === 'metal-cored' ? '125' : null
  }
  if (process === 'GTAW') {
    const reducing = shieldingGas?.components.some(({ gas, percent }) => gas === 'H2' && percent > 0) ?? false
    if (filler.added === false) return '142'
    if (form === 'flux-cored' || form === 'metal-cored') return reducing ? '146' : '143'
    return form === 'solid' || form === 'insert' ? (reducing ? '145' : '141') : null
  }
  if (process === 'FCAW' && shieldingGas && isNoGas(shieldingGas)) return '114'
  if (process === 'GMAW' || process === 'FCAW') {
    const inert = isInert(shieldingGas)
    const pair = form === 'solid' || form === 'metal-cored' || form === 'flux-cored' ? GAS_SHIELDED[form] : null
    return inert === null || pair === null ? null : inert ? pair[0] : pair[1]
  }
  return null
}

/** Process factor k of ISO/TR 17671-1 and EN 1011-1 (memory; also on public pages): 121 1.0; 141, 142, 15 0.6; the others here 0.8. */
export const processFactor = (block: ProcessBlock): number => (block.process === 'SAW' ? 1 : block.process === 'GTAW' || block.process === 'PAW' ? 0.6 : 0.8)

/** ISO 6947 symbols of a block's positions; null where none is stated or a vertical one lacks its direction. */
export function isoPositions(variables: WeldingVariables, block: ProcessBlock): string[] | null {
  if (block.positions.length === 0) return null
  const symbols: string[] = []
  for (const position of block.positions) {
    const weld = position.includes('F') ? 'fillet' : 'groove'
    const known = isoPosition(position, weld, variables.product, block.progression)
    const read = known.iso.length > 0 ? known : isoPosition(position, weld, null, block.progression)
    if (!read.decided && block.progression === null && read.iso.some((symbol) => DOWNWARD.has(symbol))) return null
    symbols.push(...read.iso)
  }
  return [...new Set(symbols)]
}

/** Vertical and pipe positions welded downwards. */
export const DOWNWARD: ReadonlySet<string> = new Set(['PG', 'PJ', 'J-L045'])

const symbols = new Map<string, string | null>()
const MOST_SYMBOLS = 500

/** Symbol of a composition, worked out once for each. */
function symbolOf(components: GasMixture['components']): string | null {
  let key = ''
  for (const { gas, percent } of components) key += `${gas} ${percent};`
  let symbol = symbols.get(key)
  if (symbol === undefined) {
    if (symbols.size >= MOST_SYMBOLS) symbols.clear()
    symbol = classifyGas(components).symbol
    symbols.set(key, symbol)
  }
  return symbol
}

/** The symbol, `none`, or `Z` with the composition; null where neither composition nor symbol says. */
export function gasSymbol(gas: GasMixture | null): string | null {
  if (!gas) return null
  if (isNoGas(gas)) return 'none'
  const symbol = symbolOf(gas.components)
  if (symbol === 'Z') return `Z (${gasName(gas) ?? 'mixture'})`
  if (symbol) return symbol
  const written = /(?:^|[\s-])([A-Z]\d{0,2})(?:$|[\s-])/.exec((gas.isoSymbol ?? '').trim().toUpperCase().replace(/^ISO\s*14175[\s-]*/, ''))?.[1] ?? null
  return gas.components.length === 0 && written !== 'Z' ? written : null
}

export interface MaterialGroup { main: number; sub: number | null; text: string }

/** `1.2`, `Group 8.1`, `22.4`; null where none is recorded or it can't be read. */
export function materialGroup(metal: BaseMetal): MaterialGroup | null {
  const match = /(\d{1,2})(?:\.(\d{1,2}))?/.exec(metal.iso15608 ?? '')
  if (!match?.[1]) return null
  return { main: Number(match[1]), sub: match[2] === undefined ? null : Number(match[2]), text: match[0] }
}

/** How many sub-groups ISO/TR 15608 gives to each group; none of those that stand whole. */
const SUB_GROUPS: ReadonlyMap<number, number> = new Map([[1, 4], [2, 2], [3, 3], [4, 2], [5, 4], [6, 4], [7, 3], [8, 3], [9, 3], [10, 3], [11, 3], [21, 0], [22, 4], [23, 2], [24, 2], [25, 0], [26, 0], [41, 0], [42, 0], [43, 0], [44, 0], [45, 0], [46, 0], [47, 0], [48, 0]])

/** Whether ISO/TR 15608 parts this group into sub-groups. */
export const hasSubGroups = (main: number): boolean => (SUB_GROUPS.get(main) ?? 0) > 0

/** The first group of either member that is none of those wanted, or a sub-group that there is not; null where both fit or none is recorded. */
export function strangeGroup(variables: WeldingVariables, wanted: (main: number) => boolean): string | null {
  for (const metal of [variables.baseMetals.a, secondMember(variables)]) {
    const group = materialGroup(metal)
    if (group && !(wanted(group.main) && SUB_GROUPS.has(group.main) && (group.sub === null || (group.sub >= 1 && group.sub <= (SUB_GROUPS.get(group.main) ?? 0))))) return group.text
  }
  return null
}

/** The second member: itself, or the first where nothing is said of a second. */
export function secondMember(variables: WeldingVariables): BaseMetal {
  const { a, b } = variables.baseMetals
  return b.iso15608 || b.uns || b.specification || b.grade ? b : a
}

/** What names the metal by itself: its number, or specification and grade. */
export function metalName(metal: BaseMetal): string | null {
  if (metal.specification && metal.grade) return sameText(`${metal.specification} ${metal.grade}`)
  return metal.uns ? sameText(metal.uns) : null
}

export const hasImpactTests = (content: { toughness: readonly { values: readonly unknown[] }[] }): boolean => content.toughness.some((test) => test.values.length > 0)
export const hasHardnessTests = (content: { hardness: readonly { values: readonly unknown[] }[] }): boolean => content.hardness.some((test) => test.values.length > 0)
