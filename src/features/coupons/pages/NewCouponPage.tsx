import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState, type FormEvent } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { toBaseMetal } from '@shared/library/base-metals.ts'
import { idSchema } from '@shared/schemas/common.ts'
import type { BodyOf } from '@shared/schemas/endpoints.ts'
import { baseMetalSchema, couponContentSchema, type BaseMetal, type Process } from '@shared/schemas/welding.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { ComboBox } from '@/components/fields/ComboBox.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TagPicker, TextField } from '@/components/fields/text.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, PageHead } from '@/components/states.tsx'
import { metalInWords } from '@/components/variables/labels.ts'
import { freshChoice, PROCESS_OPTIONS } from '@/components/variables/options.ts'
import { ChoiceFields } from '@/components/variables/StandardChoices.tsx'
import { useMay } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { call } from '@/lib/api.ts'
import { searchLibrary } from '@/lib/library-search.ts'
import { asProblem } from '@/lib/problem.ts'
import { query } from '@/lib/query.ts'
import { couponQuery, searchProcedures } from '../api.ts'

const metals = searchLibrary('base-metals')

/** Opens a coupon: against a procedure, whose named variables come with it, or by itself. */
export function NewCouponPage() {
  const navigate = useNavigate()
  const client = useQueryClient()
  const mayRecord = useMay('coupons.record')
  const create = useMutation({
    mutationFn: (body: BodyOf<'createCoupon'>) => call('createCoupon', { body }),
    onSuccess: (coupon) => {
      client.setQueryData(couponQuery(coupon.id).queryKey, coupon)
      void client.invalidateQueries({ queryKey: ['listCoupons'] })
      void navigate(`/coupons/${coupon.id}`, { replace: true })
    },
  })
  const refusal = create.isError ? asProblem(create.error).message : undefined
  return (
    <>
      <Breadcrumb trail={[{ label: 'Coupons', to: '/coupons' }, { label: 'Open a coupon' }]} />
      <PageHead title="Open a coupon">It gets its number now, so that the plates and the photos can carry it.</PageHead>
      {mayRecord ? (
        <div className="grid max-w-5xl items-start gap-4 lg:grid-cols-2">
          <Against pending={create.isPending} onOpen={(revisionId) => create.mutate({ revisionId })} />
          <ByItself pending={create.isPending} onOpen={(content) => create.mutate({ content })} />
          {refusal && (
            <div className="lg:col-span-2">
              <FormError message={refusal} />
            </div>
          )}
        </div>
      ) : (
        <p className="max-w-prose border border-rule bg-sheet px-4 py-3">Inspectors open coupons. Ask one of them, or ask an administrator to make you one.</p>
      )}
    </>
  )
}

function Against({ pending, onOpen }: { pending: boolean; onOpen: (revisionId: string) => void }) {
  const asked = idSchema.safeParse(useSearchParams()[0].get('revision')).data
  const given = useQuery({ ...query('readRevision', { params: { id: asked ?? '' } }), enabled: asked !== undefined })
  const [picked, setPicked] = useState<{ id: string; name: string } | null>(null)
  const [wrong, setWrong] = useState<string | null>(null)
  const chosen = picked ?? (given.data ? { id: given.data.id, name: `${given.data.number} rev ${given.data.revision}` } : null)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (pending) return
    if (!chosen) return setWrong('Choose the procedure that the coupon is to support.')
    setWrong(null)
    onOpen(chosen.id)
  }
  return (
    <Sheet title="Against a procedure">
      <form noValidate onSubmit={submit} className="space-y-4 px-4 py-4">
        <p className="text-pretty text-soft">Joint, metals, filler and gas come from the procedure; what has to be measured is left open.</p>
        <ComboBox label="Procedure" text={chosen?.name ?? ''} queryKey="procedures" load={searchProcedures} placeholder="Number or title" error={wrong ?? (given.isError ? 'The procedure in the address is not there. Choose another.' : null)} onPick={(item) => setPicked(item && { id: item.id, name: item.title })} />
        {given.data && chosen?.id === given.data.id && <p className="text-sm text-soft">{given.data.content.title}</p>}
        <Button kind="primary" type="submit" pending={pending}>
          Open the coupon
        </Button>
      </form>
    </Sheet>
  )
}

function ByItself({ pending, onOpen }: { pending: boolean; onOpen: (content: NonNullable<BodyOf<'createCoupon'>['content']>) => void }) {
  const { system } = useUnits()
  const [title, setTitle] = useState('')
  const [choice, setChoice] = useState(() => freshChoice('asme-ix'))
  const [processes, setProcesses] = useState<Process[]>([])
  const [metal, setMetal] = useState<BaseMetal | null>(null)
  const [wrong, setWrong] = useState<string | null>(null)
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (pending) return
    if (title.trim() === '') return setWrong('Give the coupon a title, e.g. "12 mm plate, 3G".')
    setWrong(null)
    const both = metal ?? {}
    const blocks = (processes.length > 0 ? processes : [null]).map((process, index) => ({ id: `p${index + 1}`, process }))
    onOpen(couponContentSchema.parse({ title, variables: { standards: [choice], unitSystem: system, baseMetals: { a: both, b: both }, processes: blocks } }))
  }
  return (
    <Sheet title="By itself">
      <form noValidate onSubmit={submit} className="space-y-4 px-4 py-4">
        <p className="text-pretty text-soft">For a test piece that no procedure here asks for yet.</p>
        <TextField label="Title" maxLength={160} placeholder="e.g. 12 mm plate, 3G" value={title} error={wrong} onChange={(event) => setTitle(event.target.value)} />
        <div className="grid gap-4 sm:grid-cols-[repeat(auto-fit,minmax(9.5rem,1fr))]">
          <ChoiceFields choice={choice} record="coupon" onChange={setChoice} />
        </div>
        <TagPicker label="Processes" options={PROCESS_OPTIONS as { value: Process; label: string }[]} value={processes} onChange={setProcesses} />
        <ComboBox label="Metal" optional text={metal ? metalInWords(metal) : ''} queryKey="base-metals" load={metals} allowOwn placeholder="Grade, specification, UNS or P-Number" onPick={(item, text) => setMetal(item ? toBaseMetal(item.data) : text === '' ? null : baseMetalSchema.parse({ specification: text.slice(0, 80) }))} />
        <div className="flex flex-wrap gap-2">
          <Button type="submit" pending={pending}>
            Open the coupon
          </Button>
          <ButtonLink kind="quiet" to="/coupons">
            Not now
          </ButtonLink>
        </div>
      </form>
    </Sheet>
  )
}
