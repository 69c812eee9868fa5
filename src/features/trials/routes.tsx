import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'dial-in', lazy: async () => ({ Component: (await import('./pages/TrialsPage.tsx')).TrialsPage }) },
  { path: 'dial-in/:id', lazy: async () => ({ Component: (await import('./pages/TrialPage.tsx')).TrialPage }) },
]

/** Without the bar: the form between two beads, for one hand. */
export const beadRoutes: RouteObject[] = [{ path: 'dial-in/:id/bead', lazy: async () => ({ Component: (await import('./pages/BeadPage.tsx')).BeadPage }) }]
