/** What the coupon pages read and change; keys are those of lib/query, so that every page sees one cache. */
import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import type { Coupon, Photo } from '@shared/schemas/records.ts'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'

export const couponQuery = (id: string) => query('readCoupon', { params: { id } })
/** Judged afresh each time it is opened: the coupon may have been typed in meanwhile. */
export const couponStandardsQuery = (id: string) => ({ ...query('qualifyUnderAllStandards', { params: { id } }), staleTime: 0 })
export const photosQuery = (id: string) => query('listPhotos', { params: { id } })

/** Open procedures by number or title, for opening a coupon against one. */
export async function searchProcedures(text: string, signal: AbortSignal) {
  const page = await call('listProcedures', { query: { q: text || undefined, limit: 20 }, signal })
  return page.items.map((row) => ({ id: row.revisionId, title: `${row.number} rev ${row.revision}`, subtitle: `${row.title} · ${row.state.replace('-', ' ')}`, data: row }))
}

/** What may happen to a coupon besides being typed in; every act refreshes whatever shows coupons. */
export function useCouponActs(id: string) {
  const client = useQueryClient()
  const params = { id }
  const settle = (coupon: Coupon) => {
    client.setQueryData(couponQuery(id).queryKey, coupon)
    for (const name of ['listCoupons', 'readToday', 'qualifyUnderAllStandards']) void client.invalidateQueries({ queryKey: [name] })
  }
  return {
    certify: useMutation({ mutationFn: ({ version, password }: { version: number; password: string }) => call('certifyCoupon', { params, body: { password }, ifMatch: version }), onSuccess: settle }),
    reject: useMutation({ mutationFn: ({ version, ...body }: { version: number; password: string; reason: string }) => call('rejectCoupon', { params, body, ifMatch: version }), onSuccess: settle }),
    mail: useMutation({ mutationFn: (body: BodyOf<'mailCoupon'>) => call('mailCoupon', { params, body }), onSuccess: () => void client.invalidateQueries({ queryKey: ['listOutbox'] }) }),
  }
}

/** Changes of one coupon's photos; the list follows at once. */
export function usePhotoActs(couponId: string) {
  const client = useQueryClient()
  const key = photosQuery(couponId).queryKey
  const put = (change: (items: Photo[]) => Photo[]) => client.setQueryData(key, (before) => (before ? { items: change(before.items) } : before))
  return {
    added: (photos: Photo[]) => {
      put((items) => [...items, ...photos])
      void client.invalidateQueries({ queryKey: ['listCoupons'] })
    },
    change: useMutation({
      mutationFn: ({ id, ...body }: { id: string; caption?: string; tag?: string }) => call('changePhoto', { params: { id }, body }),
      onSuccess: (photo) => put((items) => items.map((one) => (one.id === photo.id ? photo : one))),
    }),
    remove: useMutation({
      mutationFn: (id: string) => call('removePhoto', { params: { id } }),
      onSuccess: (_nothing, id) => put((items) => items.filter((one) => one.id !== id)),
    }),
  }
}
