/** Base metals of a draft with the groups in which they stand, and what follows from thickness and hydrogen. */
import type { ProcessBlock } from '../../../schemas/welding.ts'
import { cannotTell } from '../../common/wording.ts'
import type { RuleContext, RuleVerdict } from '../../rule.ts'
import { isLowHydrogen } from '../fillers.ts'
import { groupsOf, identity, members, type Group } from '../steels.ts'

export interface Read { groups: readonly Group[] | null; name: string | null; field: string }

export const readMetals = (context: RuleContext): Read[] =>
  members(context.procedure, context.system).map(({ metal, thickness }, i) => ({ groups: groupsOf(metal, thickness, context.system), name: identity(metal), field: `baseMetals.${i === 0 ? 'a' : 'b'}.specification` }))

/** Names a metal that gives no group; null when both give one. */
export function unread(metals: readonly Read[], what: string): RuleVerdict | null {
  const first = metals.find(({ groups }) => groups === null)
  if (!first) return null
  const sentence = first.name === null ? `The base metal isn't named, so ${what} can't be told.` : `${first.name} is not in the list of steels kept here; only a listed steel is prequalified, so look it up in your edition.`
  return cannotTell(sentence, [`procedure: ${first.field}`], { field: first.field, fixes: [{ kind: 'state', label: 'State the base metal or its D1.1 group', field: first.field }] })
}

/** Every process but SMAW counts as low-hydrogen here; SMAW by its electrode. */
export const lowHydrogenProcess = (block: ProcessBlock): boolean | null => (block.process === 'SMAW' ? isLowHydrogen(block.filler) : true)

/** Thickest part at the point of welding over what is asked; Infinity where every thickness is. */
export function thickest(context: RuleContext): number | null {
  const tops = members(context.procedure, context.system).map(({ thickness }) => (thickness.fault ? null : thickness.all ? Infinity : (thickness.max ?? thickness.min)))
  return tops.some((top) => top === null) ? null : Math.max(...tops.filter((top) => top !== null))
}

/** Least thickness that decides: the thinner part for low-hydrogen processes, else the thicker one; from least and greatest asked. */
export function decidingThickness(context: RuleContext, lowHydrogen: boolean): { low: number; high: number; thinner: number } | null {
  const both = members(context.procedure, context.system).map(({ thickness }) => (thickness.fault ? null : { low: thickness.all ? 0 : (thickness.min ?? thickness.max), high: thickness.all ? Infinity : (thickness.max ?? thickness.min) }))
  const [a, b] = both
  if (!a || !b || a.low === null || a.high === null || b.low === null || b.high === null) return null
  const pick = lowHydrogen ? Math.min : Math.max
  return { low: pick(a.low, b.low), high: pick(a.high, b.high), thinner: Math.min(a.high, b.high) }
}
