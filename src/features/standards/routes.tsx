import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'standards', lazy: async () => ({ Component: (await import('./pages/StandardsPage.tsx')).StandardsPage }) },
  { path: 'standards/:id', lazy: async () => ({ Component: (await import('./pages/StandardPage.tsx')).StandardPage }) },
]
