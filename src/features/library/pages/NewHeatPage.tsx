import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useWatch } from 'react-hook-form'
import { useNavigate, useSearchParams } from 'react-router-dom'
import type { z } from 'zod'
import { writeHeatSchema, type WriteHeat } from '@shared/schemas/heats.ts'
import type { LibraryItem } from '@shared/schemas/records.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Breadcrumb, EmptyState, PageHead, Skeleton } from '@/components/states.tsx'
import { say } from '@/components/toast.tsx'
import { useSaveKey } from '@/hooks/keys.ts'
import { useMay } from '@/hooks/session.ts'
import { useUnsaved } from '@/hooks/unsaved.ts'
import { call } from '@/lib/api.ts'
import { showProblem, useZodForm } from '@/lib/forms.ts'
import { query } from '@/lib/query.ts'
import { HeatFields } from '../components/HeatFields.tsx'
import { BesideFigures, HeatFiguresSheet } from '../components/HeatFiguresSheet.tsx'
import { HEAT_KINDS } from '../heat-form.ts'

export const heatFormSchema = writeHeatSchema as unknown as z.ZodType<WriteHeat, WriteHeat>

/** Records a heat or a lot; `?kind=lot`, or `?of=` a row of the library it is of. */
export function NewHeatPage() {
  const [search] = useSearchParams()
  const of = search.get('of')
  const rowKind = search.get('kind') === 'filler-metals' ? 'filler-metals' : 'base-metals'
  const kind: WriteHeat['kind'] = search.get('kind') === 'filler-metals' || search.get('kind') === 'lot' ? 'lot' : 'heat'
  const manages = useMay('heats.manage')
  const item = useQuery({ ...query('readLibraryItem', { params: { kind: rowKind, id: of ?? '' } }), enabled: of !== null })
  if (!manages) {
    return (
      <>
        <PageHead title="Not for your roles" />
        <EmptyState title="Engineers, inspectors and administrators record heats and lots" step={<ButtonLink to="/library/heats">Back to the list</ButtonLink>}>
          <p>Hand the certificate to one of them.</p>
        </EmptyState>
      </>
    )
  }
  if (of !== null && item.isPending) return <Skeleton label="Reading the library" />
  return <Form key={kind} kind={kind} item={item.data ?? null} />
}

function Form({ kind: begun, item }: { kind: WriteHeat['kind']; item: LibraryItem | null }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const [unread, setUnread] = useState<string[]>([])
  const form = useZodForm(heatFormSchema, { ...writeHeatSchema.parse({ kind: begun, number: 'x', grade: 'x' }), number: '', grade: item?.title ?? '', libraryId: item?.key ?? null })
  const { errors, isDirty } = form.formState
  const content = useWatch({ control: form.control }) as WriteHeat
  const create = useMutation({
    mutationFn: (body: WriteHeat) => call('createHeat', { body }),
    onSuccess: (heat) => {
      void client.invalidateQueries({ queryKey: ['listHeats'] })
      client.setQueryData(query('readHeat', { params: { id: heat.id } }).queryKey, heat)
      say(`${heat.content.number} is recorded`, { detail: 'Add its certificate now.' })
      void navigate(`/library/heats/${heat.id}`)
    },
    onError: (error) => showProblem(form, error),
  })
  useUnsaved(isDirty && !create.isSuccess)
  const submit = form.handleSubmit((body) => {
    if (unread.length > 0) form.setError('root', { message: `${unread.join(', ')}: correct what is no figure, or empty the cell.` })
    else if (!create.isPending) create.mutate(body)
  })
  useSaveKey(() => void submit())
  return (
    <>
      <Breadcrumb trail={[{ label: 'Heats and lots', to: '/library/heats' }, { label: HEAT_KINDS[begun].title }]} />
      <PageHead title={HEAT_KINDS[begun].title} actions={<ButtonLink to={`/library/heats/new?kind=${begun === 'heat' ? 'lot' : 'heat'}`}>{begun === 'heat' ? 'A lot of filler instead' : 'A heat of base metal instead'}</ButtonLink>}>
        Copy it from the certificate; the paper itself is added on the next page.
      </PageHead>
      <form noValidate onSubmit={(event) => void submit(event)}>
        <BesideFigures
          main={<HeatFields form={form} onUnread={setUnread} />}
          figures={<HeatFiguresSheet content={content} />}
          rest={
            <>
              <FormError message={errors.root?.message} />
              <div className="flex flex-wrap gap-2">
                <Button kind="primary" type="submit" pending={create.isPending}>
                  Record it
                </Button>
                <ButtonLink to="/library/heats">Not now</ButtonLink>
              </div>
            </>
          }
        />
      </form>
    </>
  )
}
