import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState, type FormEvent } from 'react'
import { useNavigate } from 'react-router-dom'
import { toBaseMetal } from '@shared/library/base-metals.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { baseMetalSchema, procedureContentSchema, type BaseMetal, type Process } from '@shared/schemas/welding.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Select, TagPicker, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, PageHead } from '@/components/states.tsx'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { call } from '@/lib/api.ts'
import { asProblem } from '@/lib/problem.ts'
import { searchLibrary } from '@/lib/library-search.ts'
import { revisionQuery } from '../api.ts'
import { metalInWords } from '@/components/variables/labels.ts'
import { freshChoice, PROCESS_OPTIONS, UNIT_SYSTEMS } from '@/components/variables/options.ts'
import { ChoiceFields } from '@/components/variables/StandardChoices.tsx'

const search = searchLibrary('base-metals')
const empty = baseMetalSchema.parse({})

/** The few things that everything else follows from; the rest is written on the sheet. */
export function NewProcedurePage() {
  const navigate = useNavigate()
  const client = useQueryClient()
  const mayDraft = useMay('procedures.draft')
  const { system: own } = useUnits()
  const [title, setTitle] = useState('')
  const [choice, setChoice] = useState(() => freshChoice('asme-ix'))
  const [system, setSystem] = useState<UnitSystem>(own)
  const [processes, setProcesses] = useState<Process[]>([])
  const [a, setA] = useState<BaseMetal>(empty)
  const [b, setB] = useState<BaseMetal | null>(null)
  const [wrong, setWrong] = useState<string | null>(null)
  const create = useMutation({
    mutationFn: (content: Parameters<typeof procedureContentSchema.parse>[0]) => call('createProcedure', { body: { content: procedureContentSchema.parse(content) } }),
    onSuccess: (revision) => {
      client.setQueryData(revisionQuery(revision.id).queryKey, revision)
      void client.invalidateQueries({ queryKey: ['listProcedures'] })
      void navigate(`/revisions/${revision.id}`, { replace: true })
    },
  })
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (create.isPending) return
    if (title.trim() === '') return setWrong('Give the procedure a title, e.g. "Groove weld, carbon steel plate".')
    setWrong(null)
    const named = processes.length > 0 ? processes : [null]
    create.mutate({ title, variables: { standards: [choice], unitSystem: system, baseMetals: { a, b: b ?? a }, processes: named.map((process, index) => ({ id: `p${index + 1}`, process })) } })
  }
  const picked = (metal: BaseMetal | null, set: (next: BaseMetal) => void, label: string, description: string) => (
    <ComboBox
      label={label}
      description={description}
      optional
      text={metal ? metalInWords(metal) : ''}
      queryKey="base-metals"
      load={search}
      allowOwn
      placeholder="Grade, specification, UNS or P-Number"
      onPick={(item, text) => set(item ? toBaseMetal(item.data) : baseMetalSchema.parse({ specification: text === '' ? null : text.slice(0, 80) }))}
    />
  )
  return (
    <>
      <Breadcrumb trail={[{ label: 'Procedures', to: '/procedures' }, { label: 'New procedure' }]} />
      <PageHead title="New procedure">What everything else follows from. All of it can be changed on the sheet.</PageHead>
      {mayDraft ? (
        <Sheet title="Start" className="max-w-3xl">
          <form noValidate onSubmit={submit} className="space-y-5 px-4 py-4">
            <TextField label="Title" maxLength={160} placeholder="e.g. Groove weld, carbon steel plate" value={title} error={wrong} onChange={(event) => setTitle(event.target.value)} />
            <div className="grid gap-4 sm:grid-cols-[repeat(auto-fit,minmax(9.5rem,1fr))]">
              <ChoiceFields choice={choice} record="procedure" onChange={setChoice} />
              <Select label="Written in" options={UNIT_SYSTEMS} value={system} onChange={(event) => setSystem(event.target.value === 'US' ? 'US' : 'SI')} />
            </div>
            <TagPicker label="Processes" description="Each gets its own sheets; their order can be changed there." options={PROCESS_OPTIONS as { value: Process; label: string }[]} value={processes} onChange={setProcesses} />
            <div className="grid gap-4 sm:grid-cols-2">
              {picked(a, setA, 'Metal A', 'Its P-Number and groups come with it.')}
              {picked(b, setB, 'Metal B', 'Left empty: the same as A.')}
            </div>
            <FormError message={create.isError ? asProblem(create.error).message : undefined} />
            <div className="flex flex-wrap gap-2">
              <Button kind="primary" type="submit" pending={create.isPending}>
                Open the sheet
              </Button>
              <ButtonLink to="/procedures">Not now</ButtonLink>
            </div>
          </form>
        </Sheet>
      ) : (
        <p className="max-w-prose border border-rule bg-sheet px-4 py-3">Engineers write procedures. Ask one of them, or ask an administrator to make you one.</p>
      )}
    </>
  )
}
