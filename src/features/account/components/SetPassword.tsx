import { useState } from 'react'
import { Link } from 'react-router-dom'
import { setPasswordSchema } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { PasswordField } from './PasswordField.tsx'

/** Sets a password through a single-use link; afterwards the way leads to sign-in. */
export function SetPassword({ confirmLabel, done, onSet }: { confirmLabel: string; done: string; onSet: (password: string) => Promise<unknown> }) {
  const [set, setSet] = useState(false)
  const form = useZodForm(setPasswordSchema, { password: '' })
  const { errors, isSubmitting } = form.formState
  const submit = form.handleSubmit(async ({ password }) => {
    try {
      await onSet(password)
      setSet(true)
    } catch (error) {
      showProblem(form, error)
    }
  })
  if (set) {
    return (
      <div className="space-y-3" role="status">
        <p className="text-lg">{done}</p>
        <Link to="/sign-in" className="text-link">
          Sign in with it
        </Link>
      </div>
    )
  }
  return (
    <form className="space-y-4" onSubmit={(event) => void submit(event)} noValidate>
      <PasswordField label="New password" autoComplete="new-password" description="At least 12 characters; a short sentence is good." error={errors.password?.message} {...form.register('password')} />
      <FormError message={errors.root?.message} />
      <Button kind="primary" type="submit" pending={isSubmitting}>
        {confirmLabel}
      </Button>
    </form>
  )
}
