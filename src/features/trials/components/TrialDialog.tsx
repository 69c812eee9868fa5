import { useState } from 'react'
import { writeTrialSchema } from '@shared/schemas/trials.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextArea, TextField } from '@/components/fields/text.tsx'
import { asProblem } from '@/lib/problem.ts'

interface Given { title: string; goal: string | null }

/** Title and goal of a trial. */
export function TrialDialog({ heading, submit, given, isOpen, onClose, onSave }: { heading: string; submit: string; given?: Given; isOpen: boolean; onClose: () => void; onSave: (body: Given) => Promise<unknown> }) {
  const [title, setTitle] = useState(given?.title ?? '')
  const [goal, setGoal] = useState(given?.goal ?? '')
  const [wrong, setWrong] = useState<string | null>(null)
  const [refusal, setRefusal] = useState<string>()
  const [pending, setPending] = useState(false)
  const save = async () => {
    if (pending) return
    const parsed = writeTrialSchema.safeParse({ title, goal: goal.trim() === '' ? null : goal })
    setWrong(parsed.success ? null : (parsed.error.issues[0]?.message ?? null))
    if (!parsed.success) return
    setPending(true)
    setRefusal(undefined)
    try {
      await onSave(parsed.data)
    } catch (error) {
      setRefusal(asProblem(error).message)
    } finally {
      setPending(false)
    }
  }
  return (
    <Dialog title={heading} isOpen={isOpen} onClose={onClose} dismissable={false} footer={<><Button onClick={onClose}>Not now</Button><Button kind="primary" pending={pending} onClick={() => void save()}>{submit}</Button></>}>
      <FormError message={refusal} />
      <TextField label="What setting are you after?" placeholder="e.g. ER5356 on 6 mm 6061, flat" maxLength={160} value={title} error={wrong} onChange={(event) => setTitle(event.target.value)} />
      <TextArea label="Good when" optional description="What the bead must be, in a sentence." maxLength={1000} value={goal} onChange={(event) => setGoal(event.target.value)} />
    </Dialog>
  )
}
