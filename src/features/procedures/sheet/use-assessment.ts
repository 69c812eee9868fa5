import { useQueries, useQuery } from '@tanstack/react-query'
import { useDeferredValue, useMemo } from 'react'
import { assess } from '@shared/assessment/assess.ts'
import type { AssessedCoupon, Assessment } from '@shared/schemas/assessment.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import type { ProcedureContent } from '@shared/schemas/welding.ts'
import { query } from '@/lib/query.ts'
import { couponQuery } from '../api.ts'

/** Coupons looked at beyond those linked, to offer one that would cure a finding. */
const OTHERS = 12

const asAssessed = (coupon: Coupon): AssessedCoupon => ({ id: coupon.id, number: coupon.number, certified: coupon.state === 'certified', content: coupon.content })

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
  const list = useQuery({ ...query('listCoupons', { query: { state: 'certified', limit: OTHERS } }), enabled: offer, staleTime: 60_000 })
  const otherIds = offer ? (list.data?.items ?? []).map(({ id }) => id).filter((id) => !ids.includes(id)) : []
  const others = useQueries({ queries: otherIds.map((id) => ({ ...couponQuery(id), staleTime: 300_000 })), combine: (results) => results.flatMap(({ data }) => (data ? [data] : [])) })

  // Typing comes first: the verdicts follow when there is time.
  const judged = useDeferredValue(content)
  const assessments = useMemo(() => {
    const coupons = linked.coupons.map(asAssessed)
    const otherCoupons = others.map(asAssessed)
    return judged.variables.standards.map(({ standard, edition, level, route }) => assess({ procedure: judged, coupons, standard, edition, level, route, otherCoupons }))
  }, [judged, linked.coupons, others])
  const numbers = useMemo(() => new Map([...linked.coupons, ...others].map(({ id, number }) => [id, number])), [linked.coupons, others])
  return { assessments, reading: linked.reading, couponNumber: (id) => numbers.get(id) }
}
