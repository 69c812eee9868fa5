import type { RuleMeta } from '../rule.ts'
import { editionsUntil } from './editions.ts'
import { variables, type Paragraph, type VariableRow } from './variables.ts'

const TABLES = 'Section IX tables QW-253 to QW-257, class letters from published checklists'

/**
 * Meta of the rule for one paragraph, from the table of variables.
 * @param file name of the rule's file or its name within it, last part of the rule's id
 */
export function meta(paragraph: Paragraph, file: string, more: Partial<RuleMeta> = {}): RuleMeta {
  const row: VariableRow = variables[paragraph]
  return {
    id: `asme-ix/${file}`,
    title: row.title,
    standard: 'asme-ix',
    clause: paragraph,
    editions: editionsUntil(row.until),
    classes: row.classes,
    basis: row.basis,
    classBasis: row.classBasis,
    source: `${paragraph}; ${TABLES}`,
    statement: row.statement,
    scope: 'process',
    combine: 'each',
    ...more,
  }
}
