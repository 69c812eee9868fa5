import { Suspense } from 'react'
import { Outlet, ScrollRestoration, useNavigation } from 'react-router-dom'
import { Responsibility } from '@/components/Caution.tsx'
import { Skeleton } from '@/components/states.tsx'
import { Toasts } from '@/components/toast.tsx'
import { useSession } from '@/hooks/session.ts'
import { useTheme } from '@/hooks/theme.ts'
import { Header } from './Header.tsx'
import { SignInAgain } from './SignInAgain.tsx'

/** Everything around a page at the desk: skip link, bar, page, foot. Somebody signed out meanwhile signs in over the page, which stays. */
export function Shell() {
  const { person, organization } = useSession()
  useTheme(person?.theme)
  const moving = useNavigation().state === 'loading'
  return (
    <div className="flex min-h-dvh flex-col">
      <a href="#page" className="sr-only z-50 bg-sheet px-4 py-2 font-semibold text-ink focus:not-sr-only focus:fixed focus:top-2 focus:left-2">
        Skip to the page
      </a>
      <Header />
      <div role="progressbar" aria-label="Opening the page" aria-hidden={!moving} className={`h-0.5 bg-heat-4 no-print ${moving ? 'animate-pulse' : 'invisible'}`} />
      <main id="page" tabIndex={-1} className="mx-auto w-full max-w-[96rem] grow px-4 pt-5 pb-10 outline-none sm:px-7">
        <Suspense fallback={<Skeleton />}>
          <Outlet />
        </Suspense>
      </main>
      <footer className="mx-auto flex w-full max-w-[96rem] flex-wrap justify-between gap-x-6 gap-y-1 border-t border-rule px-4 py-4 sm:px-7">
        <Responsibility />
        {organization && <p className="text-xs text-soft">{organization.name}</p>}
      </footer>
      {!person && <SignInAgain />}
      <ScrollRestoration />
      <Toasts />
    </div>
  )
}

/** Around pages without the bar: sign-in, links from e-mails, the shop view. */
export function Bare() {
  const { person } = useSession()
  useTheme(person?.theme)
  return (
    <>
      <Suspense fallback={<Skeleton />}>
        <Outlet />
      </Suspense>
      <ScrollRestoration />
      <Toasts />
    </>
  )
}
