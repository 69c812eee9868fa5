import { useState } from 'react'
import { Link } from 'react-router-dom'
import { requestResetSchema } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { useSession } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { AccountSheet } from '../components/AccountSheet.tsx'

export function ForgotPasswordPage() {
  const { mailIsCaught } = useSession()
  const [sentTo, setSentTo] = useState<string | null>(null)
  const form = useZodForm(requestResetSchema, { email: '' })
  const { errors, isSubmitting } = form.formState
  const ask = form.handleSubmit(async (body) => {
    try {
      await call('requestReset', { body })
      setSentTo(body.email)
    } catch (error) {
      showProblem(form, error)
    }
  })
  return (
    <AccountSheet title="Forgotten password" about={<p>A link for a new password comes by e-mail. It works once and for a short time; the old password holds until then.</p>}>
      {sentTo ? (
        <div className="space-y-3" role="status">
          <p className="text-lg">If {sentTo} belongs to somebody here, a link is on its way.</p>
          <p className="text-soft">{mailIsCaught ? 'This installation sends no mail: an administrator finds the link in the outbox.' : 'Nothing after some minutes? Look among unwanted mail, or ask your administrator.'}</p>
          <Link to="/sign-in" className="text-link">
            Back to sign-in
          </Link>
        </div>
      ) : (
        <form className="space-y-4" onSubmit={(event) => void ask(event)} noValidate>
          <TextField label="E-mail" type="email" autoComplete="username" error={errors.email?.message} {...form.register('email')} />
          <FormError message={errors.root?.message} />
          <div className="flex flex-wrap items-center justify-between gap-3">
            <Button kind="primary" type="submit" pending={isSubmitting}>
              Send me a link
            </Button>
            <Link to="/sign-in" className="text-link">
              Back to sign-in
            </Link>
          </div>
        </form>
      )}
    </AccountSheet>
  )
}
