import type { z } from 'zod'
import { DUE_SOON_DAYS } from '@shared/machines/calibration.ts'
import type { Role } from '@shared/schemas/people.ts'
import type { todaySchema } from '@shared/schemas/records.ts'
import type { Tenant } from '../config/database.ts'
import type { Actor } from '../policies/index.ts'
import { rows } from './query.ts'

type Today = z.output<typeof todaySchema>

/** One kind of work that waits for a role. `sql` gives title, detail, href, at; `$me` is the person who asks. */
interface Source { kind: string; roles: readonly Role[]; sql: string }

const revisions = (condition: string, detail: string, page = '') => `
  select r.number || ' ' || r.revision as title, ${detail} as detail, '/revisions/' || r.id || '${page}' as href, r.updated_at as at
  from procedure_revisions r join people author on author.organization_id = r.organization_id and author.id = r.author_id
  where r.organization_id = $organizationId and ${condition}`

const coupons = (condition: string, detail: string) => `
  select c.number as title, ${detail} as detail, '/coupons/' || c.id as href, c.updated_at as at
  from coupons c where c.organization_id = $organizationId and ${condition}`

/** The last act on the revision was to return it. */
const wasReturned = `(select s.meaning from signatures s where s.organization_id = r.organization_id and s.revision_id = r.id order by s.signed_at desc limit 1) = 'returned'`
const returnedComment = `(select s.person_name || ': ' || s.reason from signatures s where s.organization_id = r.organization_id and s.revision_id = r.id order by s.signed_at desc limit 1)`

const SOURCES: readonly Source[] = [
  { kind: 'returned', roles: ['engineer'], sql: revisions(`r.state = 'draft' and ${wasReturned}`, returnedComment) },
  { kind: 'draft', roles: ['engineer'], sql: revisions(`r.state = 'draft' and r.author_id = $me and not coalesce(${wasReturned}, false)`, 'r.title') },
  { kind: 'review', roles: ['supervisor'], sql: revisions("r.state = 'in-review' and not $me = any(r.contributors)", "r.title || ', by ' || author.name", '/review') },
  { kind: 'certify', roles: ['supervisor', 'inspector'], sql: coupons("c.state = 'testing'", 'c.title') },
  { kind: 'coupon', roles: ['inspector'], sql: coupons("c.state in ('planned', 'welding')", 'c.title') },
  { kind: 'approved', roles: ['auditor', 'welder'], sql: revisions("r.state = 'approved' and r.decided_at > now() - interval '60 days'", "r.title") },
  {
    kind: 'joint', roles: ['welder'],
    sql: `select 'Joint ' || t.number || ' of ' || j.number as title, coalesce(t.mark || ', ', '') || r.number || ' ' || r.revision as detail, '/shop/' || r.id || '?joint=' || t.id as href, j.updated_at as at
      from job_joints t join jobs j on j.organization_id = t.organization_id and j.id = t.job_id
      join procedure_revisions r on r.organization_id = t.organization_id and r.id = t.revision_id and r.state = 'approved'
      where t.organization_id = $organizationId`,
  },
  {
    kind: 'job', roles: ['engineer', 'supervisor'],
    sql: `select j.number as title, count(*) || case when count(*) = 1 then ' joint' else ' joints' end || ' without a procedure in force' as detail, '/jobs/' || j.id as href, j.updated_at as at
      from jobs j join job_joints t on t.organization_id = j.organization_id and t.job_id = j.id
      left join procedure_revisions r on r.organization_id = t.organization_id and r.id = t.revision_id
      where j.organization_id = $organizationId and r.state is distinct from 'approved' group by j.id`,
  },
  {
    kind: 'calibration', roles: ['engineer', 'administrator'],
    sql: `select m.number || ' ' || m.name as title, case when m.calibration_due_on < current_date then 'calibration lapsed on ' else 'calibration due on ' end || to_char(m.calibration_due_on, 'FMDD FMMonth YYYY') as detail, '/machines/' || m.id || '#calibration' as href, m.updated_at as at
      from machines m where m.organization_id = $organizationId and not m.retired and m.calibration_due_on <= current_date + ${DUE_SOON_DAYS}`,
  },
  { kind: 'invitation', roles: ['administrator'], sql: `select p.name as title, 'invited, not yet here: ' || p.email as detail, '/people' as href, p.created_at as at from people p where p.organization_id = $organizationId and p.state = 'invited'` },
  { kind: 'mail', roles: ['administrator'], sql: `select m.subject as title, coalesce(m.error, 'not sent') as detail, '/outbox/' || m.id as href, m.created_at as at from outbox_mails m where m.organization_id = $organizationId and m.state = 'failed'` },
]

const SHOWN = 20
interface Row { title: string; detail: string | null; href: string; at: Date; total: number }

/** What waits for the person who asks, by the roles they hold; the newest of each kind, and how many there are in all. */
export async function readToday(tenant: Tenant, actor: Actor): Promise<Today> {
  const mine = SOURCES.filter(({ roles }) => roles.some((role) => actor.roles.includes(role)))
  const tasks: Today['tasks'] = []
  const counts: Today['counts'] = {}
  for (const { kind, sql } of mine) {
    const found = await rows<Row>(tenant, `select *, (count(*) over ())::int as total from (${sql}) as waiting order by at desc limit ${SHOWN}`, { organizationId: tenant.organizationId, ...(sql.includes('$me') && { me: actor.id }) })
    counts[kind] = found[0]?.total ?? 0
    for (const { title, detail, href, at } of found) tasks.push({ kind, title, detail: detail ?? '', href, at: at.toISOString() })
  }
  return { tasks, counts }
}
