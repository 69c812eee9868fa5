/** The program's pages, composed from what each feature offers; one lazy chunk a page. */
import type { QueryClient } from '@tanstack/react-query'
import type { RouteObject } from 'react-router-dom'
import { Skeleton } from '@/components/states.tsx'
import { bareRoutes as accountBareRoutes, routes as accountRoutes } from '@/features/account/routes.tsx'
import { routes as arcDataRoutes } from '@/features/arc-data/routes.tsx'
import { routes as calculatorRoutes } from '@/features/calculators/routes.tsx'
import { routes as couponRoutes } from '@/features/coupons/routes.tsx'
import { routes as jobRoutes } from '@/features/jobs/routes.tsx'
import { routes as libraryRoutes } from '@/features/library/routes.tsx'
import { routes as lookupRoutes, shopRoutes } from '@/features/lookup/routes.tsx'
import { routes as machineRoutes } from '@/features/machines/routes.tsx'
import { routes as outboxRoutes } from '@/features/outbox/routes.tsx'
import { routes as peopleRoutes } from '@/features/people/routes.tsx'
import { routes as procedureRoutes } from '@/features/procedures/routes.tsx'
import { routes as standardRoutes } from '@/features/standards/routes.tsx'
import { routes as todayRoutes } from '@/features/today/routes.tsx'
import { beadRoutes, routes as trialRoutes } from '@/features/trials/routes.tsx'
import { NotFound, RouteError } from '@/shell/ErrorPage.tsx'
import { Bare, Shell } from '@/shell/Shell.tsx'
import { anyone, signedIn } from '@/shell/guard.ts'

/** Pages with the bar, for people who are signed in. A feature adds its `routes` here. */
const desk: RouteObject[] = [...todayRoutes, ...accountRoutes, ...peopleRoutes, ...outboxRoutes, ...procedureRoutes, ...couponRoutes, ...arcDataRoutes, ...jobRoutes, ...machineRoutes, ...trialRoutes, ...lookupRoutes, ...libraryRoutes, ...calculatorRoutes, ...standardRoutes]

/** Pages without the bar, for people who are signed in: the shop view. */
const shop: RouteObject[] = [...shopRoutes, ...beadRoutes]

/** Pages without the bar, for anyone: sign-in and the links in e-mails. */
const open: RouteObject[] = [...accountBareRoutes]

const gallery: RouteObject[] =
  import.meta.env.DEV || import.meta.env.VITE_GALLERY === '1' ? [{ path: 'gallery', lazy: async () => ({ Component: (await import('@/gallery/GalleryPage.tsx')).GalleryPage }) }] : []

export function createRoutes(client: QueryClient): RouteObject[] {
  const errorElement = <RouteError />
  // Asked once on the way in. A session that ends later is met by a dialog over the page, never by leaving it.
  const guard = { loader: signedIn(client), shouldRevalidate: () => false }
  return [
    {
      hydrateFallbackElement: <Skeleton label="Opening Sidebend" />,
      errorElement,
      children: [
        { Component: Bare, loader: anyone(client), children: [{ errorElement, children: [...open, ...gallery] }] },
        { Component: Bare, ...guard, children: [{ errorElement, children: shop }] },
        { Component: Shell, ...guard, children: [{ errorElement, children: [...desk, { path: '*', Component: NotFound }] }] },
      ],
    },
  ]
}
