import { useMutation } from '@tanstack/react-query'
import { Button as AriaButton, Header, Menu, MenuItem, MenuSection, MenuTrigger, Popover, Separator } from 'react-aria-components'
import { useNavigate } from 'react-router-dom'
import { call } from '@/lib/api.ts'
import { sayProblem } from '@/components/toast.tsx'
import { useChangeAccount, useSession } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'

/** Two letters for a name: first of the first word, first of the last. */
export function initials(name: string): string {
  const words = name.trim().split(/\s+/)
  return `${words[0]?.[0] ?? ''}${words.length > 1 ? (words.at(-1)?.[0] ?? '') : ''}`.toUpperCase()
}

/** Signs out here; the page is loaded anew, so that nothing read stays in memory. */
const useSignOut = () => useMutation({ mutationFn: () => call('signOut'), onSuccess: () => window.location.assign('/sign-in'), onError: sayProblem })

const ITEM = 'flex cursor-pointer items-center justify-between gap-6 px-3.5 py-2 outline-none data-[focused]:bg-ink data-[focused]:text-paper'
const HEAD = 'cell-label px-3.5 pt-2 pb-0.5'
const mark = (on: boolean) => (on ? <span aria-hidden="true" className="size-2 bg-current" /> : null)

/** Account, units, theme and the way out, behind the person's initials. */
export function UserMenu() {
  const { person } = useSession()
  const units = useUnits()
  const account = useChangeAccount()
  const signOut = useSignOut()
  const navigate = useNavigate()
  if (!person) return null
  const failed = { onError: sayProblem }
  return (
    <MenuTrigger>
      <AriaButton aria-label={`${initials(person.name)}: ${person.name}, account, units, theme, sign out`} className="flex size-8 shrink-0 items-center justify-center rounded-full bg-heat-4 text-sm font-bold text-[#1b2226]">
        {initials(person.name)}
      </AriaButton>
      <Popover placement="bottom end" offset={6} className="min-w-60 border border-ink bg-sheet text-ink">
        <Menu className="py-1 outline-none" aria-label="Your settings">
          <MenuSection>
            <Header className="border-b border-hair px-3.5 py-2">
              <span className="block font-semibold">{person.name}</span>
              <span className="block text-sm text-soft">{person.roles.join(', ')}</span>
            </Header>
            <MenuItem className={ITEM} onAction={() => void navigate('/account')}>
              Account and password
            </MenuItem>
          </MenuSection>
          <Separator className="my-1 border-b border-hair" />
          <MenuSection selectionMode="single" disallowEmptySelection selectedKeys={[units.system]}>
            <Header className={HEAD}>Figures</Header>
            <MenuItem id="SI" className={ITEM} onAction={() => account.mutate({ unitSystem: 'SI' }, failed)}>
              SI: mm, °C {mark(units.system === 'SI')}
            </MenuItem>
            <MenuItem id="US" className={ITEM} onAction={() => account.mutate({ unitSystem: 'US' }, failed)}>
              US customary: in, °F {mark(units.system === 'US')}
            </MenuItem>
          </MenuSection>
          <MenuSection selectionMode="single" disallowEmptySelection selectedKeys={[person.theme]}>
            <Header className={HEAD}>Theme</Header>
            <MenuItem id="day" className={ITEM} onAction={() => account.mutate({ theme: 'day' }, failed)}>
              Day {mark(person.theme === 'day')}
            </MenuItem>
            <MenuItem id="night" className={ITEM} onAction={() => account.mutate({ theme: 'night' }, failed)}>
              Night {mark(person.theme === 'night')}
            </MenuItem>
          </MenuSection>
          <Separator className="my-1 border-b border-hair" />
          <MenuSection aria-label="Leave">
            <MenuItem className={ITEM} onAction={() => signOut.mutate()}>
              Sign out
            </MenuItem>
          </MenuSection>
        </Menu>
      </Popover>
    </MenuTrigger>
  )
}
