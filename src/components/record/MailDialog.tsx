import { useState, type FormEvent } from 'react'
import type { z } from 'zod'
import { endpoints } from '@shared/schemas/endpoints.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextArea, TextField } from '@/components/fields/text.tsx'
import { asProblem } from '@/lib/problem.ts'

const mailSchema = endpoints.mailRevision.body
const ADDRESSES = /[\s,;]+/

export type Mail = z.output<typeof mailSchema>

export interface MailDialogProps {
  isOpen: boolean
  onClose: () => void
  /** The dialog's head: "E-mail the procedure". */
  title: string
  /** The record whose signed PDF is sent: "WPS-014 rev B". */
  name: string
  /** No mail server is set up. */
  caught: boolean
  onSend: (mail: Mail) => Promise<unknown>
}

/** Sends a record's signed PDF to addresses; a refusal is shown and nothing typed is lost. */
export function MailDialog({ isOpen, onClose, title, name, caught, onSend }: MailDialogProps) {
  const [to, setTo] = useState('')
  const [message, setMessage] = useState('')
  const [wrong, setWrong] = useState<string | null>(null)
  const [mail, setMail] = useState<Mail | null>(null)
  const [pending, setPending] = useState(false)
  const [refusal, setRefusal] = useState<string | undefined>()
  const send = async (event: FormEvent) => {
    event.preventDefault()
    if (pending) return
    const parts = to.split(ADDRESSES).filter(Boolean)
    const parsed = mailSchema.safeParse({ to: parts, message })
    if (!parsed.success) {
      const issue = parsed.error.issues[0]
      const bad = typeof issue?.path[1] === 'number' ? parts[issue.path[1]] : undefined
      return setWrong(bad ? `"${bad}" is not an e-mail address. Write one like name@example.com.` : (issue?.message ?? 'Name at least one recipient.'))
    }
    setWrong(null)
    setPending(true)
    setRefusal(undefined)
    try {
      setMail(parsed.data)
      await onSend(parsed.data)
    } catch (error) {
      setRefusal(asProblem(error).message)
    } finally {
      setPending(false)
    }
  }
  return (
    <Dialog title={title} isOpen={isOpen} onClose={onClose} dismissable={to === '' && message === ''}>
      <form className="space-y-4" noValidate onSubmit={(event) => void send(event)}>
        <p className="text-pretty">
          The signed PDF of {name} is sent to each address. {caught && 'No mail server is set up, so the mail is caught and can be read in the outbox.'}
        </p>
        <TextField label="To" description="Several with commas between" autoComplete="off" inputMode="email" value={to} error={wrong} onChange={(event) => setTo(event.target.value)} />
        <TextArea label="Message" optional maxLength={4000} rows={4} value={message} onChange={(event) => setMessage(event.target.value)} />
        <FormError message={refusal} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Not now</Button>
          <Button kind="primary" type="submit" pending={pending}>
            {pending && mail ? `Sending to ${mail.to.length}` : 'Send'}
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
