/** What the procedure pages read and change; keys are those of lib/query, so that every page sees one cache. */
import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import type { Revision } from '@shared/schemas/records.ts'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'

export const revisionQuery = (id: string) => query('readRevision', { params: { id } })
export const procedureQuery = (id: string) => query('readProcedure', { params: { id } })
export const couponQuery = (id: string) => query('readCoupon', { params: { id } })
export const comparisonQuery = (id: string) => query('compareRevision', { params: { id } })
export const impactQuery = (id: string) => query('impactOfRevision', { params: { id } })
export const assessmentQuery = (id: string) => query('assessRevision', { params: { id } })

/** Coupons by number or title, for linking. */
export async function searchCoupons(text: string, signal: AbortSignal) {
  const page = await call('listCoupons', { query: { q: text || undefined, limit: 20 }, signal })
  return page.items.map((row) => ({ id: row.id, title: row.number, subtitle: `${row.title} · ${row.state}`, data: row }))
}

/** What may happen to a revision besides being typed in; every act refreshes whatever shows procedures. */
export function useRevisionActs(revision: Pick<Revision, 'id' | 'procedureId' | 'version'>) {
  const client = useQueryClient()
  const { id } = revision
  const settle = (next?: Revision) => {
    if (next) client.setQueryData(revisionQuery(next.id).queryKey, next)
    for (const name of ['listProcedures', 'readProcedure', 'readToday', 'compareRevision', 'impactOfRevision', 'assessRevision']) void client.invalidateQueries({ queryKey: [name] })
  }
  const params = { id }
  return {
    submit: useMutation({ mutationFn: (version: number) => call('submitRevision', { params, ifMatch: version }), onSuccess: settle }),
    discard: useMutation({
      mutationFn: (version: number) => call('discardRevision', { params, ifMatch: version }),
      onSuccess: () => {
        client.removeQueries({ queryKey: revisionQuery(id).queryKey })
        settle()
      },
    }),
    sendBack: useMutation({ mutationFn: (comment: string) => call('returnRevision', { params, body: { comment }, ifMatch: revision.version }), onSuccess: settle }),
    approve: useMutation({ mutationFn: (body: BodyOf<'approveRevision'>) => call('approveRevision', { params, body, ifMatch: revision.version }), onSuccess: settle }),
    withdraw: useMutation({ mutationFn: (body: BodyOf<'withdrawRevision'>) => call('withdrawRevision', { params, body, ifMatch: revision.version }), onSuccess: settle }),
    revise: useMutation({ mutationFn: () => call('reviseProcedure', { params: { id: revision.procedureId } }), onSuccess: settle }),
    mail: useMutation({ mutationFn: (body: BodyOf<'mailRevision'>) => call('mailRevision', { params, body }), onSuccess: () => void client.invalidateQueries({ queryKey: ['listOutbox'] }) }),
  }
}
