import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'outbox', lazy: async () => ({ Component: (await import('./pages/OutboxPage.tsx')).OutboxPage }) },
  { path: 'outbox/:id', lazy: async () => ({ Component: (await import('./pages/MailPage.tsx')).MailPage }) },
]
