import type { Rule } from '../../rule.ts'
export const prequalifiedRules: readonly Rule[] = []
