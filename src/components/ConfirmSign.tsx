import { useState, type FormEvent, type ReactNode } from 'react'
import { asProblem, type ProblemError } from '@/lib/problem.ts'
import { Button } from './Button.tsx'
import { Dialog } from './Dialog.tsx'
import { FormError } from './fields/Field.tsx'
import { TextArea, TextField } from './fields/text.tsx'

export interface Signing {
  password: string
  /** Empty string when no reason was asked for. */
  reason: string
}

export interface ConfirmSignProps {
  isOpen: boolean
  onClose: () => void
  title: string
  /** The sentence that is signed: who states what about which record. */
  statement: string
  /** What will happen, and whether it can be taken back. */
  consequence: ReactNode
  confirmLabel: string
  /** Asks for a reason too; `required` refuses an empty one with `missing`. */
  reason?: { label: string; required: boolean; missing: string; description?: string }
  tone?: 'primary' | 'danger'
  /** Rejects to keep the dialog open with the refusal shown; closing is the caller's. */
  onSign: (signing: Signing) => Promise<unknown>
  children?: ReactNode
}

/** Signing by re-entering the password: says what is signed and what follows, and can be backed out of until signed. */
export function ConfirmSign({ isOpen, onClose, ...rest }: ConfirmSignProps) {
  return isOpen ? <SignDialog onClose={onClose} {...rest} /> : null
}

/** Mounted anew for each signing, so that a password never stays behind. */
function SignDialog({ onClose, title, statement, consequence, confirmLabel, reason, tone = 'primary', onSign, children }: Omit<ConfirmSignProps, 'isOpen'>) {
  const [given, setGiven] = useState<Signing>({ password: '', reason: '' })
  const [wrong, setWrong] = useState<{ password?: string; reason?: string }>({})
  const [refusal, setRefusal] = useState<ProblemError | null>(null)
  const [pending, setPending] = useState(false)

  const sign = async (event: FormEvent) => {
    event.preventDefault()
    if (pending) return
    const missing: typeof wrong = {}
    if (reason?.required && given.reason.trim() === '') missing.reason = reason.missing
    if (given.password === '') missing.password = 'Re-enter your password to sign.'
    setWrong(missing)
    if (missing.password || missing.reason) return
    setPending(true)
    setRefusal(null)
    try {
      await onSign({ password: given.password, reason: given.reason.trim() })
    } catch (error) {
      const problem = asProblem(error)
      const at = (name: string) => problem.fields.find(({ field }) => field === name)?.message
      setWrong({ password: at('password'), reason: at('reason') ?? at('deviationReason') })
      setRefusal(problem)
    } finally {
      setPending(false)
    }
  }
  return (
    <Dialog title={title} isOpen onClose={onClose} dismissable={!pending && given.reason === ''}>
      <form className="space-y-4" onSubmit={(event) => void sign(event)} noValidate>
        <blockquote className="border-l-2 border-ink py-0.5 pl-3 text-lg text-pretty">{statement}</blockquote>
        <div className="text-soft">{consequence}</div>
        {children}
        {reason && (
          <TextArea label={reason.label} description={reason.description} optional={!reason.required} error={wrong.reason} value={given.reason} maxLength={2000} onChange={(event) => setGiven({ ...given, reason: event.target.value })} />
        )}
        <TextField label="Your password" type="password" autoComplete="current-password" error={wrong.password} value={given.password} onChange={(event) => setGiven({ ...given, password: event.target.value })} />
        {refusal && !wrong.password && !wrong.reason && <FormError message={refusal.message} />}
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose} disabled={pending}>
            Not yet
          </Button>
          <Button kind={tone} type="submit" pending={pending}>
            {confirmLabel}
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
