import type { Signature } from '../schemas/records.ts'

export interface StatementFacts {
  meaning: Signature['meaning']
  /** e.g. "WPS-004 revision B" or "PQR-002" */
  record: string
  name: string
  role: string
  /** Findings that were accepted with a reason. */
  deviations?: number
}

const plural = (count: number, one: string, many: string): string => `${count} ${count === 1 ? one : many}`

/** What the act says, in the first person; shown before signing and kept word for word with the signature. */
export function statementOf({ meaning, record, name, role, deviations = 0 }: StatementFacts): string {
  const who = `I, ${name}, acting as ${role},`
  switch (meaning) {
    case 'authored':
      return `${who} wrote ${record} and send it for review.`
    case 'reviewed':
      return `${who} reviewed ${record}.`
    case 'returned':
      return `${who} return ${record} to its author for change.`
    case 'approved':
      return deviations > 0
        ? `${who} approve ${record} for production, accepting ${plural(deviations, 'finding', 'findings')} for the reason recorded with it.`
        : `${who} approve ${record} for production. Every finding is within what its coupons qualify.`
    case 'withdrawn':
      return `${who} withdraw ${record}; it is no longer to be welded by.`
    case 'certified':
      return `${who} certify that the statements in ${record} are correct and that the coupon was welded and tested as recorded.`
    case 'rejected':
      return `${who} reject ${record}; it qualifies nothing.`
  }
}

/** A record's name as it stands in a statement. */
export const revisionName = (number: string, revision: string): string => `${number} revision ${revision}`
