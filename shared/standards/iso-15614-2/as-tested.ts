/** Variables of which only "as tested" is sure: whatever differs must be looked up, save where the standard is known to close it. */
import type { ProcessBlock, WeldingVariables } from '../../schemas/welding.ts'
import { nameBandRule, type NameBand } from '../common/review-band.ts'
import type { Rule } from '../rule.ts'
import { meta } from './meta.ts'

export interface AsTested {
  /** Last part of the rule's id. */
  file: string
  title: string
  clause: string
  field: string
  at: 'weld' | 'block'
  label: string
  statement: string
  /** The name that a record gives; null = not stated, undefined = does not arise on this coupon. */
  read: (variables: WeldingVariables, block: ProcessBlock) => string | null | undefined
  covers?: (value: string) => NameBand
  applies?: (variables: WeldingVariables, block: ProcessBlock) => boolean
  processes?: readonly ('GMAW' | 'GTAW' | 'PAW')[]
}

/** The tested name is sure, any other must be looked up. @param why as a sentence */
export const sameOnly = (why: string) => (value: string): NameBand => ({ sure: [value], maybe: 'any', why })

/** A rule of that kind. */
export const asTested = (row: AsTested): Rule =>
  nameBandRule({
    meta: meta(row.file, { title: row.title, clause: row.clause, statement: row.statement, ...(row.processes ? { processes: row.processes } : {}) }),
    field: row.field,
    at: row.at,
    label: row.label,
    applies: row.applies && ((context) => context.block !== null && row.applies?.(context.procedure, context.block) !== false),
    asked(context) {
      const value = context.block && row.read(context.procedure, context.block)
      return value ? [value] : null
    },
    tested(_context, side) {
      const value = side.block ? row.read(side.variables, side.block) : null
      return value === undefined ? undefined : value === null ? null : [value]
    },
    covers: (value) => (row.covers ?? sameOnly(`What a change of ${row.label} does is not held here.`))(value[0] ?? ''),
    because: 'As tested is covered.',
  })
