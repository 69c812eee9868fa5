import { useQueryClient } from '@tanstack/react-query'
import { useController } from 'react-hook-form'
import { invitePersonSchema } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TagPicker, TextField } from '@/components/fields/text.tsx'
import { say } from '@/components/toast.tsx'
import { useSession } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { ROLE_OPTIONS, rolesInWords } from '../roles.ts'

export function InviteDialog({ onClose }: { onClose: () => void }) {
  const client = useQueryClient()
  const { mailIsCaught } = useSession()
  const form = useZodForm(invitePersonSchema, { name: '', email: '', roles: [] })
  const { errors, isSubmitting, isDirty } = form.formState
  const roles = useController({ control: form.control, name: 'roles' }).field
  const invite = form.handleSubmit(async (body) => {
    try {
      const person = await call('invitePerson', { body })
      await client.invalidateQueries({ queryKey: ['listPeople'] })
      say(`${person.name} is invited.`, { detail: mailIsCaught ? 'The invitation lies in the outbox.' : `An e-mail goes to ${person.email}.` })
      onClose()
    } catch (error) {
      showProblem(form, error)
    }
  })
  return (
    <Dialog title="Invite a person" isOpen onClose={onClose} dismissable={!isDirty}>
      <form className="space-y-4" onSubmit={(event) => void invite(event)} noValidate>
        <TextField label="Name" description="As it should stand on documents." error={errors.name?.message} {...form.register('name')} />
        <TextField label="E-mail" type="email" error={errors.email?.message} {...form.register('email')} />
        <TagPicker label="Roles" description={rolesInWords(roles.value)} error={errors.roles?.message} options={ROLE_OPTIONS} value={roles.value} onChange={roles.onChange} />
        <FormError message={errors.root?.message} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Not now</Button>
          <Button kind="primary" type="submit" pending={isSubmitting}>
            Send the invitation
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
