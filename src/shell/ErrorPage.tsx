import { isRouteErrorResponse, useRouteError } from 'react-router-dom'
import { ButtonLink } from '@/components/Button.tsx'
import { ErrorState } from '@/components/states.tsx'
import { useTitle } from '@/hooks/title.ts'
import { asProblem } from '@/lib/problem.ts'

/** A page of this program that is not there. */
export function NotFound() {
  useTitle('Page not found')
  return (
    <div className="mx-auto max-w-3xl py-10">
      <p className="cell-label">Page not found</p>
      <h1 className="mt-1 font-narrow text-4xl font-semibold">No sheet under this number</h1>
      <BrokenSpecimen />
      <p className="mt-2 max-w-prose text-lg text-pretty">The address leads nowhere: the record may have been removed, belong to another organization, or the link was cut short.</p>
      <div className="mt-5 flex flex-wrap gap-2">
        <ButtonLink to="/" kind="primary">
          Go to today
        </ButtonLink>
        <ButtonLink to="/procedures">All procedures</ButtonLink>
      </div>
    </div>
  )
}

/** A bend specimen that did not hold. */
function BrokenSpecimen() {
  return (
    <svg viewBox="0 0 320 120" className="my-6 w-full max-w-80 stroke-ink" fill="none" strokeWidth="2" aria-hidden="true">
      <path d="M20 20v30a56 56 0 0 0 34 51l9 3 6-18-8-3a37 37 0 0 1-22-33V20Z" className="fill-hair" />
      <path d="M190 14 163 38a56 56 0 0 0-18 54l-4 7 16-3 5-9a37 37 0 0 1 13-35l27-24Z" className="fill-hair" transform="translate(-20 4)" />
      <path d="m63 104 6-18 5 6-1 5 5 6Z" className="fill-heat-4" />
      <path d="m121 103 6-9 10 0-3 6Z" className="fill-heat-4" />
      <path d="m92 88 4-6M104 96l2-8M84 112l-3 5" className="stroke-oxide" />
    </svg>
  )
}

/** What a route shows when it can't: the problem, in its place, with the bar still there. */
export function RouteError() {
  const error = useRouteError()
  const status = isRouteErrorResponse(error) ? error.status : asProblem(error).status
  if (status === 404) return <NotFound />
  return (
    <div className="mx-auto max-w-3xl py-10">
      <ErrorState error={isRouteErrorResponse(error) ? new Error(error.statusText) : error} onRetry={() => window.location.reload()} />
    </div>
  )
}
