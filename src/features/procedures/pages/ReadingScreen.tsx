import { useQuery } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { revisionName, statementOf } from '@shared/records/statements.ts'
import type { Revision } from '@shared/schemas/records.ts'
import { Button, ButtonLink, buttonClass } from '@/components/Button.tsx'
import { ConfirmSign } from '@/components/ConfirmSign.tsx'
import { MarginLayout } from '@/components/margin/MarginLayout.tsx'
import { Breadcrumb } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useSession } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { hrefOf } from '@/lib/api.ts'
import { procedureQuery, useRevisionActs } from '../api.ts'
import { ProcedureTitle } from '../components/ProcedureTitle.tsx'
import { Returned } from '../components/Returned.tsx'
import { RevisionTrail } from '../components/RevisionTrail.tsx'
import { Signatures } from '@/components/record/Signatures.tsx'
import { MailDialog } from '@/components/record/MailDialog.tsx'
import { nameOf } from '../dialogs/acts.tsx'
import { placedRows } from '@/components/variables/catalogue.ts'
import { SheetContext } from '@/components/variables/context.ts'
import { placeFindings, sectionVerdicts } from '@/components/variables/findings.ts'
import { MarginHead } from '../sheet/MarginHead.tsx'
import { ProcedureNav, ProcedureSheets } from '../sheet/ProcedureSheets.tsx'
import { useAssessment } from '../sheet/use-assessment.ts'

/** A revision as it stands: values as text, gauges drawn, signatures listed. For whoever may not edit it, and for every revision that is decided. */
export function ReadingScreen({ revision }: { revision: Revision }) {
  const navigate = useNavigate()
  const { system } = useUnits()
  const { person, mailIsCaught } = useSession()
  const procedure = useQuery(procedureQuery(revision.procedureId))
  const acts = useRevisionActs(revision)
  const [open, setOpen] = useState<'mail' | 'withdraw' | null>(null)
  const [attention, setAttention] = useState(false)
  const [tab, setTab] = useState(0)
  const { content, may } = revision
  const { assessments, reading, couponNumber } = useAssessment(content, false)
  const shown = Math.min(tab, assessments.length - 1)
  const rows = useMemo(() => placedRows(content.variables.processes), [content])
  const findings = useMemo(() => placeFindings(assessments[shown]?.findings ?? [], rows), [assessments, shown, rows])
  const verdicts = useMemo(() => sectionVerdicts(findings, rows), [findings, rows])
  const number = (id: string) => couponNumber(id) ?? revision.coupons.find((one) => one.id === id)?.number
  const returned = revision.state === 'draft' ? [...revision.signatures].reverse().find(({ meaning }) => meaning === 'returned') : undefined

  const revise = () =>
    acts.revise.mutate(undefined, {
      onSuccess: (next) => {
        say(`${nameOf(next)} is open as a draft`)
        void navigate(`/revisions/${next.id}`)
      },
      onError: sayProblem,
    })
  const review = may.includes('approve') || may.includes('return')
  return (
    <SheetContext value={{ content, system, control: null, findings, attention, couponNumber: number }}>
      <Breadcrumb trail={[{ label: 'Procedures', to: '/procedures' }, { label: nameOf(revision) }]} />
      <ProcedureTitle revision={revision} content={content} couponNumbers={content.supportingCoupons.map((id) => ({ id, number: number(id) ?? '…' }))} />
      {returned && <Returned comment={returned.reason ?? ''} by={returned.person.name} />}
      <div className="mt-4">
        <MarginLayout
          nav={<ProcedureNav verdicts={verdicts} />}
          head={
            <>
              <div className="no-print flex flex-wrap items-center gap-2">
                {review && (
                  <ButtonLink kind="primary" to={`/revisions/${revision.id}/review`}>
                    Review
                  </ButtonLink>
                )}
                {may.includes('revise') && (
                  <Button kind="primary" pending={acts.revise.isPending} onClick={revise}>
                    Revise
                  </Button>
                )}
                <a className={buttonClass()} href={hrefOf('printRevision', { id: revision.id })} target="_blank" rel="noreferrer">
                  Print
                </a>
                {revision.state === 'approved' && <ButtonLink to={`/machines/card?revision=${revision.id}`}>Panel card</ButtonLink>}
                {may.includes('send') && <Button onClick={() => setOpen('mail')}>E-mail</Button>}
                {may.includes('withdraw') && (
                  <Button kind="quiet" onClick={() => setOpen('withdraw')}>
                    Withdraw
                  </Button>
                )}
              </div>
              <RevisionTrail revisions={procedure.data?.revisions ?? []} current={revision.id} />
              <MarginHead assessments={assessments} shown={shown} onShow={setTab} attention={attention} onAttention={setAttention} reading={reading} />
            </>
          }
        >
          <ProcedureSheets />
          {revision.deviationReason && (
            <section aria-label="Reason for the deviation" className="border border-straw bg-straw-bg px-4 py-3">
              <p className="cell-label">Approved with findings, for this reason</p>
              <p className="mt-1 max-w-prose whitespace-pre-line">{revision.deviationReason}</p>
            </section>
          )}
          <Signatures signatures={revision.signatures} />
        </MarginLayout>
      </div>
      {open === 'mail' && (
        <MailDialog
          isOpen
          onClose={() => setOpen(null)}
          title="E-mail the procedure"
          name={nameOf(revision)}
          caught={mailIsCaught}
          onSend={async (mail) => {
            await acts.mail.mutateAsync(mail)
            setOpen(null)
            say(`${nameOf(revision)} is on its way`, { detail: `To ${mail.to.join(', ')}` })
          }}
        />
      )}
      <ConfirmSign
        isOpen={open === 'withdraw'}
        onClose={() => setOpen(null)}
        title="Withdraw the procedure"
        statement={statementOf({ meaning: 'withdrawn', record: revisionName(revision.number, revision.revision), name: person?.name ?? '', role: 'supervisor' })}
        consequence="It leaves the look-up and the shop at once. It can still be read and printed, stamped withdrawn. This can’t be taken back; a new revision can be written instead."
        confirmLabel={`Withdraw ${nameOf(revision)}`}
        reason={{ label: 'Why it is withdrawn', required: true, missing: 'Say why it is withdrawn.' }}
        tone="danger"
        onSign={async (signing) => {
          await acts.withdraw.mutateAsync(signing)
          setOpen(null)
          say(`${nameOf(revision)} was withdrawn`)
        }}
      />
    </SheetContext>
  )
}
