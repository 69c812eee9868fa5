import { useQuery } from '@tanstack/react-query'
import { useState, type ReactNode } from 'react'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import { idSchema } from '@shared/schemas/common.ts'
import { Button } from '@/components/Button.tsx'
import { CardBody } from '@/components/panel-card/CardBody.tsx'
import { CardChoices } from '@/components/panel-card/CardChoices.tsx'
import { usePanelCard, type CardChoice } from '@/components/panel-card/use-panel-card.ts'
import { Select } from '@/components/fields/text.tsx'
import { Stamp } from '@/components/Stamp.tsx'
import { Breadcrumb, ErrorState, Skeleton } from '@/components/states.tsx'
import { useTitle } from '@/hooks/title.ts'
import { day } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'

/** A procedure on a machine: chosen by address, so that a card can be bookmarked, printed and hung beside the machine. */
export function CardPage() {
  const { id } = useParams()
  const navigate = useNavigate()
  const [search, setSearch] = useSearchParams()
  const given = (key: string) => search.get(key) || null
  const revisionId = idSchema.safeParse(given('revision')).data ?? null
  const procedures = useQuery({ ...query('listProcedures', { query: { state: 'approved', limit: 200, sort: 'number' } }) })
  const revision = useQuery({ ...query('readRevision', { params: { id: revisionId ?? '' } }), enabled: revisionId !== null })
  const processes = revision.data?.content.variables.processes ?? []
  const block = processes.find((one) => one.id === given('process')) ?? processes[0]
  const choice: CardChoice = { machine: idSchema.safeParse(id).data ?? null, mode: given('mode'), program: given('program'), pass: given('pass') }
  const state = usePanelCard(revision.data, block, choice)
  const name = revision.data ? `${revision.data.number} ${revision.data.revision}` : null
  useTitle([name, state.machine?.number, 'panel card'].filter(Boolean).join(' on ').replace(' on panel', ', panel').replace(/^p/, 'P'))

  const put = (changes: Record<string, string | null>) => {
    const next = new URLSearchParams(search)
    for (const [key, value] of Object.entries(changes)) {
      if (value) next.set(key, value)
      else next.delete(key)
    }
    return next
  }
  const change = (next: CardChoice) => {
    const address = put({ mode: next.mode, program: next.program, pass: next.pass })
    if (next.machine !== choice.machine) void navigate({ pathname: next.machine === null ? '/machines/card' : `/machines/${next.machine}/card`, search: address.toString() })
    else setSearch(address, { replace: true })
  }
  // The one that is shown is in the list even when it is a draft.
  const approved = (procedures.data?.items ?? []).map((row) => ({ value: row.revisionId, label: `${row.number} ${row.revision} · ${row.title}` }))
  const choices = revision.data && !approved.some(({ value }) => value === revisionId) ? [{ value: revision.data.id, label: `${name ?? ''} · ${revision.data.content.title}` }, ...approved] : approved
  return (
    <div className="shop">
      <Breadcrumb trail={[{ label: 'Machines', to: '/machines' }, ...(state.machine ? [{ label: state.machine.number, to: `/machines/${state.machine.id}` }] : []), { label: 'Panel card' }]} />
      <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,36rem)_minmax(0,1fr)] lg:gap-8">
        <article className="border border-rule bg-sheet max-sm:-mx-4 max-sm:border-x-0" aria-label="Panel card">
          <header className="border-b border-rule px-5 pt-4 pb-4">
            <p className="font-narrow tracking-[0.055em] text-soft uppercase">Panel card</p>
            <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
              <h1 className="font-narrow text-3xl font-semibold">
                {name ?? 'Choose a procedure'}
                {name && state.machine && <span className="text-soft"> on {state.machine.number}</span>}
              </h1>
              {revision.data && <Stamp state={revision.data.state} />}
            </div>
            {revision.data && (
              <p className="mt-1 text-pretty text-soft">
                {revision.data.content.title}
                {block?.process && ` · ${block.process}`}
                {block?.filler.classification && ` · ${block.filler.classification}`}
                {state.card.data?.pass && ` · pass ${state.card.data.pass}`}
                {state.machine && ` · ${state.machine.content.name}`}
              </p>
            )}
            {state.card.data && <p className="hidden text-sm print:block">Worked out on {day(new Date(state.card.dataUpdatedAt).toISOString())}. It holds for this machine, wire and gas while this revision is in force.</p>}
          </header>
          {revision.isError && <div className="p-4"><ErrorState compact error={revision.error} onRetry={() => void revision.refetch()} /></div>}
          {revisionId !== null && revision.isPending && <Skeleton label="Reading the procedure" rows={4} />}
          {revision.data && choice.machine !== null && <CardBody state={state} />}
          {(revisionId === null || choice.machine === null) && <p className="px-5 py-4 text-pretty">Choose the procedure and the machine in front of you. What the procedure allows becomes the figures to dial, with the room left; where the machine can’t keep it, the card says why.</p>}
        </article>
        <aside aria-label="What the card is for" className="no-print max-lg:order-first">
          <Chosen complete={revision.data !== undefined && choice.machine !== null}>
          {procedures.isError && <ErrorState compact error={procedures.error} onRetry={() => void procedures.refetch()} />}
          <Select label="Procedure" empty="choose an approved procedure" value={revisionId ?? ''} options={choices} onChange={(event) => setSearch(put({ revision: event.target.value, process: null, mode: null, program: null, pass: null }), { replace: true })} />
          {processes.length > 1 && <Select label="Process" value={block?.id ?? ''} options={processes.map((one, index) => ({ value: one.id, label: one.process ?? `Process ${index + 1}` }))} onChange={(event) => setSearch(put({ process: event.target.value, mode: null, program: null, pass: null }), { replace: true })} />}
          {block && <CardChoices state={state} choice={choice} onChange={change} />}
          </Chosen>
          <div className="mt-1 flex flex-wrap items-center gap-x-5 gap-y-2 pt-1">
            {state.card.data && <Button onClick={() => window.print()}>Print</Button>}
            {revision.data && (
              <Link to={`/shop/${revision.data.id}`} className="text-link inline-flex min-h-11 items-center">
                Shop view
              </Link>
            )}
            {revision.data && (
              <Link to={`/revisions/${revision.data.id}`} className="text-link inline-flex min-h-11 items-center">
                Whole procedure
              </Link>
            )}
          </div>
        </aside>
      </div>
    </div>
  )
}

/** The choices, folded away on a phone once they are made, so that the card itself stands first. */
function Chosen({ complete, children }: { complete: boolean; children: ReactNode }) {
  const [wide] = useState(() => typeof matchMedia !== 'function' || matchMedia('(min-width: 64rem)').matches)
  if (wide || !complete) return <div className="space-y-3">{children}</div>
  return (
    <details>
      <summary className="flex min-h-12 cursor-pointer items-center font-medium underline underline-offset-4">Change procedure, machine or mode</summary>
      <div className="space-y-3 pb-2">{children}</div>
    </details>
  )
}
