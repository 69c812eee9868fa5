/** Renders pages and components as the program does: router, query cache, a session, and an API answered by hand. */
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query'
import { cleanup, render } from '@testing-library/react'
import { Suspense, type ReactNode } from 'react'
import { createMemoryRouter, RouterProvider, type RouteObject } from 'react-router-dom'
import { afterEach, vi } from 'vitest'
import type { Session } from '@shared/schemas/people.ts'
import { createQueryClient, sessionQuery } from '@/lib/query.ts'

// What browsers have and jsdom lacks.
Object.defineProperty(globalThis, 'CSS', { configurable: true, value: { escape: (text: string) => text.replace(/[^\w-]/g, (letter) => `\\${letter}`) } })
Object.assign(Element.prototype, { setPointerCapture: () => undefined, releasePointerCapture: () => undefined, hasPointerCapture: () => false, scrollIntoView: () => undefined })

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
  localStorage.clear()
})

export const ids = { me: '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c01', other: '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c02', firm: '5f0c1c86-5d4e-4f5f-8a51-0d7b3a4f1c03' }

export const nobody: Session = { person: null, organization: null, may: [], mailIsCaught: true, demo: false }

export const session = (may: string[] = ['today.read', 'account.change'], person: Partial<NonNullable<Session['person']>> = {}): Session => ({
  person: { id: ids.me, name: 'Edda Nilsen', email: 'edda@larkfield.example', roles: ['engineer'], unitSystem: 'SI', theme: 'day', ...person },
  organization: { id: ids.firm, name: 'Larkfield Fabrication', address: '', defaultUnitSystem: 'SI', version: 1 },
  may,
  mailIsCaught: true,
  demo: false,
})

export interface Asked {
  method: string
  path: string
  search: string
  body: unknown
  headers: Headers
}
export type Answer = { status?: number; body?: unknown } | ((asked: Asked) => { status?: number; body?: unknown })

/** Answers fetch by `METHOD /path`; anything else is a 404 problem. Returns what was asked, in order. */
export function mockApi(answers: Record<string, Answer>): Asked[] {
  const seen: Asked[] = []
  vi.stubGlobal(
    'fetch',
    vi.fn((input: string, init: RequestInit = {}) => {
      const url = new URL(input, 'http://localhost')
      const asked: Asked = { method: init.method ?? 'GET', path: url.pathname, search: url.search, body: typeof init.body === 'string' ? JSON.parse(init.body) : undefined, headers: new Headers(init.headers) }
      seen.push(asked)
      const answer = answers[`${asked.method} ${asked.path}`]
      const { status = 200, body } = typeof answer === 'function' ? answer(asked) : (answer ?? { status: 404, body: { type: 'about:blank', title: 'Not found', status: 404, detail: 'There is no such record.' } })
      return Promise.resolve(new Response(body === undefined ? null : JSON.stringify(body), { status, headers: { 'content-type': 'application/json' } }))
    }),
  )
  return seen
}

/** A refusal as the server words it. */
export const problem = (status: number, detail: string, more: object = {}) => ({ status, body: { type: 'about:blank', title: 'Refused', status, detail, ...more } })

interface Rendered extends ReturnType<typeof render> {
  client: QueryClient
  router: ReturnType<typeof createMemoryRouter>
}

/** Renders one element at `path`, signed in unless told otherwise. */
export function show(ui: ReactNode, { as = session(), path = '/' }: { as?: Session; path?: string } = {}): Rendered {
  return showRoutes([{ path: '*', element: ui }], { as, path })
}

/** Renders routes at `path`. `as: null` leaves the session to the API. */
export function showRoutes(routes: RouteObject[] | ((client: QueryClient) => RouteObject[]), { as = session(), path = '/' }: { as?: Session | null; path?: string } = {}): Rendered {
  const client = createQueryClient()
  client.setDefaultOptions({ queries: { retry: false, staleTime: Infinity } })
  if (as) client.setQueryData(sessionQuery.queryKey, as)
  const router = createMemoryRouter(typeof routes === 'function' ? routes(client) : routes, { initialEntries: [path] })
  const result = render(
    <QueryClientProvider client={client}>
      <Suspense fallback="waiting">
        <RouterProvider router={router} />
      </Suspense>
    </QueryClientProvider>,
  )
  return { ...result, client, router }
}
