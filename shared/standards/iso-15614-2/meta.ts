import type { Process } from '../../schemas/welding.ts'
import type { RuleMeta } from '../rule.ts'
import { editionIds } from './editions.ts'

export const PROCESSES: readonly Process[] = ['GMAW', 'GTAW', 'PAW']

export type Given = Pick<RuleMeta, 'title' | 'clause' | 'statement'> & Partial<Omit<RuleMeta, 'classes' | 'id'>> & { processes?: readonly Process[] }

/** Meta of one rule; everything here is essential, since the standard does not part its variables by impact requirements. */
export function meta(file: string, { processes = PROCESSES, ...given }: Given): RuleMeta {
  return {
    id: `iso-15614-2/${file}`,
    standard: 'iso-15614-2',
    editions: editionIds,
    classes: Object.fromEntries(processes.map((process) => [process, 'essential'])),
    basis: 'memory',
    source: `ISO 15614-2:2005, ${given.clause} (recalled; beside it EN 288-4 from a handbook)`,
    scope: 'process',
    combine: 'each',
    ...given,
  }
}
