import type { Tenant } from '../config/database.ts'
import { row } from './query.ts'

const SERIES = { procedures: 'WPS', coupons: 'PQR', jobs: 'JOB', machines: 'M', trials: 'T' } as const

/**
 * The organization's next number of a series: WPS-001, PQR-001, JOB-001, M-001, T-001. The series' row stays locked until the transaction ends,
 * so two at once get two numbers, and a number is never given twice, even when its record was discarded.
 */
export async function nextNumber(tenant: Tenant, series: keyof typeof SERIES): Promise<string> {
  const { last } = await row<{ last: number }>(
    tenant,
    `insert into number_series (organization_id, series, last) values ($organizationId, $series, 1)
     on conflict (organization_id, series) do update set last = number_series.last + 1 returning last`,
    { organizationId: tenant.organizationId, series },
  )
  return `${SERIES[series]}-${String(last).padStart(3, '0')}`
}
