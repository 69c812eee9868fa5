import type { z } from 'zod'
import type { Page } from '@shared/schemas/common.ts'
import type { endpoints } from '@shared/schemas/endpoints.ts'
import type { ProcedureRow, RevisionState } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import { listPage, type KeysetList } from './keyset.ts'

interface Row {
  id: string
  number: string
  title: string
  revisionId: string
  revision: string
  state: RevisionState
  processes: string[]
  standards: string[]
  metals: string
  thicknessMin: number | null
  thicknessMax: number | null
  positions: string[]
  authorId: string
  authorName: string
  updatedAt: Date
  approvedRevisionId: string | null
}

const list: Omit<KeysetList, 'where' | 'bind'> = {
  id: 'p.id',
  select: `p.id, p.number, r.title, r.id as "revisionId", r.revision, r.state, r.processes, r.standards, r.metals_label as metals, r.thickness_min as "thicknessMin",
    r.thickness_max as "thicknessMax", r.positions, r.author_id as "authorId", author.name as "authorName", r.updated_at as "updatedAt", approved.id as "approvedRevisionId"`,
  from: `procedures p
    join lateral (select * from procedure_revisions n where n.organization_id = p.organization_id and n.procedure_id = p.id order by n.ordinal desc limit 1) r on true
    join people author on author.organization_id = r.organization_id and author.id = r.author_id
    left join procedure_revisions approved on approved.procedure_id = p.id and approved.state = 'approved'`,
  sorts: {
    number: { expression: "substring(p.number from '[0-9]+$')::integer", type: 'integer' },
    updatedAt: { expression: 'r.updated_at', type: 'timestamptz' },
    title: { expression: 'lower(r.title)', type: 'text' },
  },
  searched: "p.number || ' ' || r.title || ' ' || r.metals_label || ' ' || array_to_string(r.processes || r.positions || r.metals, ' ')",
}


/** The organization's procedures; the newest revision of each stands for it. */
export async function listProcedures(tenant: Tenant, query: z.output<(typeof endpoints)['listProcedures']['query']>): Promise<Page<ProcedureRow>> {
  const where = ['p.organization_id = $organizationId']
  const bind: Record<string, unknown> = { organizationId: tenant.organizationId }
  if (query.state) {
    where.push('r.state = $state')
    bind.state = query.state
  }
  if (query.process) {
    where.push('r.processes @> array[$process::text]')
    bind.process = query.process
  }
  if (query.standard) {
    where.push('r.standards @> array[$standard::text]')
    bind.standard = query.standard
  }
  const page = await listPage<Row>(tenant, { ...list, where, bind }, query, 'number')
  return { ...page, items: page.items.map(({ authorId, authorName, updatedAt, ...row }) => ({ ...row, author: { id: authorId, name: authorName }, updatedAt: updatedAt.toISOString() })) }
}
