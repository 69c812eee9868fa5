import type { Finding } from '../../schemas/assessment.ts'

export type { Fix, NumericRange, QualifiedSpan, Segment, SetRange } from '../../schemas/assessment.ts'
export type RuleVerdictAsked = Finding['asked']
