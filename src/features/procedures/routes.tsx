import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'procedures', lazy: async () => ({ Component: (await import('./pages/ProceduresPage.tsx')).ProceduresPage }) },
  { path: 'procedures/new', lazy: async () => ({ Component: (await import('./pages/NewProcedurePage.tsx')).NewProcedurePage }) },
  { path: 'procedures/:id', lazy: async () => ({ Component: (await import('./pages/RevisionPage.tsx')).ProcedurePage }) },
  { path: 'revisions/:id', lazy: async () => ({ Component: (await import('./pages/RevisionPage.tsx')).RevisionPage }) },
  { path: 'revisions/:id/review', lazy: async () => ({ Component: (await import('./pages/ReviewPage.tsx')).ReviewPage }) },
]
