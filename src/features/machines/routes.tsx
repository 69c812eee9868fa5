import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'machines', lazy: async () => ({ Component: (await import('./pages/MachinesPage.tsx')).MachinesPage }) },
  { path: 'machines/new', lazy: async () => ({ Component: (await import('./pages/NewMachinePage.tsx')).NewMachinePage }) },
  { path: 'machines/card', lazy: async () => ({ Component: (await import('./pages/CardPage.tsx')).CardPage }) },
  { path: 'machines/:id', lazy: async () => ({ Component: (await import('./pages/MachinePage.tsx')).MachinePage }) },
  { path: 'machines/:id/card', lazy: async () => ({ Component: (await import('./pages/CardPage.tsx')).CardPage }) },
]
