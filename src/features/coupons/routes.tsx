import type { RouteObject } from 'react-router-dom'

export const routes: RouteObject[] = [
  { path: 'coupons', lazy: async () => ({ Component: (await import('./pages/CouponsPage.tsx')).CouponsPage }) },
  { path: 'coupons/new', lazy: async () => ({ Component: (await import('./pages/NewCouponPage.tsx')).NewCouponPage }) },
  { path: 'coupons/:id', lazy: async () => ({ Component: (await import('./pages/CouponPage.tsx')).CouponPage }) },
  { path: 'coupons/:id/standards', lazy: async () => ({ Component: (await import('./pages/CouponStandardsPage.tsx')).CouponStandardsPage }) },
]
