import { Navigate, type RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'library', element: <Navigate to="/library/base-metals" replace /> },
  { path: 'library/heats', lazy: async () => ({ Component: (await import('./pages/HeatsPage.tsx')).HeatsPage }) },
  { path: 'library/heats/new', lazy: async () => ({ Component: (await import('./pages/NewHeatPage.tsx')).NewHeatPage }) },
  { path: 'library/heats/:id', lazy: async () => ({ Component: (await import('./pages/HeatPage.tsx')).HeatPage }) },
  { path: 'library/:kind', lazy: async () => ({ Component: (await import('./pages/LibraryPage.tsx')).LibraryPage }) },
  { path: 'library/:kind/new', lazy: async () => ({ Component: (await import('./pages/OwnRowPage.tsx')).OwnRowPage }) },
  { path: 'library/:kind/:id', lazy: async () => ({ Component: (await import('./pages/LibraryItemPage.tsx')).LibraryItemPage }) },
  { path: 'library/:kind/:id/edit', lazy: async () => ({ Component: (await import('./pages/OwnRowPage.tsx')).OwnRowPage }) },
]
