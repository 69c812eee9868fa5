import type { Basis } from '../../schemas/assessment.ts'
import type { Process } from '../../schemas/welding.ts'
import type { RuleMeta } from '../rule.ts'

/** The one edition of which anything is known here. */
export const editions = [{ id: '2014', label: '2014', note: 'Percentage figures and the thickness table could not be confirmed; what depends on them can\'t be told.' }] as const

export const PROCESSES: readonly Process[] = ['GMAW', 'GTAW', 'PAW', 'SMAW']

/** Meta of a rule; every variable that is named is treated as essential, as the list of Table 3.1 is known only in part. */
export const meta = (file: string, title: string, clause: string, basis: Basis, source: string, statement: string, more: Partial<RuleMeta> = {}): RuleMeta => ({
  id: `aws-d1-2/${file}`,
  title,
  standard: 'aws-d1-2',
  clause,
  editions: editions.map(({ id }) => id),
  classes: Object.fromEntries(PROCESSES.map((process) => [process, 'essential'])),
  basis,
  source,
  statement,
  scope: 'process',
  combine: 'each',
  route: 'test',
  ...more,
})

export const TABLE = 'Table 3.1 as listed in part in course notes and as recalled'
