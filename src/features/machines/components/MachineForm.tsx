import { useMutation, useQueryClient } from '@tanstack/react-query'
import { Plus } from 'lucide-react'
import { useEffect, useEffectEvent, useState } from 'react'
import { Controller, useFieldArray, useWatch } from 'react-hook-form'
import { useBlocker } from 'react-router-dom'
import type { z } from 'zod'
import { PATTERNS, freshKey } from '@shared/machines/patterns.ts'
import { machineSchema, writeMachineSchema, type Machine, type WriteMachine } from '@shared/schemas/machines.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Checkbox, Select, TagPicker, TextArea, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { say } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { call } from '@/lib/api.ts'
import { same } from '@/lib/draft/paths.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { asProblem } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { asFigure, GUN_OPTIONS, KIND_OPTIONS, wrong } from '../words.ts'
import { FilesSheet } from './FilesSheet.tsx'
import { MachineTitle } from './MachineTitle.tsx'
import { ModeEditor } from './ModeEditor.tsx'

/** A stored machine has every field, so the form's values are of the schema's own output. */
const schema = writeMachineSchema as unknown as z.ZodType<WriteMachine, WriteMachine>
const textOrNull = { setValueAs: (text: unknown) => (text === '' ? null : text) }
const PARTS: Record<keyof WriteMachine, string> = { name: 'name', kind: 'kind', serial: 'serial number', location: 'place', feeder: 'feeder', gunTypes: 'guns', dutyCycle: 'duty cycle', dataOutput: 'data output', calibration: 'calibration', retired: 'whether it is retired', notes: 'notes', modes: 'modes' }

/** The machine's own form. It is saved as a whole; somebody else's save meanwhile is shown, never overwritten unasked. */
export function MachineForm({ machine }: { machine: Machine }) {
  const client = useQueryClient()
  const [seen, setSeen] = useState(machine)
  const [theirs, setTheirs] = useState<Machine | null>(null)
  const form = useZodForm(schema, machine.content)
  const { errors, isDirty } = form.formState
  const modes = useFieldArray({ control: form.control, name: 'modes' })
  const content = useWatch({ control: form.control }) as WriteMachine
  const take = (next: Machine) => {
    setSeen(next)
    setTheirs(null)
    form.reset(next.content)
  }
  // Told as soon as it is known, not only when a save is refused.
  const newer = theirs ?? (machine.version > seen.version ? machine : null)

  const save = useMutation({
    mutationFn: ({ body, version }: { body: WriteMachine; version: number }) => call('saveMachine', { params: { id: machine.id }, body, ifMatch: version }),
    onSuccess: (stored) => {
      client.setQueryData(query('readMachine', { params: { id: machine.id } }).queryKey, stored)
      for (const key of ['listMachines', 'readPanelCard', 'readToday']) void client.invalidateQueries({ queryKey: [key] })
      setSeen(stored)
      setTheirs(null)
      // The boxes stay as they are, with the cursor where it was.
      form.reset(stored.content, { keepValues: true })
      say(`${stored.number} is saved`)
    },
    onError: (error) => {
      const problem = asProblem(error)
      const current = machineSchema.safeParse(problem.current)
      if (problem.isConflict && current.success) setTheirs(current.data)
      else showProblem(form, error)
    },
  })
  const submit = form.handleSubmit((body) => {
    if (!save.isPending) save.mutate({ body, version: seen.version })
  })
  useSaveKey(() => void submit())
  const hold = useEffectEvent((event: BeforeUnloadEvent) => isDirty && event.preventDefault())
  useEffect(() => {
    const listen = (event: BeforeUnloadEvent) => void hold(event)
    window.addEventListener('beforeunload', listen)
    return () => window.removeEventListener('beforeunload', listen)
  }, [])
  const leaving = useBlocker(({ currentLocation, nextLocation }) => isDirty && currentLocation.pathname !== nextLocation.pathname)
  const add = (key: string) => {
    const pattern = PATTERNS.find((one) => one.key === key)
    if (pattern) modes.append({ ...structuredClone(pattern.mode), key: freshKey(pattern.mode.key, form.getValues('modes').map((mode) => mode.key)) })
  }
  const figure = { setValueAs: asFigure }
  const differing = newer && (Object.keys(PARTS) as (keyof WriteMachine)[]).filter((key) => !same(newer.content[key], seen.content[key]))
  return (
    <form noValidate onSubmit={(event) => void submit(event)}>
      <MachineTitle machine={seen} content={content} />
      <div className="no-print sticky top-0 z-20 -mx-4 mt-3 flex flex-wrap items-center gap-3 border-b border-rule bg-paper px-4 py-2 sm:mx-0 sm:px-0">
        <Button kind="primary" type="submit" pending={save.isPending} disabled={!isDirty}>
          Save
        </Button>
        <ButtonLink to={`/machines/${machine.id}/card`}>Panel card</ButtonLink>
        <p role="status" className={isDirty ? 'text-straw-deep' : 'text-soft'}>
          {isDirty ? (Object.keys(errors).length > 0 ? 'Not saved: something needs a look, marked below.' : 'Not saved yet') : 'Saved'}
        </p>
      </div>
      {newer && (
        <div role="alert" className="mt-4 border-l-[3px] border-l-oxide bg-oxide-bg px-4 py-3">
          <p className="font-semibold">Somebody else saved {newer.number} since you opened it</p>
          <p className="max-w-prose">They changed {differing && differing.length > 0 ? differing.map((key) => PARTS[key]).join(', ') : 'nothing that you can see'}. Nothing of yours is lost: take theirs, or save yours over it.</p>
          <p className="mt-2 flex flex-wrap gap-2">
            <Button onClick={() => void form.handleSubmit((body) => save.mutate({ body, version: newer.version }))()}>Save mine over it</Button>
            <Button onClick={() => take(newer)}>Take theirs</Button>
          </p>
        </div>
      )}
      <FormError message={errors.root?.message} />
      <Sheet id="machine" title="The machine" className="mt-4">
        <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-2 lg:grid-cols-3">
          <TextField label="Name" maxLength={120} error={errors.name?.message} {...form.register('name')} />
          <Select label="Kind" options={KIND_OPTIONS} {...form.register('kind')} />
          <TextField label="Where it stands" optional maxLength={120} error={errors.location?.message} {...form.register('location')} />
          <TextField label="Serial number" optional maxLength={80} error={errors.serial?.message} {...form.register('serial')} />
          <TextField label="Feeder" optional maxLength={120} error={errors.feeder?.message} {...form.register('feeder')} />
          <DutyCycle form={form} />
          <Controller control={form.control} name="gunTypes" render={({ field }) => <div className="sm:col-span-2 lg:col-span-3"><TagPicker label="Guns and torches" options={GUN_OPTIONS} value={field.value} onChange={field.onChange} /></div>} />
          <div className="space-y-2">
            <Checkbox label="Hands its figures out as data" {...form.register('dataOutput')} />
            <Checkbox label="Retired" description="Kept for its records; no panel card is made for it." {...form.register('retired')} />
          </div>
          <TextArea className="sm:col-span-1 lg:col-span-2" label="Notes" optional maxLength={4000} error={errors.notes?.message} {...form.register('notes', textOrNull)} />
        </div>
      </Sheet>
      <Sheet id="calibration" title="Calibration" className="mt-4">
        <div className="grid gap-x-6 gap-y-4 px-4 py-4 sm:grid-cols-3">
          <TextField label="Certificate" optional maxLength={120} error={errors.calibration?.certificate?.message} {...form.register('calibration.certificate', textOrNull)} />
          <TextField label="Done on" optional type="date" error={errors.calibration?.doneOn?.message} {...form.register('calibration.doneOn', textOrNull)} />
          <TextField label="Due on" optional type="date" description="Administrators and engineers are told by e-mail 30 days before." error={errors.calibration?.dueOn?.message} {...form.register('calibration.dueOn', textOrNull)} />
          <TextField label="Amps true to ± %" optional inputMode="decimal" error={wrong(errors.calibration?.accuracy?.current)} {...form.register('calibration.accuracy.current', figure)} />
          <TextField label="Volts true to ± %" optional inputMode="decimal" error={wrong(errors.calibration?.accuracy?.voltage)} {...form.register('calibration.accuracy.voltage', figure)} />
          <TextField label="Wire feed true to ± %" optional inputMode="decimal" description="Of the reading, as the certificate says. Cards are narrowed by it." error={wrong(errors.calibration?.accuracy?.wireFeed)} {...form.register('calibration.accuracy.wireFeed', figure)} />
          <TextField className="sm:col-span-3" label="Remark" optional maxLength={200} error={errors.calibration?.accuracyNote?.message} {...form.register('calibration.accuracyNote', textOrNull)} />
        </div>
        <FilesSheet machineId={machine.id} manages />
      </Sheet>
      {modes.fields.map((field, index) => (
        <ModeEditor key={field.id} form={form} mode={index} count={modes.fields.length} onMove={modes.move} onRemove={() => modes.remove(index)} />
      ))}
      {leaving.state === 'blocked' && (
        <Dialog title="Leave without saving?" isOpen onClose={() => leaving.reset()}>
          <p>What you changed on {seen.number} is not saved yet.</p>
          <div className="mt-4 flex flex-wrap justify-end gap-2">
            <Button onClick={() => leaving.proceed()}>Leave without saving</Button>
            <Button kind="primary" onClick={() => leaving.reset()}>
              Stay here
            </Button>
          </div>
        </Dialog>
      )}
      <div className="no-print mt-4 flex flex-wrap items-center gap-2 border border-dashed border-edge px-4 py-4">
        <p className="mr-2 font-medium">Add a mode like</p>
        {PATTERNS.map(({ key, label }) => (
          <Button key={key} icon={<Plus size={14} aria-hidden="true" />} onClick={() => add(key)}>
            {label}
          </Button>
        ))}
      </div>
    </form>
  )
}

/** Rated current and the share of ten minutes for which it holds: both or neither. */
function DutyCycle({ form }: { form: ReturnType<typeof useZodForm<WriteMachine, WriteMachine>> }) {
  const duty = useWatch({ control: form.control, name: 'dutyCycle' })
  const put = (part: Partial<NonNullable<WriteMachine['dutyCycle']>>) => form.setValue('dutyCycle', { percent: 60, current: 0, ...duty, ...part }, { shouldDirty: true, shouldValidate: true })
  const error = form.formState.errors.dutyCycle
  return (
    <fieldset>
      <legend className="mb-1 font-medium">
        Duty cycle <span className="font-normal text-soft">(optional)</span>
      </legend>
      <div className="flex items-center gap-2">
        <input key={`current ${duty ? 'given' : 'open'}`} aria-label="Rated current, A" inputMode="decimal" className="box w-20" defaultValue={duty?.current ?? ''} onBlur={(event) => (event.target.value.trim() === '' ? form.setValue('dutyCycle', null, { shouldDirty: duty !== null }) : put({ current: asFigure(event.target.value) ?? 0 }))} />
        <span className="text-soft">A at</span>
        <input key={`percent ${duty ? 'given' : 'open'}`} aria-label="Share of ten minutes, %" inputMode="decimal" className="box w-16" defaultValue={duty?.percent ?? ''} onBlur={(event) => event.target.value.trim() !== '' && put({ percent: asFigure(event.target.value) ?? 0 })} />
        <span className="text-soft">%</span>
      </div>
      {error && <p className="mt-1 text-sm font-medium text-oxide">Give the rated current above 0 A, and 1 to 100 %.</p>}
    </fieldset>
  )
}
