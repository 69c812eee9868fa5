/** Words and addresses shared by everything that shows a rule. */
import type { Basis, VariableClass } from '@shared/schemas/assessment.ts'
import { ruleAnchor } from '@shared/standards/catalogue.ts'

/** How a figure is known, in short. */
export const BASIS_WORD: Record<Basis, string> = { read: 'read', secondary: 'secondary source', 'common-practice': 'common practice', memory: 'from memory' }
/** How a figure is known, and what to do about it. */
export const BASIS_SENTENCE: Record<Basis, string> = {
  read: 'Read in the standard.',
  secondary: 'From a secondary source: check it in your edition.',
  'common-practice': 'Common practice, not a rule of the standard.',
  memory: 'From memory: confirm in your edition.',
}

export const RULE_CLASS_WORD: Record<VariableClass | 'dual', string> = {
  essential: 'essential',
  supplementary: 'supplementary essential',
  nonessential: 'nonessential',
  'not-a-variable': 'not a variable',
  dual: 'supplementary essential with toughness, else nonessential',
}

/** The rule's place on its standard's page; null for a finding of the record itself, which no clause makes. */
export function rulePath(standard: string, ruleId: string): string | null {
  return ruleId.startsWith(`${standard}/`) ? `/standards/${standard}#${ruleAnchor(ruleId)}` : null
}
