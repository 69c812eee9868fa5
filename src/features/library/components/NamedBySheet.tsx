import { Link } from 'react-router-dom'
import type { NamedBy } from '@shared/schemas/heats.ts'
import { Sheet } from '@/components/Sheet.tsx'

const WHERE: Readonly<Record<NamedBy['kind'], string>> = { procedure: '/revisions/', coupon: '/coupons/', heat: '/library/heats/' }
const STATE: Readonly<Record<string, string>> = { 'in-review': 'in review', lot: 'lot', heat: 'heat' }

/** Records that name a row, a heat or a lot, as links. */
export function NamedBySheet({ title, none, items }: { title: string; none: string; items: readonly NamedBy[] }) {
  return (
    <Sheet title={title} aside={items.length > 0 ? items.length : undefined}>
      {items.length === 0 ? (
        <p className="px-4 py-3 text-soft">{none}</p>
      ) : (
        <ul className="px-4 py-1">
          {items.map(({ kind, id, number, title: name, state }) => (
            <li key={id} className="flex flex-wrap items-baseline gap-x-3 border-b border-hair py-2 last:border-b-0">
              <Link to={`${WHERE[kind]}${id}`} className="text-link font-semibold whitespace-nowrap">
                {number}
              </Link>
              <span className="min-w-0 grow">{name}</span>
              <span className="text-sm text-soft">{STATE[state] ?? state}</span>
            </li>
          ))}
        </ul>
      )}
    </Sheet>
  )
}
