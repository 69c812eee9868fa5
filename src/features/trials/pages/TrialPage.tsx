import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Bead, Trial } from '@shared/schemas/trials.ts'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say } from '@/components/toast.tsx'
import { useSession } from '@/hooks/session.ts'
import { useUnits } from '@/hooks/units.ts'
import { day } from '@/lib/figures.ts'
import { asProblem } from '@/lib/problem.ts'
import { trialQuery, useMachineMode, useTrialActs } from '../api.ts'
import { BeadDetail } from '../components/BeadDetail.tsx'
import { BeadPlot } from '../components/BeadPlot.tsx'
import { BeadTable } from '../components/BeadTable.tsx'
import { CompareSheet } from '../components/CompareSheet.tsx'
import { bestOf, PromoteDialog } from '../components/PromoteDialog.tsx'
import { TrialDialog } from '../components/TrialDialog.tsx'
import { WaitingList } from '../components/WaitingList.tsx'
import { WireCurves } from '../components/WireCurves.tsx'
import { useWaiting } from '../waiting.ts'

/** A trial: its beads, what each change did, and the way to the next bead or to a procedure. */
export function TrialPage() {
  const { id = '' } = useParams()
  const trial = useQuery(trialQuery(id))
  if (trial.isPending) return <Skeleton label="Reading the trial" />
  return (
    <>
      <Breadcrumb trail={[{ label: 'Dial-in log', to: '/dial-in' }, { label: trial.data?.number ?? 'Trial' }]} />
      {trial.isError && !trial.data ? <RecordError title="The trial can’t be shown" error={trial.error} onRetry={() => void trial.refetch()} /> : trial.data && <TrialScreen trial={trial.data} />}
    </>
  )
}

type Open = { what: 'title' | 'discard' } | { what: 'promote'; bead: Bead | null } | null

function TrialScreen({ trial }: { trial: Trial }) {
  const navigate = useNavigate()
  const [search, setSearch] = useSearchParams()
  const { person } = useSession()
  const { system } = useUnits()
  const acts = useTrialActs(trial)
  const waiting = useWaiting(person?.id ?? '', trial.id)
  const [open, setOpen] = useState<Open>(null)
  const { beads } = trial
  const last = beads.at(-1)
  const { mode } = useMachineMode(last?.content.machineId ?? null, last?.content.modeKey ?? null)
  const shown = beads.find(({ number }) => String(number) === search.get('bead')) ?? null
  const records = trial.may.includes('record')
  // From a bead that went wrong one goes back to the best before another knob is tried. [common practice]
  const best = bestOf(beads)
  const back = best !== null && last !== undefined && best.id !== last.id && (last.content.score ?? 5) < (best.content.score ?? 0) ? best : null
  const none = <span className="text-soft">not yet</span>
  return (
    <div className="space-y-5">
      <TitleBlock
        kind="Trial" number={trial.number} title={trial.title}
        cells={[
          { label: 'Machine', children: trial.machine ?? none },
          { label: 'Wire', children: trial.wire ?? none },
          { label: 'Metal', children: trial.metal ?? none },
          { label: 'Beads', children: `${beads.length}${trial.bestScore === null ? '' : `, best ${trial.bestScore} of 5`}` },
          { label: 'Procedure', children: trial.procedureId ? <Link className="text-link" to={`/procedures/${trial.procedureId}`}>{trial.procedureNumber}</Link> : <span className="text-soft">none yet</span> },
          { label: 'By', children: <>{trial.by.name}<span className="block text-soft">{day(trial.updatedAt)}</span></> },
        ]}
      />
      {trial.goal && <p className="max-w-prose text-pretty"><span className="font-medium">Good when:</span> {trial.goal}</p>}
      <div className="no-print flex flex-wrap items-center gap-x-4 gap-y-2">
        {records && <ButtonLink kind="primary" to={last || waiting.beads.length > 0 ? `/dial-in/${trial.id}/bead` : `/dial-in/${trial.id}/bead?copy=none`} className="min-h-14 px-6 text-lg! max-sm:w-full">{last || waiting.beads.length > 0 ? 'Copy last bead, change one thing' : 'Log the first bead'}</ButtonLink>}
        {records && back && <ButtonLink to={`/dial-in/${trial.id}/bead?copy=${back.id}`} className="min-h-14 px-5 text-lg! max-sm:w-full">Back to bead {back.number}, the best</ButtonLink>}
        {trial.may.includes('promote') && beads.length > 0 && <Button className="max-sm:min-h-12 max-sm:grow" onClick={() => setOpen({ what: 'promote', bead: shown })}>Make it a procedure</Button>}
        {trial.may.includes('save') && <Button kind="quiet" className="max-sm:min-h-12" onClick={() => setOpen({ what: 'title' })}>Change title and goal</Button>}
        {trial.may.includes('discard') && <Button kind="quiet" className="max-sm:min-h-12" onClick={() => setOpen({ what: 'discard' })}>Discard the trial</Button>}
      </div>
      <WaitingList waiting={waiting} trialId={trial.id} personId={person?.id ?? ''} />
      <Sheet id="beads" title="Beads" aside={beads.length === 0 ? 'none yet' : 'what differs from the bead before is marked'}>
        {beads.length === 0 ? <p className="max-w-prose px-4 py-3 text-pretty text-soft">The first bead names the machine, its mode, the wire, the gas and every knob. Each one after that is a copy with one thing changed, by 5 to 10 % at a time, from the best bead so far (common practice).</p> : <BeadTable beads={beads} mode={mode} system={system} shown={shown?.number ?? null} />}
      </Sheet>
      {shown && <BeadDetail key={shown.id} trial={trial} bead={shown} onPromote={() => setOpen({ what: 'promote', bead: shown })} onGone={() => setSearch({}, { replace: true })} />}
      {beads.length > 0 && (
        <div className="grid items-start gap-5 xl:grid-cols-2">
          <CompareSheet beads={beads} mode={mode} />
          <div className="min-w-0 space-y-5">
            {beads.length > 1 && <BeadPlot beads={beads} />}
            <WireCurves beads={beads} />
          </div>
        </div>
      )}
      {open?.what === 'promote' && <PromoteDialog trial={trial} mode={mode} given={open.bead} onClose={() => setOpen(null)} />}
      {open?.what === 'title' && <TrialDialog heading={`Title of ${trial.number}`} submit="Save" given={{ title: trial.title, goal: trial.goal }} isOpen onClose={() => setOpen(null)} onSave={async (body) => { await acts.save.mutateAsync(body); setOpen(null) }} />}
      <Dialog
        title="Discard the trial" isOpen={open?.what === 'discard'} onClose={() => setOpen(null)}
        footer={<><Button onClick={() => setOpen(null)}>Keep it</Button><Button kind="danger" pending={acts.discard.isPending} onClick={() => acts.discard.mutate(undefined, { onSuccess: () => { say(`${trial.number} was discarded`); void navigate('/dial-in', { replace: true }) } })}>Discard {trial.number}</Button></>}
      >
        <FormError message={acts.discard.isError ? asProblem(acts.discard.error).message : undefined} />
        <p>{trial.number} with {beads.length === 1 ? 'its bead' : `all ${beads.length} beads`} and their photos is removed for good; its number is not given again. Recordings of the arc stay.</p>
      </Dialog>
    </div>
  )
}
