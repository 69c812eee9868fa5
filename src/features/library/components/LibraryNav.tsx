import { NavLink } from 'react-router-dom'
import { LIBRARY_KINDS, type LibraryKind } from '@shared/library/library-rows.ts'
import { KIND_NAMES } from '../columns.tsx'

export const isKind = (kind: string | undefined): kind is LibraryKind => LIBRARY_KINDS.some((one) => one === kind)

const PARTS = [...LIBRARY_KINDS.map((kind) => ({ to: `/library/${kind}`, label: KIND_NAMES[kind].title })), { to: '/library/heats', label: 'Heats and lots' }]

/** The parts of the library, above each of their lists. */
export function LibraryNav() {
  return (
    <nav aria-label="Parts of the library" className="no-print mb-4 overflow-x-auto border-b border-rule">
      <ul className="flex gap-x-5">
        {PARTS.map(({ to, label }) => (
          <li key={to}>
            <NavLink to={to} className={({ isActive }) => `-mb-px block border-b-2 py-2 whitespace-nowrap ${isActive ? 'border-ink font-semibold' : 'border-transparent text-soft hover:text-ink'}`}>
              {label}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  )
}
