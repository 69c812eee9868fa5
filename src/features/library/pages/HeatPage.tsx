import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useWatch } from 'react-hook-form'
import { useNavigate, useParams } from 'react-router-dom'
import { heatSchema, type Heat, type WriteHeat } from '@shared/schemas/heats.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { PapersSheet } from '@/components/papers/PapersSheet.tsx'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { useUnsaved } from '@/hooks/unsaved.ts'
import { call, hrefOf, upload } from '@/lib/api.ts'
import { same } from '@/lib/draft/paths.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { asProblem } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { HeatFields } from '../components/HeatFields.tsx'
import { BesideFigures, HeatFiguresSheet } from '../components/HeatFiguresSheet.tsx'
import { HeatReading, HeatTitle } from '../components/HeatReading.tsx'
import { NamedBySheet } from '../components/NamedBySheet.tsx'
import { PARTS } from '../heat-form.ts'
import { heatFormSchema } from './NewHeatPage.tsx'

/** One heat or lot: its form for those who keep them, else as text. */
export function HeatPage() {
  const { id = '' } = useParams()
  const heat = useQuery(query('readHeat', { params: { id } }))
  if (heat.isPending) return <Skeleton label="Reading the heat" />
  return (
    <>
      <Breadcrumb trail={[{ label: 'Heats and lots', to: '/library/heats' }, { label: heat.data?.content.number ?? 'Not there' }]} />
      {heat.data ? heat.data.may.includes('save') ? <Form key={heat.data.id} heat={heat.data} /> : <Read heat={heat.data} /> : <RecordError title="The heat can’t be shown" error={heat.error} onRetry={() => void heat.refetch()} />}
    </>
  )
}

function Read({ heat }: { heat: Heat }) {
  return (
    <>
      <HeatTitle heat={heat} content={heat.content} />
      <BesideFigures main={<div className="space-y-4"><HeatReading content={heat.content} /></div>} figures={<HeatFiguresSheet content={heat.content} />} rest={<Rest heat={heat} />} />
    </>
  )
}

/** Certificates, and the records that name it. */
function Rest({ heat }: { heat: Heat }) {
  const client = useQueryClient()
  const { queryKey } = query('readHeat', { params: { id: heat.id } })
  const again = async () => {
    void client.invalidateQueries({ queryKey: ['listHeats'] })
    await client.invalidateQueries({ queryKey })
  }
  const manages = heat.may.includes('attach')
  return (
    <>
      <PapersSheet
        title="Certificates"
        none={manages ? 'Keep the certificate here: whoever doubts a figure finds what it rests on.' : 'No certificate is kept here.'}
        papers={heat.files}
        hrefOf={(id) => hrefOf('readHeatFile', { id })}
        manages={manages}
        send={(files, progress) => upload('addHeatFiles', { params: { id: heat.id }, files, ...progress })}
        remove={(id) => call('removeHeatFile', { params: { id } })}
        onChanged={again}
      />
      <NamedBySheet title="Named by" none={`No record names ${heat.content.kind === 'heat' ? 'the heat' : 'the lot'} yet. Its number is offered where a ${heat.content.kind === 'heat' ? 'base metal' : 'filler'} of its kind stands.`} items={heat.namedBy} />
    </>
  )
}

function Form({ heat }: { heat: Heat }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const [seen, setSeen] = useState(heat)
  const [theirs, setTheirs] = useState<Heat | null>(null)
  const [unread, setUnread] = useState<string[]>([])
  const [removing, setRemoving] = useState(false)
  const form = useZodForm(heatFormSchema, heat.content)
  const { errors, isDirty } = form.formState
  const content = useWatch({ control: form.control }) as WriteHeat
  const newer = theirs ?? (heat.version > seen.version ? heat : null)
  const take = (next: Heat) => {
    setSeen(next)
    setTheirs(null)
    setUnread([])
    form.reset(next.content)
  }
  const save = useMutation({
    mutationFn: ({ body, version }: { body: WriteHeat; version: number }) => call('saveHeat', { params: { id: heat.id }, body, ifMatch: version }),
    onSuccess: (stored) => {
      take(stored)
      client.setQueryData(query('readHeat', { params: { id: heat.id } }).queryKey, stored)
      void client.invalidateQueries({ queryKey: ['listHeats'] })
      say(`${stored.content.number} is saved`)
    },
    onError: (error) => {
      const problem = asProblem(error)
      const current = heatSchema.safeParse(problem.current)
      if (problem.isConflict && current.success) setTheirs(current.data)
      else showProblem(form, error)
    },
  })
  const remove = useMutation({
    mutationFn: () => call('removeHeat', { params: { id: heat.id }, ifMatch: seen.version }),
    onSuccess: () => {
      say(`${seen.content.number} was removed`)
      void client.invalidateQueries({ queryKey: ['listHeats'] })
      void navigate('/library/heats')
    },
    onError: sayProblem,
  })
  useUnsaved(isDirty && !remove.isSuccess)
  const send = (version: number) =>
    form.handleSubmit((body) => {
      if (unread.length > 0) form.setError('root', { message: `${unread.join(', ')}: correct what is no figure, or empty the cell.` })
      else if (!save.isPending) save.mutate({ body, version })
    })()
  useSaveKey(() => void send(seen.version))
  const differing = newer && (Object.keys(PARTS) as (keyof WriteHeat)[]).filter((key) => !same(newer.content[key], seen.content[key]))
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault()
        void send(seen.version)
      }}
    >
      <HeatTitle heat={seen} content={content} />
      <div className="no-print sticky top-0 z-20 -mx-4 mt-3 flex flex-wrap items-center gap-3 border-b border-rule bg-paper px-4 py-2 sm:mx-0 sm:px-0">
        <Button kind="primary" type="submit" pending={save.isPending} disabled={!isDirty}>
          Save
        </Button>
        {heat.may.includes('remove') && <Button onClick={() => setRemoving(true)}>Remove it</Button>}
        <p role="status" className={isDirty ? 'text-straw-deep' : 'text-soft'}>
          {isDirty ? (Object.keys(errors).length > 0 || unread.length > 0 ? 'Not saved: something needs a look, marked below.' : 'Not saved yet') : 'Saved'}
        </p>
      </div>
      {newer && (
        <div role="alert" className="mt-4 border-l-[3px] border-l-oxide bg-oxide-bg px-4 py-3">
          <p className="font-semibold">Somebody else saved {newer.content.number} since you opened it</p>
          <p className="max-w-prose">They changed {differing && differing.length > 0 ? differing.map((key) => PARTS[key]).join(', ') : 'nothing that you can see'}. Nothing of yours is lost: take theirs, or save yours over it.</p>
          <p className="mt-2 flex flex-wrap gap-2">
            <Button onClick={() => void send(newer.version)}>Save mine over it</Button>
            <Button onClick={() => take(newer)}>Take theirs</Button>
          </p>
        </div>
      )}
      <div className="mt-4">
        <FormError message={errors.root?.message} />
      </div>
      <BesideFigures main={<HeatFields form={form} onUnread={setUnread} />} figures={<HeatFiguresSheet content={content} />} rest={<Rest heat={heat} />} />
      {removing && (
        <Dialog
          title={`Remove ${seen.content.number}?`}
          isOpen
          onClose={() => setRemoving(false)}
          footer={
            <>
              <Button onClick={() => setRemoving(false)}>Keep it</Button>
              <Button kind="danger" pending={remove.isPending} onClick={() => remove.mutate()}>
                Remove
              </Button>
            </>
          }
        >
          <p>
            It goes with {heat.files.length === 0 ? 'its chemistry' : heat.files.length === 1 ? 'its chemistry and its certificate' : `its chemistry and ${heat.files.length} certificates`}. No record names it.
          </p>
        </Dialog>
      )}
    </form>
  )
}
