import { inputId } from '@/components/variables/context.ts'
import { placedRows } from '@/components/variables/catalogue.ts'
import { rowFor } from '@/components/variables/labels.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { formPath } from '../content.ts'
import type { Missing } from '../judged.ts'

/** Puts the cursor where a field is typed: at itself, or at the nearest part above it that has a place on the sheet. */
export function goTo(field: string, content: CouponContent): void {
  const path = formPath(field)
  const weld = path.startsWith('variables.') ? (rowFor(path, placedRows(content.variables.processes))?.path ?? path.replace('variables.', '')) : path
  const parts = weld.split('.')
  const exact = path.replace('variables.', '')
  for (const place of [exact, ...parts.map((_part, index) => parts.slice(0, parts.length - index).join('.'))]) {
    const element = document.getElementById(inputId(place))
    if (!element) continue
    element.scrollIntoView({ block: 'center' })
    element.focus({ preventScroll: true })
    return
  }
  document.getElementById('record')?.scrollIntoView()
}

/** What is still missing for certification; each line leads to its field. */
export function MissingList({ missing, content, typed }: { missing: readonly Missing[]; content: CouponContent; typed: boolean }) {
  if (missing.length === 0) return <p className="border-l-[3px] border-l-jade bg-sheet px-3 py-2">Nothing is missing for certification.</p>
  return (
    <details open={missing.length <= 6} className="border-l-[3px] border-l-straw bg-straw-bg px-3 py-2">
      <summary className="cursor-pointer font-semibold">
        {missing.length === 1 ? 'One thing is' : `${missing.length} things are`} missing for certification
      </summary>
      <ul className="mt-1.5 space-y-1.5 text-sm">
        {missing.map(({ field, message, clause }) => (
          <li key={`${field} ${message}`} className="flex items-start justify-between gap-3">
            {typed ? (
              <button type="button" className="min-h-6 text-left text-pretty underline decoration-1 underline-offset-[3px] hover:decoration-2" onClick={() => goTo(field, content)}>
                {message}
              </button>
            ) : (
              <p className="text-pretty">{message}</p>
            )}
            <span className="font-narrow font-medium whitespace-nowrap text-soft">{clause}</span>
          </li>
        ))}
      </ul>
    </details>
  )
}
