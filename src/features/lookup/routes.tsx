import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [{ path: 'look-up', lazy: async () => ({ Component: (await import('./pages/LookUpPage.tsx')).LookUpPage }) }]

/** Without the bar: the shop view. */
export const shopRoutes: RouteObject[] = [{ path: 'shop/:revisionId', lazy: async () => ({ Component: (await import('./pages/ShopPage.tsx')).ShopPage }) }]
