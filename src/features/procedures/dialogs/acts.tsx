/** The dialogs of what may happen to a revision: each says in a sentence what follows. */
import { useState } from 'react'
import type { Finding } from '@shared/schemas/assessment.ts'
import type { Revision } from '@shared/schemas/records.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { MarginNote } from '@/components/margin/MarginNote.tsx'
import { asProblem } from '@/lib/problem.ts'

export const nameOf = ({ number, revision }: Pick<Revision, 'number' | 'revision'>) => `${number} rev ${revision}`

interface ActProps {
  isOpen: boolean
  onClose: () => void
  revision: Revision
}

/** Runs an act and shows its refusal in the dialog. */
function useAct(run: () => Promise<unknown>) {
  const [pending, setPending] = useState(false)
  const [refusal, setRefusal] = useState<string | undefined>()
  const act = async () => {
    if (pending) return
    setPending(true)
    setRefusal(undefined)
    try {
      await run()
    } catch (error) {
      setRefusal(asProblem(error).message)
    } finally {
      setPending(false)
    }
  }
  return { act, pending, refusal }
}

export function SubmitDialog({ isOpen, onClose, revision, blocking, onSubmit }: ActProps & { blocking: readonly Finding[]; onSubmit: () => Promise<unknown> }) {
  const { act, pending, refusal } = useAct(onSubmit)
  return (
    <Dialog
      title="Send for review"
      isOpen={isOpen}
      onClose={onClose}
      footer={
        <>
          <Button onClick={onClose}>Not yet</Button>
          <Button kind="primary" pending={pending} onClick={() => void act()}>
            Send {nameOf(revision)} for review
          </Button>
        </>
      }
    >
      <FormError message={refusal} />
      <p className="text-pretty">{nameOf(revision)} goes to a supervisor and can&rsquo;t be changed while it is under review. A supervisor approves it by signature or returns it to you with a comment. You can&rsquo;t approve what you wrote yourself.</p>
      {blocking.length > 0 ? (
        <div className="space-y-2">
          <p className="font-medium">
            {blocking.length === 1 ? 'One finding is' : `${blocking.length} findings are`} outside or cannot be told. The supervisor can only approve with a written reason, which is printed on the procedure.
          </p>
          {blocking.map((finding) => (
            <MarginNote key={`${finding.standard} ${finding.ruleId} ${finding.field}`} finding={finding} />
          ))}
        </div>
      ) : (
        <p className="text-jade">Every essential finding is within what the coupons qualify.</p>
      )}
    </Dialog>
  )
}

export function DiscardDialog({ isOpen, onClose, revision, onDiscard }: ActProps & { onDiscard: () => Promise<unknown> }) {
  const { act, pending, refusal } = useAct(onDiscard)
  return (
    <Dialog
      title="Discard the draft"
      isOpen={isOpen}
      onClose={onClose}
      footer={
        <>
          <Button onClick={onClose}>Keep it</Button>
          <Button kind="danger" pending={pending} onClick={() => void act()}>
            Discard {nameOf(revision)}
          </Button>
        </>
      }
    >
      <p className="text-pretty">{nameOf(revision)} is removed for everybody and can&rsquo;t be brought back. Revisions that were approved before stay as they are.</p>
      <FormError message={refusal} />
    </Dialog>
  )
}

export function PlanCouponDialog({ isOpen, onClose, revision, requirement, mayRecord, onOpen }: ActProps & { requirement: string; mayRecord: boolean; onOpen: () => Promise<unknown> }) {
  const { act, pending, refusal } = useAct(onOpen)
  return (
    <Dialog
      title="Weld a coupon"
      isOpen={isOpen}
      onClose={onClose}
      footer={
        <>
          <Button onClick={onClose}>{mayRecord ? 'Not now' : 'Close'}</Button>
          {mayRecord && (
            <Button kind="primary" pending={pending} onClick={() => void act()}>
              Open a coupon
            </Button>
          )}
        </>
      }
    >
      <p className="text-lg text-pretty">{requirement}</p>
      <p className="text-pretty text-soft">
        {mayRecord ? `A coupon is opened against ${nameOf(revision)} with its variables filled in from this draft. Once it is welded, tested and certified, link it here.` : `An inspector opens the coupon against ${nameOf(revision)}, records the welding and the tests, and certifies it. Then link it here.`}
      </p>
      <FormError message={refusal} />
    </Dialog>
  )
}
