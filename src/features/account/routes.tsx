import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [{ path: 'account', lazy: async () => ({ Component: (await import('./pages/AccountPage.tsx')).AccountPage }) }]

/** For people who are not signed in. */
export const bareRoutes: RouteObject[] = [
  { path: 'sign-in', lazy: async () => ({ Component: (await import('./pages/SignInPage.tsx')).SignInPage }) },
  { path: 'forgot-password', lazy: async () => ({ Component: (await import('./pages/ForgotPasswordPage.tsx')).ForgotPasswordPage }) },
  { path: 'reset-password/:token', lazy: async () => ({ Component: (await import('./pages/ResetPasswordPage.tsx')).ResetPasswordPage }) },
  { path: 'invitation/:token', lazy: async () => ({ Component: (await import('./pages/InvitationPage.tsx')).InvitationPage }) },
]
