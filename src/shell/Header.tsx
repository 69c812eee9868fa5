import { Menu as MenuIcon, X } from 'lucide-react'
import { useState } from 'react'
import { Link, NavLink, useLocation } from 'react-router-dom'
import { Wordmark } from '@/components/Mark.tsx'
import { useSession } from '@/hooks/session.ts'
import { FindBox } from './FindBox.tsx'
import { UserMenu } from './UserMenu.tsx'

const PLACES = [
  { to: '/', label: 'Today', action: 'today.read' },
  { to: '/procedures', label: 'Procedures', action: 'procedures.read' },
  { to: '/coupons', label: 'Coupons', action: 'coupons.read' },
  { to: '/jobs', label: 'Jobs', action: 'jobs.read' },
  { to: '/library', label: 'Library', action: 'library.read' },
  { to: '/standards', label: 'Standards', action: 'standards.read' },
  { to: '/people', label: 'People', action: 'people.read' },
  { to: '/outbox', label: 'Outbox', action: 'outbox.read' },
] as const

/** The dark bar: mark, places that this person may go, the joint search, initials. Below 1024 px the places fold behind a button. */
export function Header() {
  const { may } = useSession()
  const { key } = useLocation()
  const [openAt, setOpenAt] = useState<string | null>(null)
  const open = openAt === key
  const places = PLACES.filter(({ action }) => may.includes(action))
  const links = (wide: boolean) =>
    places.map(({ to, label }) => (
      <NavLink
        key={to}
        to={to}
        end={to === '/'}
        className={({ isActive }) => `${wide ? 'py-1' : 'block border-t border-bar-raised px-4 py-3.5 text-lg sm:px-7'} ${isActive ? 'font-medium text-bar-text' : 'text-bar-soft hover:text-bar-text'}`}
      >
        {label}
      </NavLink>
    ))
  return (
    <header className="on-bar no-print bg-bar text-bar-text">
      <div className="mx-auto flex h-14 max-w-[96rem] items-center gap-4 px-4 sm:px-7">
        <Link to="/" aria-label="Sidebend, today" className="shrink-0">
          <Wordmark />
        </Link>
        <nav aria-label="Main" className="ml-2 hidden items-center gap-6 text-[0.9375rem] lg:flex">
          {links(true)}
        </nav>
        {may.includes('lookup.read') && <FindBox className="ml-auto hidden w-full max-w-80 min-w-40 sm:block" />}
        <div className={`flex items-center gap-3 ${may.includes('lookup.read') ? 'max-sm:ml-auto' : 'ml-auto'}`}>
          <UserMenu />
          <button type="button" aria-expanded={open} aria-controls="places" aria-label={open ? 'Close the menu' : 'Open the menu'} className="flex size-10 items-center justify-center rounded hover:bg-bar-raised lg:hidden" onClick={() => setOpenAt(open ? null : key)}>
            {open ? <X size={22} aria-hidden="true" /> : <MenuIcon size={22} aria-hidden="true" />}
          </button>
        </div>
      </div>
      {open && (
        <nav id="places" aria-label="Main" className="lg:hidden">
          {may.includes('lookup.read') && <FindBox className="mx-4 mb-3 sm:hidden" />}
          {links(false)}
        </nav>
      )}
    </header>
  )
}
