import type { Finding } from '../../schemas/assessment.ts'

export type { Fix, NumericRange, QualifiedSpan, SetRange } from '../../schemas/assessment.ts'
export type RuleVerdictAsked = Finding['asked']
