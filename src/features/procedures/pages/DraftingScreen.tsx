import { useDeferredValue, useMemo, useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, processBlockSchema, type ProcedureContent, type ProcessBlock } from '@shared/schemas/welding.ts'
import { Button, buttonClass } from '@/components/Button.tsx'
import { MarginLayout } from '@/components/margin/MarginLayout.tsx'
import { Breadcrumb } from '@/components/states.tsx'
import { say } from '@/components/toast.tsx'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { call, hrefOf } from '@/lib/api.ts'
import { useRevisionActs } from '../api.ts'
import { ProcedureTitle } from '../components/ProcedureTitle.tsx'
import { SaveMark, SaveState } from '@/components/record/SaveState.tsx'
import { DiscardDialog, nameOf, PlanCouponDialog, SubmitDialog } from '../dialogs/acts.tsx'
import { ConflictView, type ConflictKind } from '@/components/record/ConflictView.tsx'
import { useProcedureDraft } from '../draft/use-draft.ts'
import { useFixes } from '../draft/use-fixes.ts'
import { placedRows } from '@/components/variables/catalogue.ts'
import { inputId, SheetContext } from '@/components/variables/context.ts'
import { blocking, placeFindings, sectionVerdicts } from '@/components/variables/findings.ts'
import { labelOf, missingInWords, rowFor, valueInWords } from '@/components/variables/labels.ts'
import { MarginHead } from '../sheet/MarginHead.tsx'
import { ProcedureNav, ProcedureSheets } from '../sheet/ProcedureSheets.tsx'
import { useAssessment } from '../sheet/use-assessment.ts'
import { Returned } from '../components/Returned.tsx'

const conflict: ConflictKind<ProcedureContent> = { schema: procedureContentSchema, lists: ['variables.processes'], label: labelOf, words: valueInWords }

type Open = 'submit' | 'discard' | 'conflict' | { plan: string } | null

const orderOf = ({ variables }: ProcedureContent) => variables.processes.map(({ id }) => id).join(' ')

const newBlock = (blocks: readonly ProcessBlock[]): ProcessBlock => {
  const taken = new Set(blocks.map(({ id }) => id))
  let number = blocks.length + 1
  while (taken.has(`p${number}`)) number += 1
  return processBlockSchema.parse({ id: `p${number}` })
}

/** Puts the cursor into a row, wherever on the sheet it is. */
function goTo(path: string) {
  const element = document.getElementById(inputId(path))
  if (!element) return
  element.scrollIntoView({ block: 'center' })
  element.focus({ preventScroll: true })
}

/** A draft under somebody's hands: the sheet, and beside each row what the standard says of it. */
export function DraftingScreen({ revision, personId }: { revision: Revision; personId: string }) {
  const navigate = useNavigate()
  const { system } = useUnits()
  const mayRecord = useMay('coupons.record')
  const draft = useProcedureDraft(revision, personId)
  const { content, form, saving, replace } = draft
  const acts = useRevisionActs(revision)
  const [open, setOpen] = useState<Open>(null)
  const [seenConflict, setSeenConflict] = useState(false)
  const [attention, setAttention] = useState(false)
  const [tab, setTab] = useState(0)
  const [offer, setOffer] = useState(false)

  if ((saving.phase === 'conflict') !== seenConflict) {
    setSeenConflict(saving.phase === 'conflict')
    if (saving.phase === 'conflict') setOpen('conflict')
  }

  // Typing comes first: what follows from it (verdicts, drawing, title block) is drawn when there is time.
  // A process that was added, removed or moved is followed at once, as its fields are named by their place.
  const deferred = useDeferredValue(content)
  const rested = orderOf(deferred) === orderOf(content) ? deferred : content
  const { assessments, reading, couponNumber } = useAssessment(rested, offer)
  const shown = Math.min(tab, assessments.length - 1)
  const stands = assessments.flatMap(({ findings }) => blocking(findings)).map((finding) => ({ ...finding, missing: missingInWords(finding.missing, rested) }))
  // Further coupons are read only once something here could be cured by one.
  if (!offer && stands.length > 0) setOffer(true)

  const { processes } = rested.variables
  const rows = useMemo(() => placedRows(processes), [processes])
  const findings = useMemo(() => placeFindings(assessments[shown]?.findings ?? [], rows), [assessments, shown, rows])
  const verdicts = useMemo(() => sectionVerdicts(findings, rows), [findings, rows])
  const onFix = useFixes(draft, {
    onPlan: (requirement) => setOpen({ plan: requirement }),
    onState: (field) => goTo(rowFor(field, rows)?.path ?? field),
  })

  const changeBlocks = (next: ProcessBlock[]) => replace({ ...content, variables: { ...content.variables, processes: next } })
  const move = (index: number, by: 1 | -1) => {
    const next = [...content.variables.processes]
    const [block] = next.splice(index, 1)
    if (!block) return
    next.splice(index + by, 0, block)
    changeBlocks(next)
  }
  const remove = (index: number) => {
    const block = content.variables.processes[index]
    if (!block || content.variables.processes.length < 2) return
    changeBlocks(content.variables.processes.filter((_, at) => at !== index))
    say(`${block.process ?? 'Process'} removed`, {
      undo: () => {
        const now = form.getValues() as typeof content
        if (now.variables.processes.some(({ id }) => id === block.id)) return
        const back = [...now.variables.processes]
        back.splice(index, 0, block)
        replace({ ...now, variables: { ...now.variables, processes: back } })
      },
    })
  }

  const submit = async () => {
    const version = await draft.saveNow()
    if (version === null) throw new Error('The draft could not be saved first, so it was not sent. See beside the sheet what stands in the way.')
    await acts.submit.mutateAsync(version)
    setOpen(null)
    say(`${nameOf(revision)} was sent for review`)
  }
  const discard = async () => {
    await acts.discard.mutateAsync(saving.version)
    draft.forget()
    say(`${nameOf(revision)} was discarded`)
    void navigate('/procedures')
  }
  const openCoupon = async () => {
    if ((await draft.saveNow()) === null) throw new Error('The draft could not be saved first. See beside the sheet what stands in the way.')
    const coupon = await call('createCoupon', { body: { revisionId: revision.id } })
    void navigate(`/coupons/${coupon.id}`)
  }

  const sheet = useMemo(() => ({ content: rested, system, control: form.control, findings, attention, onFix, onUse: onFix, couponNumber }), [rested, system, form.control, findings, attention, onFix, couponNumber])
  const numbers = rested.supportingCoupons.map((id) => ({ id, number: couponNumber(id) ?? revision.coupons.find((one) => one.id === id)?.number ?? '…' }))
  const returned = [...revision.signatures].reverse().find(({ meaning }) => meaning === 'returned')
  const note = stands.length === 0 ? 'nothing stands in the way' : `${stands.length} ${stands.length === 1 ? 'finding wants' : 'findings want'} a reason`
  return (
    <SheetContext value={sheet}>
      <Breadcrumb trail={[{ label: 'Procedures', to: '/procedures' }, { label: nameOf(revision) }]} />
      <ProcedureTitle revision={revision} content={rested} couponNumbers={numbers} note={note} />
      {returned && <Returned comment={returned.reason ?? ''} by={returned.person.name} />}
      <div className="mt-4">
        <MarginLayout
          nav={
            <ProcedureNav verdicts={verdicts}>
              <SaveMark phase={saving.phase} />
            </ProcedureNav>
          }
          head={
            <>
              <div className="no-print flex flex-wrap items-center gap-2">
                {revision.may.includes('submit') && (
                  <Button kind="primary" disabled={saving.phase === 'conflict' || saving.phase === 'closed'} onClick={() => setOpen('submit')}>
                    Send for review
                  </Button>
                )}
                <a className={buttonClass()} href={hrefOf('printRevision', { id: revision.id })} target="_blank" rel="noreferrer">
                  Print
                </a>
                {revision.may.includes('discard') && (
                  <Button kind="quiet" onClick={() => setOpen('discard')}>
                    Discard
                  </Button>
                )}
              </div>
              <SaveState saving={saving} onSave={() => void draft.saveNow()} onCompare={() => setOpen('conflict')} />
              <MarginHead assessments={assessments} shown={shown} onShow={setTab} attention={attention} onAttention={setAttention} reading={reading} />
            </>
          }
        >
          <ProcedureSheets onMove={move} onRemove={remove} onAdd={() => changeBlocks([...content.variables.processes, newBlock(content.variables.processes)])} />
        </MarginLayout>
      </div>
      {open === 'submit' && <SubmitDialog isOpen onClose={() => setOpen(null)} revision={revision} blocking={stands} onSubmit={submit} />}
      {open === 'discard' && <DiscardDialog isOpen onClose={() => setOpen(null)} revision={revision} onDiscard={discard} />}
      {open !== null && typeof open === 'object' && <PlanCouponDialog isOpen onClose={() => setOpen(null)} revision={revision} requirement={open.plan} mayRecord={mayRecord} onOpen={openCoupon} />}
      {open === 'conflict' && saving.theirs && (
        <ConflictView
          isOpen
          onClose={() => setOpen(null)}
          name={nameOf(revision)}
          kind={conflict}
          base={saving.base}
          mine={content}
          theirs={saving.theirs}
          onMerge={(joined) => {
            draft.merge(joined)
            setOpen(null)
          }}
        />
      )}
    </SheetContext>
  )
}
