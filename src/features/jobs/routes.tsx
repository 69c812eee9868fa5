import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'jobs', lazy: async () => ({ Component: (await import('./pages/JobsPage.tsx')).JobsPage }) },
  { path: 'jobs/:id', lazy: async () => ({ Component: (await import('./pages/JobPage.tsx')).JobPage }) },
]
