import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'arc-data', lazy: async () => ({ Component: (await import('./pages/ArcRecordingsPage.tsx')).ArcRecordingsPage }) },
  { path: 'arc-data/new', lazy: async () => ({ Component: (await import('./pages/NewArcRecordingPage.tsx')).NewArcRecordingPage }) },
  { path: 'arc-data/:id', lazy: async () => ({ Component: (await import('./pages/ArcRecordingPage.tsx')).ArcRecordingPage }) },
]
