import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [{ path: 'people', lazy: async () => ({ Component: (await import('./pages/PeoplePage.tsx')).PeoplePage }) }]
