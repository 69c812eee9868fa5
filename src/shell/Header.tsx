import { ChevronDown, Menu as MenuIcon, X } from 'lucide-react'
import { useState } from 'react'
import { Button as AriaButton, Menu, MenuItem, MenuTrigger, Popover } from 'react-aria-components'
import { Link, NavLink, useLocation, useNavigate } from 'react-router-dom'
import { Wordmark } from '@/components/Mark.tsx'
import { useSession } from '@/hooks/session.ts'
import { FindBox } from './FindBox.tsx'
import { UserMenu } from './UserMenu.tsx'

const PLACES = [
  { to: '/', label: 'Today', action: 'today.read' },
  { to: '/procedures', label: 'Procedures', action: 'procedures.read' },
  { to: '/coupons', label: 'Coupons', action: 'coupons.read' },
  { to: '/jobs', label: 'Jobs', action: 'jobs.read' },
  { to: '/machines', label: 'Machines', action: 'machines.read' },
  { to: '/dial-in', label: 'Dial-in', action: 'trials.read' },
  { to: '/library', label: 'Library', action: 'library.read' },
  { to: '/calculators', label: 'Calculators', action: 'library.read' },
] as const

/** Places of the second rank: behind one button on the bar, in line with the others in the folded menu. */
const MORE = [
  { to: '/standards', label: 'Standards', action: 'standards.read' },
  { to: '/people', label: 'People', action: 'people.read' },
  { to: '/outbox', label: 'Outbox', action: 'outbox.read' },
] as const

const ITEM = 'block cursor-pointer px-3.5 py-2 no-underline outline-none data-[focused]:bg-ink data-[focused]:text-paper'

/** The dark bar: mark, places that this person may go, the joint search, initials. Below 1280 px the places fold behind a button. */
export function Header() {
  const { may } = useSession()
  const navigate = useNavigate()
  const { key, pathname } = useLocation()
  const [openAt, setOpenAt] = useState<string | null>(null)
  const open = openAt === key
  const places = PLACES.filter(({ action }) => may.includes(action))
  const more = MORE.filter(({ action }) => may.includes(action))
  const inMore = more.some(({ to }) => pathname === to || pathname.startsWith(`${to}/`))
  const links = (wide: boolean) =>
    (wide ? places : [...places, ...more]).map(({ to, label }) => (
      <NavLink
        key={to}
        to={to}
        end={to === '/'}
        className={({ isActive }) => `${wide ? 'py-1 whitespace-nowrap' : 'block border-t border-bar-raised px-4 py-3.5 text-lg sm:px-7'} ${isActive ? 'font-medium text-bar-text' : 'text-bar-soft hover:text-bar-text'}`}
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
        <nav aria-label="Main" className="ml-2 hidden items-center gap-5 text-[0.9375rem] xl:flex">
          {links(true)}
          {more.length > 0 && (
            <MenuTrigger>
              <AriaButton className={`flex items-center gap-1 py-1 ${inMore ? 'font-medium text-bar-text' : 'text-bar-soft hover:text-bar-text'}`}>
                More
                <ChevronDown size={16} aria-hidden="true" />
              </AriaButton>
              <Popover placement="bottom start" offset={6} className="min-w-44 border border-ink bg-sheet text-ink">
                <Menu className="py-1 outline-none" aria-label="More places">
                  {more.map(({ to, label }) => (
                    <MenuItem key={to} className={ITEM} onAction={() => void navigate(to)}>
                      {label}
                    </MenuItem>
                  ))}
                </Menu>
              </Popover>
            </MenuTrigger>
          )}
        </nav>
        {may.includes('lookup.read') && <FindBox className="ml-auto hidden w-full max-w-80 min-w-40 sm:block" />}
        <div className={`flex items-center gap-3 ${may.includes('lookup.read') ? 'max-sm:ml-auto' : 'ml-auto'}`}>
          <UserMenu />
          <button type="button" aria-expanded={open} aria-controls="places" aria-label={open ? 'Close the menu' : 'Open the menu'} className="flex size-10 items-center justify-center rounded hover:bg-bar-raised xl:hidden" onClick={() => setOpenAt(open ? null : key)}>
            {open ? <X size={22} aria-hidden="true" /> : <MenuIcon size={22} aria-hidden="true" />}
          </button>
        </div>
      </div>
      {open && (
        <nav id="places" aria-label="Main" className="xl:hidden">
          {may.includes('lookup.read') && <FindBox className="mx-4 mb-3 sm:hidden" />}
          {links(false)}
        </nav>
      )}
    </header>
  )
}
