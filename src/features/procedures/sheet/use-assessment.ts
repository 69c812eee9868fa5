import { useQueries } from '@tanstack/react-query'
import { useDeferredValue, useMemo } from 'react'
import { assess } from '@shared/assessment/assess.ts'
import type { AssessedCoupon, Assessment } from '@shared/schemas/assessment.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { query } from '@/lib/query.ts'
import { couponQuery } from '../api.ts'

const asAssessed = (coupon: Coupon): AssessedCoupon => ({ id: coupon.id, number: coupon.number, certified: coupon.state === 'certified', content: coupon.content })

/** Coupons of several processes stand in several lists, and are one coupon. */
const joined = (results: readonly { data?: { items: AssessedCoupon[] } | undefined }[]): AssessedCoupon[] => [...new Map(results.flatMap(({ data }) => data?.items ?? []).map((coupon) => [coupon.id, coupon])).values()]

export interface Judged {
  assessments: Assessment[]
  /** A linked coupon is still being read: what is said of it so far is not the last word. */
  reading: boolean
  couponNumber: (id: string) => string | undefined
}

/**
 * Judges the content by its coupons under each of its standards, here in the browser, after every change.
 * @param offer also reads certified coupons that are not linked, so that a fix can link one
 */
export function useAssessment(content: ProcedureContent, offer: boolean): Judged {
  const ids = content.supportingCoupons
  const linked = useQueries({ queries: ids.map((id) => ({ ...couponQuery(id), staleTime: 60_000 })), combine: (results) => ({ coupons: results.flatMap(({ data }) => (data ? [data] : [])), reading: results.some(({ isPending }) => isPending) }) })
  const processes = [...new Set(content.variables.processes.flatMap(({ process }) => process ?? []))]
  const stored = useQueries({ queries: processes.map((process) => ({ ...query('listCertifiedCoupons', { query: { process } }), enabled: offer, staleTime: 300_000 })), combine: joined })

  // Typing comes first: the verdicts follow when there is time.
  const judged = useDeferredValue(content)
  const assessments = useMemo(() => {
    const coupons = linked.coupons.map(asAssessed)
    const otherCoupons = stored.filter(({ id }) => !judged.supportingCoupons.includes(id))
    return judged.variables.standards.map(({ standard, edition, level, route }) => assess({ procedure: judged, coupons, standard, edition, level, route, otherCoupons }))
  }, [judged, linked.coupons, stored])
  const numbers = useMemo(() => new Map([...linked.coupons, ...stored].map(({ id, number }) => [id, number])), [linked.coupons, stored])
  return { assessments, reading: linked.reading, couponNumber: (id) => numbers.get(id) }
}
