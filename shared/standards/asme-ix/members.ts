/** Names of base metals as the rules compare them: P-Numbers, or the metal itself where it has none. */
import type { BaseMetal, WeldingVariables } from '../../schemas/welding.ts'
import { figures, isStated } from '../common/reading.ts'
import { remember, rememberPair } from '../common/remember.ts'
import type { RangeContext } from '../rule.ts'
import type { Member } from './ranges.ts'

/** `P-1`, `p 5a`, `1` → `1`, `5A`; null where none is recorded. */
export const pNumber = (metal: BaseMetal): string | null => (metal.pNumber ? bareNumber(metal.pNumber) : null)

const bareNumber = remember((written) => {
  const text = written.trim().toUpperCase().replace(/^P(-?\s*NO\.?)?[\s-]*/, '')
  return text === '' ? null : text
})

/** The second member: itself, or the first where nothing is said of a second. */
export function secondMetal(variables: WeldingVariables): BaseMetal {
  const { a, b } = variables.baseMetals
  return b.pNumber || b.uns || b.specification || b.grade ? b : a
}

/** UNS number, or specification and grade; null when the metal isn't named. */
export function identity(metal: BaseMetal): string | null {
  if (metal.uns) return metal.uns.trim().toUpperCase()
  return metal.specification && metal.grade ? `${metal.specification.trim()} ${metal.grade.trim()}` : null
}

/** Leading figure of a P-Number: 5A → 5. */
export const pFamily = (p: string): number => Number.parseInt(p, 10)

/** Higher P-Number first, as in "P-4 to P-1". */
export const byPNumber = (a: string, b: string): number => pFamily(b) - pFamily(a) || b.localeCompare(a)

/** One name for a pair of metals whichever way round it is written. */
export const pairName = rememberPair((a, b) => [a, b].sort(byPNumber).map((p) => `P-${p}`).join(' to '))

/** P-Numbers of both members, those that are known. */
export function pNumbers(variables: WeldingVariables): string[] {
  const a = pNumber(variables.baseMetals.a)
  const b = pNumber(secondMetal(variables))
  return a === null ? (b === null ? [] : [b]) : b === null ? [a] : [a, b]
}

/** Iron-based by P-Number (1 to 15); null when not known. */
export function isFerrous(metal: BaseMetal): boolean | null {
  const p = pNumber(metal)
  return p === null || Number.isNaN(pFamily(p)) ? null : pFamily(p) <= 15
}

/** Whether the first or second member is the thinner or the thicker of two (QW-202.4). */
export function memberOf(context: Pick<RangeContext, 'procedure' | 'system'>, which: 'a' | 'b'): Member {
  const { procedure, system } = context
  if (!procedure || !isStated(procedure.thicknessB)) return 'single'
  const a = figures(procedure.thickness, 'length', system)
  const b = figures(procedure.thicknessB, 'length', system)
  const topA = a.all ? Infinity : (a.max ?? Infinity)
  const topB = b.all ? Infinity : (b.max ?? Infinity)
  const aIsThin = topA < topB || (topA === topB && (a.min ?? 0) <= (b.min ?? 0))
  return (which === 'a') === aIsThin ? 'thin' : 'thick'
}
