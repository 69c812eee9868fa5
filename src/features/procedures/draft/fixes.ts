/** Fixes that the margin offers, as changes of the content that can be taken back. */
import type { Fix } from '@shared/schemas/assessment.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import { contentPath, readPath, same, writePath } from '@/lib/draft/paths.ts'

export interface AppliedFix {
  label: string
  /** The whole value that changed, e.g. the interval and not its end alone. */
  path: string
  before: unknown
  after: unknown
}

const wholeValue = (path: string): string => path.replace(/\.(min|max|all)$/, '')

/**
 * The content with a fix applied, and what is needed to take it back.
 * @returns null for a fix that changes no content (`plan-coupon`, `state`), that does not fit this record, or that changes nothing
 */
export function applyFix(content: ProcedureContent, fix: Fix): { content: ProcedureContent; applied: AppliedFix } | null {
  let path: string
  let written: ProcedureContent | null
  if (fix.kind === 'set') {
    path = wholeValue(contentPath(fix.field))
    written = writePath(content, contentPath(fix.field), fix.value)
  } else if (fix.kind === 'link-coupon') {
    if (content.supportingCoupons.includes(fix.couponId)) return null
    path = 'supportingCoupons'
    written = { ...content, supportingCoupons: [...content.supportingCoupons, fix.couponId] }
  } else return null
  if (!written || same(written, content) || !procedureContentSchema.shape.variables.safeParse(written.variables).success) return null
  return { content: written, applied: { label: fix.label, path, before: readPath(content, path), after: readPath(written, path) } }
}

/** The content with a fix taken back; null when the value has been changed since, which must not be overwritten. */
export function undoFix(content: ProcedureContent, applied: AppliedFix): ProcedureContent | null {
  return same(readPath(content, applied.path), applied.after) ? writePath(content, applied.path, applied.before) : null
}
