import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Role } from '@shared/schemas/people.ts'
import { ButtonLink } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { EmptyState, ErrorState, PageHead, Skeleton } from '@/components/states.tsx'
import { useSession } from '@/hooks/session.ts'
import { day } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'

/** What a role comes here to do: the sentence under the head, and the first step when nothing waits. */
const ROLE: Record<Role, { about: string; step: { label: string; to: string; action: string } }> = {
  engineer: { about: 'Drafts to finish, reviews that came back, coupons that decide.', step: { label: 'Draft a procedure', to: '/procedures/new', action: 'procedures.draft' } },
  inspector: { about: 'Coupons to witness, test results to enter, records to certify.', step: { label: 'See the coupons', to: '/coupons', action: 'coupons.read' } },
  supervisor: { about: 'Procedures that wait for your signature, and the jobs they serve.', step: { label: 'See the procedures', to: '/procedures', action: 'procedures.read' } },
  welder: { about: 'Find the procedure for the joint in front of you.', step: { label: 'Find a procedure', to: '/look-up', action: 'lookup.read' } },
  auditor: { about: 'Everything can be read, nothing can be changed.', step: { label: 'Read the procedures', to: '/procedures', action: 'procedures.read' } },
  administrator: { about: 'People, their roles, and what the program sends.', step: { label: 'See the people', to: '/people', action: 'people.read' } },
}
const KIND: Record<string, string> = { draft: 'Draft', review: 'Review', returned: 'Returned', coupon: 'Coupon', testing: 'Testing', certify: 'Certify', job: 'Job', invitation: 'Invitation', mail: 'Mail', calibration: 'Calibration', approved: 'Approved' }
/** What is merely there to be used stands apart from what waits for somebody's hand. */
const GROUPS = [
  { title: 'Waiting for you', holds: (kind: string) => kind !== 'approved' && kind !== 'joint' },
  { title: 'Joints to weld', holds: (kind: string) => kind === 'joint' },
  { title: 'Newly in force', holds: (kind: string) => kind === 'approved' },
]
const words = (name: string) => name.replace(/([a-z])([A-Z])/g, '$1 $2').replace(/[-_.]/g, ' ').toLowerCase()

export function TodayPage() {
  const { person, may } = useSession()
  const { data, error, refetch } = useQuery(query('readToday'))
  const roles = person?.roles ?? []
  const steps = [...new Map(roles.map((role) => [ROLE[role].step.to, ROLE[role].step])).values()].filter(({ action }) => may.includes(action))
  const groups = GROUPS.map(({ title, holds }) => ({ title, tasks: (data?.tasks ?? []).filter(({ kind }) => holds(kind)) })).filter(({ tasks }) => tasks.length > 0)
  const counts = Object.entries(data?.counts ?? {})
  return (
    <>
      <PageHead
        title="Today"
        actions={steps.map(({ label, to }, index) => (
          <ButtonLink key={to} to={to} kind={index === 0 ? 'primary' : 'secondary'}>
            {label}
          </ButtonLink>
        ))}
      >
        {roles.map((role) => ROLE[role].about).join(' ')}
      </PageHead>
      {error && <ErrorState error={error} onRetry={() => void refetch()} />}
      {!data && !error && <Skeleton label="Reading what waits" />}
      {data && (
        <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,1fr)_17rem]">
          {data.tasks.length > 0 ? (
            <div className="grid gap-5">
              {groups.map(({ title, tasks }) => (
                <Sheet key={title} title={title} aside={tasks.length === 1 ? 'one thing' : `${tasks.length} things`}>
                  <ol>
                    {tasks.map((task) => (
                      <li key={`${task.kind} ${task.href} ${task.title}`} className="relative grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 border-b border-hair px-4 py-3 last:border-b-0 hover:bg-paper sm:grid-cols-[6.5rem_minmax(0,1fr)_auto]">
                        <span className="cell-label pt-0.5 max-sm:col-span-2">{KIND[task.kind] ?? words(task.kind)}</span>
                        <span className="min-w-0">
                          <Link to={task.href} className="font-semibold after:absolute after:inset-0 hover:underline">
                            {task.title}
                          </Link>
                          <span className="block text-soft">{task.detail}</span>
                        </span>
                        <time dateTime={task.at} className="text-soft">
                          {day(task.at)}
                        </time>
                      </li>
                    ))}
                  </ol>
                </Sheet>
              ))}
            </div>
          ) : (
            <EmptyState title="Nothing waits for you" step={steps[0] && <ButtonLink to={steps[0].to}>{steps[0].label}</ButtonLink>}>
              <p>Whatever needs your hand shows up here: a draft to finish, a coupon to test, a signature to give.</p>
            </EmptyState>
          )}
          {counts.length > 0 && (
            <Sheet title="In the house">
              <dl>
                {counts.map(([name, count]) => (
                  <div key={name} className="flex items-baseline justify-between gap-4 border-b border-hair px-4 py-2 last:border-b-0">
                    <dt className="text-soft first-letter:uppercase">{words(name)}</dt>
                    <dd className="font-narrow text-xl font-semibold">{count}</dd>
                  </div>
                ))}
              </dl>
            </Sheet>
          )}
        </div>
      )}
    </>
  )
}
