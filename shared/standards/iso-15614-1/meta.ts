import type { Process } from '../../schemas/welding.ts'
import type { RuleClass, RuleMeta } from '../rule.ts'
import { editionIds } from './editions.ts'

export const PROCESSES: readonly Process[] = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW']
const TEXT = 'ISO 15614-1:2017'

export type Given = Pick<RuleMeta, 'title' | 'clause' | 'basis' | 'statement'> & Partial<Omit<RuleMeta, 'classes' | 'id'>> & { processes?: readonly Process[]; class?: RuleClass }

/**
 * Meta of one rule. ISO has no essential and supplementary variables: a rule is `essential` where the standard always limits the range, and
 * `supplementary` where the limit binds only with impact requirements; its statement says so.
 * @param file last part of the rule's id
 */
export function meta(file: string, { processes = PROCESSES, class: ruleClass = 'essential', ...given }: Given): RuleMeta {
  return {
    id: `iso-15614-1/${file}`,
    standard: 'iso-15614-1',
    editions: editionIds,
    classes: Object.fromEntries(processes.map((process) => [process, ruleClass])),
    source: `${TEXT}, ${given.clause}${given.basis === 'read' ? ' (read in the 2004 text, from which level 2 descends)' : given.basis === 'secondary' ? ' (quotations and summaries)' : ' (recalled)'}`,
    scope: 'process',
    combine: 'each',
    ...given,
  }
}
