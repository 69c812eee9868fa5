import type { z } from 'zod'
import type { Page } from '@shared/schemas/common.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import type { CouponRow, CouponState } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { listPage, type KeysetList } from './keyset.ts'

interface Row {
  id: string
  number: string
  title: string
  state: CouponState
  procedureNumber: string | null
  revisionId: string | null
  processes: string[]
  metals: string
  thickness: number | null
  positions: string[]
  weldedOn: string | null
  inspectorId: string
  inspectorName: string
  photoCount: number
  updatedAt: Date
}

const list: Omit<KeysetList, 'where' | 'bind'> = {
  id: 'c.id',
  select: `c.id, c.number, c.title, c.state, r.number as "procedureNumber", c.revision_id as "revisionId", c.processes, c.metals_label as metals,
    c.thickness_max as thickness, c.positions, c.welded_on::text as "weldedOn", c.inspector_id as "inspectorId", inspector.name as "inspectorName",
    (select count(*)::int from photos where photos.organization_id = c.organization_id and photos.coupon_id = c.id) as "photoCount", c.updated_at as "updatedAt"`,
  from: `coupons c
    join people inspector on inspector.organization_id = c.organization_id and inspector.id = c.inspector_id
    left join procedure_revisions r on r.organization_id = c.organization_id and r.id = c.revision_id`,
  sorts: {
    number: { expression: "substring(c.number from '[0-9]+$')::integer", type: 'integer' },
    updatedAt: { expression: 'c.updated_at', type: 'timestamptz' },
  },
  searched: "c.number || ' ' || c.title || ' ' || c.metals_label || ' ' || coalesce(r.number, '') || ' ' || array_to_string(c.processes || c.positions || c.metals, ' ')",
}

/** The organization's coupons and qualification records. */
export async function listCoupons(tenant: Tenant, query: z.output<(typeof endpoints)['listCoupons']['query']>): Promise<Page<CouponRow>> {
  const where = ['c.organization_id = $organizationId']
  const bind: Record<string, unknown> = { organizationId: tenant.organizationId }
  if (query.state) {
    where.push('c.state = $state')
    bind.state = query.state
  }
  if (query.process) {
    where.push('c.processes @> array[$process::text]')
    bind.process = query.process
  }
  const page = await listPage<Row>(tenant, { ...list, where, bind }, query, 'number')
  return { ...page, items: page.items.map(({ inspectorId, inspectorName, updatedAt, ...row }) => ({ ...row, inspector: { id: inspectorId, name: inspectorName }, updatedAt: updatedAt.toISOString() })) }
}
