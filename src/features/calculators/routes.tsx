import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'calculators', lazy: async () => ({ Component: (await import('./pages/CalculatorsPage.tsx')).CalculatorsPage }) },
  { path: 'calculators/:id', lazy: async () => ({ Component: (await import('./pages/CalculatorPage.tsx')).CalculatorPage }) },
]
