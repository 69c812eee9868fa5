import { useCallback, useEffect, useEffectEvent, useRef } from 'react'
import type { Fix } from '@shared/schemas/assessment.ts'
import { say } from '@/components/toast.tsx'
import { applyFix, undoFix, type AppliedFix } from './fixes.ts'
import { contentPath, findingField } from '@/lib/draft/paths.ts'
import type { ProcedureDraft } from './use-draft.ts'

const typing = (target: EventTarget | null) => target instanceof HTMLElement && (target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName))

export interface FixHandlers {
  onPlan: (requirement: string) => void
  /** Puts the cursor into the row of a field. */
  onState: (field: string) => void
}

/** Applies what the margin offers; each is taken back from the toast or with Ctrl+Z (outside of a text that is being typed). */
export function useFixes(draft: ProcedureDraft, { onPlan, onState }: FixHandlers): (fix: Fix) => void {
  const done = useRef<AppliedFix[]>([])
  const latest = useRef(draft)
  useEffect(() => {
    latest.current = draft
  })

  const takeBack = useCallback((applied: AppliedFix) => {
    done.current = done.current.filter((one) => one !== applied)
    const { content, replace } = latest.current
    const before = undoFix(content, applied)
    if (before) replace(before)
    else say('Not taken back', { detail: 'The field was changed since, so the newer value stays.' })
  }, [])

  const undoLast = useEffectEvent((event: KeyboardEvent) => {
    if (event.key.toLowerCase() !== 'z' || !(event.ctrlKey || event.metaKey) || event.shiftKey || typing(event.target)) return
    const last = done.current.at(-1)
    if (!last) return
    event.preventDefault()
    takeBack(last)
    say('Taken back', { detail: last.label })
  })
  useEffect(() => {
    window.addEventListener('keydown', undoLast)
    return () => window.removeEventListener('keydown', undoLast)
  }, [])

  return useCallback(
    (fix) => {
      if (fix.kind === 'plan-coupon') return onPlan(fix.requirement)
      if (fix.kind === 'state') return onState(findingField(contentPath(fix.field)))
      const { content, replace } = latest.current
      const result = applyFix(content, fix)
      if (!result) return onState(fix.kind === 'set' ? findingField(contentPath(fix.field)) : 'supportingCoupons')
      replace(result.content)
      done.current = [...done.current, result.applied]
      say(fix.label, { detail: 'Applied. Ctrl+Z takes it back.', undo: () => takeBack(result.applied) })
    },
    [onPlan, onState, takeBack],
  )
}
