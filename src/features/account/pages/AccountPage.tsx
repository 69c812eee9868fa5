import { useMutation } from '@tanstack/react-query'
import { useState } from 'react'
import { changePasswordSchema, nameSchema } from '@shared/schemas/people.ts'
import { z } from 'zod'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Select, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useChangeAccount, useSession } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { PasswordField } from '../components/PasswordField.tsx'

export function AccountPage() {
  const { person, organization } = useSession()
  if (!person) return null
  return (
    <div className="mx-auto max-w-4xl space-y-4">
      <TitleBlock
        kind="Account"
        number={person.name}
        cells={[
          { label: 'E-mail', children: person.email, wide: true },
          { label: 'Roles', children: person.roles.join(', ') },
          { label: 'Organization', children: organization?.name ?? '' },
        ]}
      />
      <Settings />
      <Password />
      <Everywhere />
    </div>
  )
}

const settingsSchema = z.object({ name: nameSchema })

function Settings() {
  const { person } = useSession()
  const change = useChangeAccount()
  const form = useZodForm(settingsSchema, { name: person?.name ?? '' })
  const save = form.handleSubmit(async ({ name }) => {
    try {
      await change.mutateAsync({ name })
      say('Your name is changed.', { detail: 'Records already signed keep the name they were signed with.' })
    } catch (error) {
      showProblem(form, error)
    }
  })
  const set = (body: Parameters<typeof change.mutate>[0]) => change.mutate(body, { onError: sayProblem })
  return (
    <Sheet title="You" aside="how you stand on documents and how you read them">
      <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2">
        <form className="flex items-start gap-2 sm:col-span-2" onSubmit={(event) => void save(event)} noValidate>
          <TextField className="max-w-sm grow" label="Name" autoComplete="name" error={form.formState.errors.name?.message ?? form.formState.errors.root?.message} {...form.register('name')} />
          <Button className="mt-6" type="submit" pending={form.formState.isSubmitting}>
            Save
          </Button>
        </form>
        <Select
          label="Figures"
          value={person?.unitSystem}
          onChange={(event) => set({ unitSystem: event.target.value === 'US' ? 'US' : 'SI' })}
          options={[
            { value: 'SI', label: 'SI: mm, °C, kJ/mm' },
            { value: 'US', label: 'US customary: in, °F, kJ/in' },
          ]}
          description="How you read figures. Records keep the units they were written in."
        />
        <Select
          label="Theme"
          value={person?.theme}
          onChange={(event) => set({ theme: event.target.value === 'night' ? 'night' : 'day' })}
          options={[
            { value: 'day', label: 'Day' },
            { value: 'night', label: 'Night' },
          ]}
        />
      </div>
    </Sheet>
  )
}

function Password() {
  const form = useZodForm(changePasswordSchema, { currentPassword: '', newPassword: '' })
  const { errors, isSubmitting } = form.formState
  const save = form.handleSubmit(async (body) => {
    try {
      await call('changePassword', { body })
      form.reset()
      say('Your password is changed.')
    } catch (error) {
      showProblem(form, error)
    }
  })
  return (
    <Sheet title="Password">
      <form className="grid max-w-2xl gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2" onSubmit={(event) => void save(event)} noValidate>
        <PasswordField label="Present password" autoComplete="current-password" error={errors.currentPassword?.message} {...form.register('currentPassword')} />
        <PasswordField label="New password" autoComplete="new-password" description="At least 12 characters; a short sentence is good." error={errors.newPassword?.message} {...form.register('newPassword')} />
        <div className="space-y-3 sm:col-span-2">
          <FormError message={errors.root?.message} />
          <Button kind="primary" type="submit" pending={isSubmitting}>
            Change the password
          </Button>
        </div>
      </form>
    </Sheet>
  )
}

function Everywhere() {
  const [asking, setAsking] = useState(false)
  const leave = useMutation({ mutationFn: () => call('signOutEverywhere'), onSuccess: () => window.location.assign('/sign-in'), onError: sayProblem })
  return (
    <Sheet title="Devices">
      <div className="flex flex-wrap items-center justify-between gap-4 px-4 py-4">
        <p className="max-w-prose text-soft">Lost a tablet, or signed in at a machine that others use? Sign out everywhere at once, this device included.</p>
        <Button onClick={() => setAsking(true)}>Sign out everywhere…</Button>
      </div>
      <Dialog
        title="Sign out everywhere"
        isOpen={asking}
        onClose={() => setAsking(false)}
        footer={
          <>
            <Button onClick={() => setAsking(false)}>Stay signed in</Button>
            <Button kind="primary" pending={leave.isPending} onClick={() => leave.mutate()}>
              Sign out everywhere
            </Button>
          </>
        }
      >
        <p>Every device on which you are signed in, this one too, will ask for the password again. Nothing that is saved is lost.</p>
      </Dialog>
    </Sheet>
  )
}
