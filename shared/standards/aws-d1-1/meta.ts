import { weakest } from '../common/rule-kinds.ts'
import type { Rule, RuleMeta } from '../rule.ts'
import type { Process } from '../../schemas/welding.ts'
import type { Basis } from '../../schemas/assessment.ts'
import { clauseIn, editionIds } from './editions.ts'
import { variables, type Variable, type VariableRow } from './variables.ts'

const TABLE = 'Table of PQR variables as recalled and as quoted in published reviews and interpretations'

/** Meta of the rule for one row, by the table of variables; basis per process is that of the entry. */
export function meta(variable: Variable, more: Partial<RuleMeta> = {}): RuleMeta {
  const row: VariableRow = variables[variable]
  const processes = Object.keys(row.processes) as Process[]
  const bases = processes.map((process) => row.processes[process] ?? 'memory')
  const strongest: Basis = bases.includes('secondary') ? 'secondary' : 'memory'
  return {
    id: `aws-d1-1/${row.file}`,
    title: row.title,
    standard: 'aws-d1-1',
    // Rows of Table 6.7 differ between editions, so only the table is named.
    clause: row.table === 'Table 6.7' ? row.table : `${row.table} row ${row.row}`,
    editions: editionIds,
    classes: Object.fromEntries(processes.map((process) => [process, row.table === 'Table 6.5' ? 'essential' : 'supplementary'])),
    // The figure is known as well as its best-known entry; the entry of each process shows its own basis.
    basis: strongest,
    classBasis: Object.fromEntries(processes.map((process, i) => [process, weakest(bases[i] ?? 'memory', strongest)])),
    source: row.table === 'Table 6.7' ? `${row.table}, whose rows differ between editions; ${TABLE}` : `${row.table} row ${row.row}; ${TABLE}`,
    statement: row.statement,
    scope: 'process',
    combine: 'each',
    route: 'test',
    ...more,
  }
}

const ARC: readonly Process[] = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW']

/** Meta of a rule that is no row of the table of variables. */
export const ownMeta = (file: string, title: string, clause: string, basis: Basis, source: string, statement: string, more: Partial<RuleMeta> = {}): RuleMeta => ({
  id: `aws-d1-1/${file}`,
  title,
  standard: 'aws-d1-1',
  clause,
  editions: editionIds,
  classes: Object.fromEntries(ARC.map((process) => [process, 'essential'])),
  basis,
  source,
  statement,
  scope: 'process',
  combine: 'each',
  route: 'test',
  ...more,
})

/** Every clause that the rule tells, as the judged edition numbers it. */
export function numbered(rule: Rule): Rule {
  const own = rule.meta.clause
  return {
    ...rule,
    range(context, side) {
      const range = rule.range(context, side)
      return range && { ...range, clause: clauseIn(context.edition, range.clause ?? own) }
    },
    check(context, sides, joined) {
      const judged = rule.check(context, sides, joined)
      if (judged === null) return null
      const clause = clauseIn(context.edition, judged.clause ?? own)
      // Without a clause of its own the verdict stands under the rule's.
      return clause === (judged.clause ?? own) ? judged : { ...judged, clause }
    },
  }
}
