import { useQuery } from '@tanstack/react-query'
import { useState, type FormEvent } from 'react'
import { Link, Navigate, useNavigate, useParams } from 'react-router-dom'
import { revisionName, statementOf } from '@shared/records/statements.ts'
import type { Finding } from '@shared/schemas/assessment.ts'
import type { Comparison, Revision } from '@shared/schemas/records.ts'
import type { RevisionImpacts } from '@shared/schemas/standards.ts'
import { Button, buttonClass } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextArea, TextField } from '@/components/fields/text.tsx'
import { ImpactTable } from '@/components/impact/ImpactTable.tsx'
import { MarginNote } from '@/components/margin/MarginNote.tsx'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Stamp, type StampState } from '@/components/Stamp.tsx'
import { Breadcrumb, ErrorState, RecordError, Skeleton } from '@/components/states.tsx'
import { say } from '@/components/toast.tsx'
import { VerdictTally } from '@/components/Verdict.tsx'
import { useSession } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { hrefOf } from '@/lib/api.ts'
import { asProblem } from '@/lib/problem.ts'
import { assessmentQuery, comparisonQuery, impactQuery, revisionQuery, useRevisionActs } from '../api.ts'
import { ProcedureTitle } from '../components/ProcedureTitle.tsx'
import { nameOf } from '../dialogs/acts.tsx'
import { blocking, gaugeOf, needing } from '@/components/variables/findings.ts'
import { missingInWords } from '@/components/variables/labels.ts'
import { standardName } from '@/components/variables/options.ts'

/** A revision under review: what changed, what the standard says, what carries it, and the act of signing. */
export function ReviewPage() {
  const { id = '' } = useParams()
  const revision = useQuery(revisionQuery(id))
  const comparison = useQuery(comparisonQuery(id))
  const impact = useQuery(impactQuery(id))
  const assessed = useQuery(assessmentQuery(id))
  if (revision.isPending) return <Skeleton rows={10} label="Reading the procedure" />
  if (!revision.data) return <RecordError title="The procedure can’t be shown" error={revision.error} onRetry={() => void revision.refetch()} />
  if (revision.data.state !== 'in-review') return <Navigate replace to={`/revisions/${id}`} />
  const { content, coupons } = revision.data
  const assessments = assessed.data?.assessments ?? []
  const open = needing(assessments).map((finding) => ({ ...finding, missing: missingInWords(finding.missing, content) }))
  const stands = blocking(open)
  const lesser = open.filter((finding) => !stands.includes(finding))
  const couponNumber = (couponId: string) => coupons.find((one) => one.id === couponId)?.number
  const key = (finding: Finding) => `${finding.standard} ${finding.ruleId} ${finding.field}`
  return (
    <>
      <Breadcrumb trail={[{ label: 'Procedures', to: '/procedures' }, { label: nameOf(revision.data), to: `/revisions/${id}` }, { label: 'Review' }]} />
      <ProcedureTitle revision={revision.data} content={content} couponNumbers={coupons} />
      <div className="mt-4 grid items-start gap-x-6 gap-y-4 xl:grid-cols-[minmax(0,1fr)_24rem]">
        <div className="min-w-0 space-y-4">
          <Sheet title="What the standard says" aside={assessments.map(({ standard, edition }) => `${standardName(standard)} ${edition}`).join(', ')}>
            <div className="space-y-3 px-4 py-3">
              {assessed.isPending && <p role="status" className="text-soft">Judging the procedure by its coupons…</p>}
              {assessed.isError && <ErrorState compact error={assessed.error} onRetry={() => void assessed.refetch()} />}
              {assessments.map(({ standard, counts }) => (
                <VerdictTally key={standard} counts={counts} />
              ))}
              {assessed.data && stands.length === 0 && <p>Every essential finding is within what the coupons qualify.</p>}
              {stands.map((finding) => (
                <FindingWithGauge key={key(finding)} finding={finding} couponNumber={couponNumber} />
              ))}
              {lesser.length > 0 && (
                <details>
                  <summary className="cursor-pointer font-medium">
                    {lesser.length} nonessential {lesser.length === 1 ? 'finding' : 'findings'}, to be addressed but not requalified
                  </summary>
                  <div className="mt-2 space-y-2">
                    {lesser.map((finding) => (
                      <MarginNote key={key(finding)} finding={finding} couponNumber={couponNumber} />
                    ))}
                  </div>
                </details>
              )}
            </div>
          </Sheet>
          <Sheet title="What changed" aside={comparison.data?.from ? `since rev ${comparison.data.from.revision}` : undefined}>
            {comparison.isPending && <p role="status" className="px-4 py-3 text-soft">Comparing…</p>}
            {comparison.isError && <ErrorState compact error={comparison.error} onRetry={() => void comparison.refetch()} />}
            {comparison.data && <Changes comparison={comparison.data} impacts={impact.data?.impacts ?? []} id={id} />}
            {impact.isError && <ErrorState compact error={impact.error} onRetry={() => void impact.refetch()} />}
          </Sheet>
          <Sheet title="Coupons" aside={coupons.length === 0 ? 'none linked' : `${coupons.length} linked`}>
            {coupons.length === 0 ? (
              <p className="px-4 py-3">No coupon supports this procedure.</p>
            ) : (
              <ul>
                {coupons.map((coupon) => (
                  <li key={coupon.id} className="sheet-row flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-hair px-4 py-2.5 last:border-b-0">
                    <Link to={`/coupons/${coupon.id}`} className="text-link font-semibold">
                      {coupon.number}
                    </Link>
                    <span className="min-w-0 grow">{coupon.title}</span>
                    <Stamp small state={coupon.status as StampState} />
                  </li>
                ))}
              </ul>
            )}
          </Sheet>
        </div>
        <Decision revision={revision.data} stands={stands} judged={assessed.isSuccess} />
      </div>
    </>
  )
}

/** A finding with its figures drawn beside it, as it stands on the sheet. */
function FindingWithGauge({ finding, couponNumber }: { finding: Finding; couponNumber: (id: string) => string | undefined }) {
  const { system } = useUnits()
  const drawn = gaugeOf([finding])
  return (
    <div className="grid gap-x-6 gap-y-1 md:grid-cols-[minmax(0,1fr)_18rem] md:items-center">
      <MarginNote finding={finding} couponNumber={couponNumber} />
      {drawn && <RangeGauge label={finding.title} range={drawn.range} asked={drawn.asked} tested={drawn.tested} system={system} />}
    </div>
  )
}

/** What changed; under each of its standards, what that means. */
function Changes({ comparison: { from, changes }, impacts, id }: { comparison: Comparison; impacts: RevisionImpacts['impacts']; id: string }) {
  if (!from)
    return (
      <p className="px-4 py-3">
        This is the first revision, so all of it is new. <Link to={`/revisions/${id}`} className="text-link">Read the whole sheet</Link>.
      </p>
    )
  if (changes.length === 0) return <p className="px-4 py-3">Nothing differs from the approved revision.</p>
  if (impacts.length > 0) return impacts.map((impact) => <ImpactTable key={`${impact.standard} ${impact.edition}`} impact={impact} name={standardName(impact.standard)} />)
  return (
    <dl>
      {changes.map(({ field, label, before, after }) => (
        <div key={field} className="sheet-row grid gap-x-4 gap-y-0.5 border-b border-hair px-4 py-2.5 last:border-b-0 sm:grid-cols-[12rem_minmax(0,1fr)_minmax(0,1fr)]">
          <dt className="font-medium">{label}</dt>
          <dd className="min-w-0 break-words text-soft">
            <span className="sr-only">before: </span>
            {before === null ? 'not stated' : <del className="decoration-oxide">{before}</del>}
          </dd>
          <dd className="min-w-0 font-medium break-words">
            <span className="sr-only">now: </span>
            {after ?? 'not stated'}
          </dd>
        </div>
      ))}
    </dl>
  )
}

/** Approve by signature, or return with a comment. */
function Decision({ revision, stands, judged }: { revision: Revision; stands: readonly Finding[]; judged: boolean }) {
  const navigate = useNavigate()
  const { person } = useSession()
  const acts = useRevisionActs(revision)
  const [password, setPassword] = useState('')
  const [reason, setReason] = useState('')
  const [wrong, setWrong] = useState<{ password?: string; reason?: string }>({})
  const [refusal, setRefusal] = useState<string | undefined>()
  const [returning, setReturning] = useState(false)
  const { may } = revision
  const back = () => void navigate(`/revisions/${revision.id}`)
  const sign = async (event: FormEvent) => {
    event.preventDefault()
    if (acts.approve.isPending) return
    const missing: typeof wrong = {}
    if (stands.length > 0 && reason.trim() === '') missing.reason = 'Give the reason for approving with these findings; it is printed on the procedure.'
    if (password === '') missing.password = 'Re-enter your password to sign.'
    setWrong(missing)
    setRefusal(undefined)
    if (missing.password || missing.reason) return
    try {
      await acts.approve.mutateAsync({ password, deviationReason: reason.trim() || null })
      say(`${nameOf(revision)} is approved`)
      back()
    } catch (error) {
      const problem = asProblem(error)
      const at = problem.fields.find(({ field }) => field === 'password')
      setPassword('')
      if (at) setWrong({ password: at.message })
      else setRefusal(problem.message)
    }
  }
  return (
    <aside aria-label="Decision" className="space-y-3 border border-ink bg-sheet p-4 xl:sticky xl:top-4">
      <div className="flex flex-wrap gap-2">
        <Link to={`/revisions/${revision.id}`} className={buttonClass()}>
          Whole sheet
        </Link>
        <a className={buttonClass()} href={hrefOf('printRevision', { id: revision.id })} target="_blank" rel="noreferrer">
          PDF preview
        </a>
      </div>
      {may.includes('approve') ? (
        <form noValidate className="space-y-4 border-t border-rule pt-3" onSubmit={(event) => void sign(event)}>
          <div>
            <p className="cell-label">You sign</p>
            <blockquote className="mt-1 border-l-2 border-ink pl-3 text-lg text-pretty">{statementOf({ meaning: 'approved', record: revisionName(revision.number, revision.revision), name: person?.name ?? '', role: 'supervisor', deviations: stands.length })}</blockquote>
            <p className="mt-2 text-soft">From then on {nameOf(revision)} can&rsquo;t be changed, and the shop sees it in place of any revision approved before, which is superseded.</p>
          </div>
          {stands.length > 0 && <TextArea label="Reason" rows={4} maxLength={2000} description={`${stands.length === 1 ? 'One finding is' : `${stands.length} findings are`} outside or cannot be told. Your reason is printed with them.`} value={reason} error={wrong.reason} onChange={(event) => setReason(event.target.value)} />}
          <TextField label="Your password" type="password" autoComplete="current-password" value={password} error={wrong.password} onChange={(event) => setPassword(event.target.value)} />
          <FormError message={refusal} />
          <div className="flex flex-wrap gap-2">
            <Button kind="primary" type="submit" pending={acts.approve.isPending} disabled={!judged}>
              Approve and sign
            </Button>
            {may.includes('return') && <Button onClick={() => setReturning(true)}>Return with a comment</Button>}
          </div>
        </form>
      ) : (
        <div className="space-y-3 border-t border-rule pt-3">
          <p className="text-pretty">{revision.author.id === person?.id ? 'You wrote this revision, so somebody else has to approve it. A second pair of eyes is the point of the signature.' : 'A supervisor decides on this revision. You can read it here meanwhile.'}</p>
          {may.includes('return') && <Button onClick={() => setReturning(true)}>Return with a comment</Button>}
        </div>
      )}
      {returning && <ReturnDialog revision={revision} onClose={() => setReturning(false)} onReturn={async (comment) => {
        await acts.sendBack.mutateAsync(comment)
        say(`${nameOf(revision)} went back to ${revision.author.name}`)
        back()
      }} />}
    </aside>
  )
}

function ReturnDialog({ revision, onClose, onReturn }: { revision: Revision; onClose: () => void; onReturn: (comment: string) => Promise<void> }) {
  const [comment, setComment] = useState('')
  const [wrong, setWrong] = useState<string | null>(null)
  const [pending, setPending] = useState(false)
  const [refusal, setRefusal] = useState<string | undefined>()
  const submit = async (event: FormEvent) => {
    event.preventDefault()
    if (pending) return
    if (comment.trim() === '') return setWrong('Say what should change.')
    setWrong(null)
    setPending(true)
    try {
      await onReturn(comment.trim())
    } catch (error) {
      setRefusal(asProblem(error).message)
      setPending(false)
    }
  }
  return (
    <Dialog title="Return with a comment" isOpen onClose={onClose} dismissable={comment === ''}>
      <form noValidate className="space-y-4" onSubmit={(event) => void submit(event)}>
        <p className="text-pretty">
          {nameOf(revision)} goes back to {revision.author.name} as a draft, with your comment above the sheet. It can be sent for review again.
        </p>
        <TextArea label="What should change" rows={5} maxLength={4000} value={comment} error={wrong} onChange={(event) => setComment(event.target.value)} />
        <FormError message={refusal} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Not yet</Button>
          <Button kind="primary" type="submit" pending={pending}>
            Return it
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
