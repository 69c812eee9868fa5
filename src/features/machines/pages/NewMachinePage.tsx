import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import { z } from 'zod'
import { PATTERNS, freshKey, type PatternKey } from '@shared/machines/patterns.ts'
import { writeMachineSchema, type WriteMachine } from '@shared/schemas/machines.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Checkbox, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, EmptyState, PageHead } from '@/components/states.tsx'
import { useMay } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'

const schema = writeMachineSchema.pick({ name: true, serial: true, location: true })
type Given = z.output<typeof schema>

/** The kind of machine that its modes make it. */
function kindOf(keys: readonly PatternKey[]): WriteMachine['kind'] {
  const [wire, stick, tig] = [keys.some((key) => !['tig', 'tig-ac', 'stick'].includes(key)), keys.includes('stick'), keys.some((key) => key === 'tig' || key === 'tig-ac')]
  if (tig) return wire || stick ? 'several' : 'tig'
  return wire ? (stick ? 'wire-and-stick' : 'wire') : stick ? 'stick' : 'wire'
}

/** Where a machine is registered, or why it can't be with these roles: said before anything is typed. */
export function NewMachinePage() {
  const manages = useMay('machines.manage')
  if (manages) return <NewMachine />
  return (
    <>
      <PageHead title="Not for your roles" />
      <EmptyState title="You read the machines; others register them" step={<ButtonLink to="/machines">Back to the list</ButtonLink>}>
        <p>Ask an engineer to register the machine, with a photo of its panel.</p>
      </EmptyState>
    </>
  )
}

/** A machine begins with a name and the patterns that its panel is like; the page after this sets them right. */
function NewMachine() {
  const navigate = useNavigate()
  const client = useQueryClient()
  const form = useZodForm(schema, { name: '', serial: '', location: '' })
  const { errors } = form.formState
  const [chosen, setChosen] = useState<PatternKey[]>([])
  const create = useMutation({
    mutationFn: (given: Given) => {
      const taken: string[] = []
      const modes = PATTERNS.filter(({ key }) => chosen.includes(key)).map(({ mode }) => {
        const key = freshKey(mode.key, taken)
        taken.push(key)
        return { ...mode, key }
      })
      return call('createMachine', { body: { ...given, kind: kindOf(chosen), modes } })
    },
    onSuccess: (machine) => {
      void client.invalidateQueries({ queryKey: ['listMachines'] })
      void navigate(`/machines/${machine.id}`)
    },
    onError: (error) => showProblem(form, error),
  })
  return (
    <>
      <Breadcrumb trail={[{ label: 'Machines', to: '/machines' }, { label: 'Register a machine' }]} />
      <PageHead title="Register a machine">It gets its number when you register it. What stands on its panel is set right on the next page.</PageHead>
      <form noValidate className="max-w-4xl space-y-4" onSubmit={(event) => void form.handleSubmit((given) => create.mutate(given))(event)}>
        <Sheet title="Which machine">
          <div className="grid gap-4 px-4 py-4 sm:grid-cols-3">
            <TextField label="Name" placeholder="e.g. Bay 2 pulse" maxLength={120} error={errors.name?.message} {...form.register('name')} />
            <TextField label="Serial number" optional maxLength={80} error={errors.serial?.message} {...form.register('serial')} />
            <TextField label="Where it stands" optional maxLength={120} error={errors.location?.message} {...form.register('location')} />
          </div>
        </Sheet>
        <Sheet title="What its panel is like" aside={chosen.length === 0 ? 'none chosen' : chosen.length === 1 ? 'one mode' : `${chosen.length} modes`}>
          <fieldset className="grid gap-x-6 gap-y-3 px-4 py-4 sm:grid-cols-2">
            <legend className="sr-only">Modes to start from</legend>
            {PATTERNS.map(({ key, label, about }) => (
              <Checkbox key={key} label={<span className="font-medium">{label}</span>} description={about} checked={chosen.includes(key)} onChange={(event) => setChosen(event.target.checked ? [...chosen, key] : chosen.filter((one) => one !== key))} />
            ))}
          </fieldset>
          <p className="border-t border-hair px-4 py-3 text-soft">Each brings its usual controls. The ends of their scales are only a beginning: read them off your panel.</p>
        </Sheet>
        <FormError message={errors.root?.message} />
        <div className="flex flex-wrap gap-2">
          <Button kind="primary" type="submit" pending={create.isPending}>
            Register it
          </Button>
          <ButtonLink to="/machines">Not now</ButtonLink>
        </div>
      </form>
    </>
  )
}
