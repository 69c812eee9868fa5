import { cannotTell } from '../../common/wording.ts'
import type { RuleContext, RuleVerdict } from '../../rule.ts'
import type { Printed } from './joint-details.ts'

export const noPosition = (context: RuleContext): RuleVerdict => {
  const field = `${context.path}.positions`
  return cannotTell('No position is stated, and the limit depends on it.', ['procedure: positions'], { field, fixes: [{ kind: 'state', label: 'State the positions', field }] })
}

/** Least of several printed figures in the judging system, with its place; null when none limits. */
export function tightest<P extends string>(places: readonly P[], limit: (place: P) => Printed | null, system: 'SI' | 'US'): { value: number; place: P } | null {
  let found: { value: number; place: P } | null = null
  for (const place of places) {
    const printed = limit(place)
    if (printed && (!found || printed[system] < found.value)) found = { value: printed[system], place }
  }
  return found
}
