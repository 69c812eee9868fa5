import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useController } from 'react-hook-form'
import { z } from 'zod'
import { nameSchema, personSchema, rolesSchema, type Person } from '@shared/schemas/people.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Switch, TagPicker, TextField } from '@/components/fields/text.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { asProblem } from '@/lib/problem.ts'
import { ROLE_OPTIONS, rolesInWords } from '../roles.ts'

const schema = z.object({ name: nameSchema, roles: rolesSchema, active: z.boolean() })

/** Changes a person's name, roles and access. When somebody else changed them meanwhile, says so and keeps what was typed. */
export function PersonDialog({ person, self, onClose }: { person: Person; self: boolean; onClose: () => void }) {
  const client = useQueryClient()
  const [version, setVersion] = useState(person.version)
  const [meanwhile, setMeanwhile] = useState<Person | null>(null)
  const form = useZodForm(schema, { name: person.name, roles: person.roles, active: person.active })
  const { errors, isSubmitting, isDirty } = form.formState
  const roles = useController({ control: form.control, name: 'roles' }).field
  const active = useController({ control: form.control, name: 'active' }).field
  const resend = useMutation({ mutationFn: () => call('resendInvitation', { params: { id: person.id } }), onSuccess: () => say(`The invitation goes to ${person.email} again.`), onError: sayProblem })

  const save = form.handleSubmit(async (body) => {
    try {
      await call('changePerson', { params: { id: person.id }, body, ifMatch: version })
      await client.invalidateQueries({ queryKey: ['listPeople'] })
      if (self) await client.invalidateQueries({ queryKey: ['readSession'] })
      say(`${body.name} is changed.`)
      onClose()
    } catch (error) {
      const problem = asProblem(error)
      const current = problem.isConflict ? personSchema.safeParse(problem.current).data : undefined
      if (!current) return showProblem(form, error)
      setVersion(current.version)
      setMeanwhile(current)
    }
  })
  return (
    <Dialog title={`Change ${person.name}`} isOpen onClose={onClose} dismissable={!isDirty}>
      <form className="space-y-4" onSubmit={(event) => void save(event)} noValidate>
        {meanwhile && (
          <p role="alert" className="border-l-[3px] border-l-straw bg-straw-bg px-3 py-2">
            Somebody changed this person while you did: now {meanwhile.name}, {meanwhile.roles.join(', ')}, {meanwhile.active ? 'with access' : 'without access'}. Save again to put yours in its place.
          </p>
        )}
        <TextField label="Name" error={errors.name?.message} {...form.register('name')} />
        <TagPicker label="Roles" description={rolesInWords(roles.value)} error={errors.roles?.message} options={ROLE_OPTIONS} value={roles.value} onChange={roles.onChange} />
        <Switch
          label="May sign in"
          description={self ? 'You cannot take your own access away.' : active.value ? 'Switched off, the person is signed out everywhere; what they signed stays.' : 'Without access. Everything they signed stays as it is.'}
          disabled={self}
          checked={active.value}
          onChange={(event) => active.onChange(event.target.checked)}
        />
        {person.state === 'invited' && (
          <p className="flex flex-wrap items-center gap-3 text-soft">
            The invitation has not been accepted yet.
            <Button pending={resend.isPending} onClick={() => resend.mutate()}>
              Send it again
            </Button>
          </p>
        )}
        <FormError message={errors.root?.message} />
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={onClose}>Leave as it was</Button>
          <Button kind="primary" type="submit" pending={isSubmitting}>
            Save
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
