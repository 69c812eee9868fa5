/** The checks of a reviewer (AF-…) in the engine's own terms: which rule, test or entry of a coupon says each of them. */
import type { Assessment, CouponQualification, TestVerdict } from '@shared/schemas/assessment.ts'

/** Rules whose finding, when it is not within, is that check. Ids without the standard: the check is the same under each. */
const RULES: Readonly<Record<string, readonly string[]>> = {
  'AF-02': ['certification'],
  'AF-20': ['base-metal-thickness', 'base-metal-thickness-second', 'thickness'],
  'AF-21': ['deposit-thickness'],
  'AF-22': ['short-circuit-thickness', 'short-circuit-deposit'],
  'AF-23': ['pass-thickness'],
  'AF-24': ['base-metal-p-number', 'base-metal-p-number-plasma', 'base-metal-group', 'base-metal'],
  'AF-25': ['filler-f-number'],
  'AF-26': ['filler-a-number'],
  'AF-27': ['filler-classification', 'flux-wire-classification'],
  'AF-28': ['filler-product-form'],
  'AF-30': ['shielding-gas'],
  'AF-32': ['backing-gas-special-metals'],
  'AF-33': ['preheat'],
  'AF-34': ['interpass'],
  'AF-35': ['pwht-condition'],
  'AF-36': ['heat-input'],
  'AF-37': ['transfer-mode'],
  'AF-38': ['current-type'],
  'AF-43': ['vertical-uphill'],
  'AF-45': ['toughness-tests'],
  'AF-46': ['toughness-thickness', 'toughness-thickness-second'],
  'AF-47': ['joint-filled'],
  'AF-49': ['passes-per-side', 'electrode-number'],
}

export interface Found {
  check: string
  severity: 'blocker' | 'major' | 'minor'
  /** What says it, for a failing test. */
  from: string
}

/** Checks that an assessment reports: findings that block, because they are not within and their class counts. */
export function checksOfAssessment({ findings }: Assessment): Found[] {
  return findings
    .filter(({ verdict, class: of }) => verdict !== 'within' && (of === 'essential' || of === 'supplementary'))
    .map(({ ruleId, sentence }) => {
      const rule = ruleId.split('/')[1] ?? ruleId
      const check = Object.entries(RULES).find(([, rules]) => rules.includes(rule))?.[0] ?? `no check for ${ruleId}`
      return { check, severity: 'blocker', from: `${ruleId}: ${sentence}` }
    })
}

/** A tension specimen that failed (AF-53), or whose stress does not follow from load and area (AF-52). */
export function checksOfQualification({ results, missing, specimens }: CouponQualification): Found[] {
  const failed = results.filter(({ verdict, clause }) => verdict === 'fail' && clause.startsWith('QW-153'))
  const short = specimens.filter(({ required, recorded }) => recorded < required)
  return [
    ...short.map(({ label, required, recorded }): Found => ({ check: 'AF-51', severity: 'blocker', from: `${label}: ${recorded} of ${required}` })),
    ...missing.filter(({ clause }) => clause === 'QW-152').map(({ message }): Found => ({ check: 'AF-52', severity: 'major', from: message })),
    ...failed.map(({ sentence }: TestVerdict): Found => ({ check: 'AF-53', severity: 'blocker', from: sentence })),
  ]
}

/** The verdict on a set as reviewers put it: a blocker or a major finding makes it not acceptable. */
export const verdictOf = (found: readonly Found[]): string => (found.some(({ severity }) => severity !== 'minor') ? 'not-acceptable' : found.length > 0 ? 'acceptable-with-remarks' : 'acceptable')
