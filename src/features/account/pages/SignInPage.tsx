import { useQueryClient } from '@tanstack/react-query'
import { Link, Navigate, useLocation, useNavigate } from 'react-router-dom'
import { signInSchema } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { useSession } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { sessionQuery } from '@/lib/query.ts'
import { returnPath } from '@/shell/paths.ts'
import { AccountSheet } from '../components/AccountSheet.tsx'
import { PasswordField } from '../components/PasswordField.tsx'

export function SignInPage() {
  const session = useSession()
  const client = useQueryClient()
  const navigate = useNavigate()
  const { search } = useLocation()
  const form = useZodForm(signInSchema, { email: '', password: '' })
  const { errors, isSubmitting } = form.formState
  if (session.person) return <Navigate to={returnPath(search)} replace />
  const signIn = form.handleSubmit(async (body) => {
    try {
      const next = await call('signIn', { body })
      client.clear()
      client.setQueryData(sessionQuery.queryKey, next)
      await navigate(returnPath(search), { replace: true })
    } catch (error) {
      showProblem(form, error)
    }
  })
  return (
    <AccountSheet
      title="Sign in"
      about={
        <>
          <p>Use the e-mail address under which your firm knows you.</p>
          {session.demo && <p>This is a demonstration firm. Its sign-ins are printed where the program was started.</p>}
        </>
      }
    >
      <form className="space-y-4" onSubmit={(event) => void signIn(event)} noValidate>
        <TextField label="E-mail" type="email" autoComplete="username" autoFocus error={errors.email?.message} {...form.register('email')} />
        <PasswordField label="Password" autoComplete="current-password" error={errors.password?.message} {...form.register('password')} />
        <FormError message={errors.root?.message} />
        <div className="flex flex-wrap items-center justify-between gap-3">
          <Button kind="primary" type="submit" pending={isSubmitting}>
            Sign in
          </Button>
          <Link to="/forgot-password" className="text-link">
            Forgot the password?
          </Link>
        </div>
      </form>
    </AccountSheet>
  )
}
