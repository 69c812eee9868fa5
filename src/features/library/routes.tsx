import { Navigate, type RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'library', element: <Navigate to="/library/base-metals" replace /> },
  { path: 'library/:kind', lazy: async () => ({ Component: (await import('./pages/LibraryPage.tsx')).LibraryPage }) },
]
