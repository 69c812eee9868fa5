import type { ProcessBlock } from '../../schemas/welding.ts'
import type { RuleContext } from '../rule.ts'

/** Whether a block has supplemental filler; null when it isn't said. */
export const hasSupplement = (block: ProcessBlock | null): boolean | null => block?.filler.supplemental ?? null

/** The procedure asks for supplemental filler. */
export const asksSupplement = (context: RuleContext): boolean => hasSupplement(context.block) === true
