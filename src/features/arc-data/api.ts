/** What the pages of recordings read and change. */
import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { ArcRecording } from '@shared/schemas/arc-data.ts'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import { quantity } from '@shared/units/convert.ts'
import { call } from '@/lib/api.ts'
import { query } from '@/lib/query.ts'

export const recordingQuery = (id: string) => query('readArcRecording', { params: { id } })

/** Open coupons by number or title, to attach a recording to. */
export async function searchCoupons(text: string, signal: AbortSignal) {
  const page = await call('listCoupons', { query: { q: text || undefined, limit: 30 }, signal })
  return page.items
    .filter(({ state }) => state !== 'certified' && state !== 'rejected')
    .map((row) => ({ id: row.id, title: row.number, subtitle: `${row.title} · ${row.state}`, data: row }))
}

/** Trials of the dial-in log by number or title. */
export async function searchTrials(text: string, signal: AbortSignal) {
  const page = await call('listTrials', { query: { q: text || undefined, limit: 30 }, signal })
  return page.items.map((row) => ({ id: row.id, title: row.number, subtitle: `${row.title} · ${row.beads} ${row.beads === 1 ? 'bead' : 'beads'}`, data: row }))
}

/** What may happen to a recording. */
export function useRecordingActs(recording: ArcRecording) {
  const client = useQueryClient()
  const params = { id: recording.id }
  const refresh = () => void client.invalidateQueries({ queryKey: ['listArcRecordings'] })
  return {
    attach: useMutation({
      mutationFn: (body: BodyOf<'attachArcRecording'>) => call('attachArcRecording', { params, body, ifMatch: recording.version }),
      onSuccess: (next) => {
        client.setQueryData(recordingQuery(recording.id).queryKey, next)
        refresh()
      },
    }),
    remove: useMutation({ mutationFn: () => call('removeArcRecording', { params }), onSuccess: refresh }),
    /** Puts the energy into the pass as an ordinary save of the coupon, and the weld's length where the pass has none. */
    writeEnergy: useMutation({
      mutationFn: async () => {
        const { couponId, runRowId, weldLength } = recording.attachment
        if (couponId === null) throw new RangeError('The recording is not attached to a coupon.')
        const coupon = await call('readCoupon', { params: { id: couponId } })
        const energy = quantity(Math.round(recording.figures.energy), 'energy')
        const runSheet = coupon.content.runSheet.map((row) => (row.id === runRowId ? { ...row, instantaneousEnergy: energy, length: row.length ?? (weldLength === null ? null : quantity(weldLength, 'length')) } : row))
        return call('saveCoupon', { params: { id: couponId }, body: { content: { ...coupon.content, runSheet } }, ifMatch: coupon.version })
      },
      onSuccess: (coupon) => {
        client.setQueryData(query('readCoupon', { params: { id: coupon.id } }).queryKey, coupon)
        void client.invalidateQueries({ queryKey: ['readArcRecording'] })
      },
    }),
  }
}
