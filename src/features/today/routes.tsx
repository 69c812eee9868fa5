import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [{ index: true, lazy: async () => ({ Component: (await import('./pages/TodayPage.tsx')).TodayPage }) }]
