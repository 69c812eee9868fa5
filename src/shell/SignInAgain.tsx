import { useQueryClient } from '@tanstack/react-query'
import { useState, type FormEvent } from 'react'
import { useNavigate } from 'react-router-dom'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextField } from '@/components/fields/text.tsx'
import { call } from '@/lib/api.ts'
import { asProblem } from '@/lib/problem.ts'
import { sessionQuery } from '@/lib/query.ts'

/** The session ended while a page stood open: sign in over it, and what was typed is still there. */
export function SignInAgain() {
  const client = useQueryClient()
  const navigate = useNavigate()
  const [given, setGiven] = useState({ email: '', password: '' })
  const [problem, setProblem] = useState<string>()
  const [pending, setPending] = useState(false)
  const leave = () => void navigate('/sign-in')
  const signIn = async (event: FormEvent) => {
    event.preventDefault()
    setPending(true)
    try {
      client.setQueryData(sessionQuery.queryKey, await call('signIn', { body: given }))
      await client.invalidateQueries()
    } catch (error) {
      setProblem(asProblem(error).message)
      setPending(false)
    }
  }
  return (
    <Dialog title="You were signed out" isOpen onClose={leave} dismissable={false}>
      <form className="space-y-4" onSubmit={(event) => void signIn(event)}>
        <p>Your session ended. Sign in again to go on; what you typed on this page is still here.</p>
        <TextField label="E-mail" type="email" autoComplete="username" required value={given.email} onChange={(event) => setGiven({ ...given, email: event.target.value })} />
        <TextField label="Password" type="password" autoComplete="current-password" required value={given.password} onChange={(event) => setGiven({ ...given, password: event.target.value })} />
        <FormError message={problem} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={leave}>Leave this page</Button>
          <Button kind="primary" type="submit" pending={pending}>
            Sign in
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
