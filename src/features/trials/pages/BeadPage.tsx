import { useQuery, useQueryClient } from '@tanstack/react-query'
import { ArrowLeft } from 'lucide-react'
import { useEffect, useState } from 'react'
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import { beadContentSchema, beadSchema, type Bead, type BeadContent, type Trial } from '@shared/schemas/trials.ts'
import { changedSettings } from '@shared/trials/compare-beads.ts'
import { copyBead } from '@shared/trials/copy-bead.ts'
import { faultsInWords } from '@shared/trials/faults.ts'
import { Button } from '@/components/Button.tsx'
import { ErrorState, Skeleton } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useMay, useSession } from '@/hooks/session.ts'
import { useTitle } from '@/hooks/title.ts'
import { useUnits } from '@/hooks/units.ts'
import { call, upload } from '@/lib/api.ts'
import { same } from '@/lib/draft/paths.ts'
import { asProblem } from '@/lib/problem.ts'
import { trialQuery } from '../api.ts'
import { BeadForm } from '../form/BeadForm.tsx'
import { dropNewDraft, freshBead, holdPictures, keepEdit, keepNewDraft, keepWaiting, readEdit, readNewDrafts, readWaiting, type BeadDraft } from '../kept.ts'

/** The form of a bead by night: a new one, copied from another (`?copy=`), or one that is stored (`?edit=`). */
export function BeadPage() {
  const { id = '' } = useParams()
  const [search] = useSearchParams()
  const trial = useQuery(trialQuery(id))
  const may = useMay('trials.record')
  const { person } = useSession()
  // Lists and messages open outside this page's own element, so the whole window goes dark with it.
  useEffect(() => {
    const { classList } = document.documentElement
    const before = classList.contains('night')
    // After the layout around it has put the person's own theme.
    const timer = setTimeout(() => classList.add('night'))
    return () => {
      clearTimeout(timer)
      classList.toggle('night', before)
    }
  }, [])
  const edit = search.get('edit')
  const stored = trial.data?.beads.find((bead) => bead.id === edit) ?? null
  return (
    <main className="night shop min-h-dvh">
      <div className="mx-auto max-w-lg">
        <nav aria-label="Back" className="no-print px-3 pt-1">
          <Link to={`/dial-in/${id}`} className="inline-flex min-h-12 items-center gap-2 px-2 text-soft hover:text-ink">
            <ArrowLeft size={20} aria-hidden="true" />
            {trial.data ? `${trial.data.number}, all beads` : 'All beads'}
          </Link>
        </nav>
        {trial.isPending && <Skeleton label="Reading the trial" rows={8} />}
        {trial.isError && !trial.data && (
          <div className="p-4">
            <h1 className="sr-only">Trial bead</h1>
            <ErrorState error={trial.error} onRetry={() => void trial.refetch()} />
          </div>
        )}
        {trial.data && person && (!may || (edit !== null && !stored) ? <div className="p-4"><h1 className="font-narrow text-3xl font-semibold">Trial bead</h1><p className="mt-2">{may ? 'That bead is not in this trial any more.' : 'Engineers, inspectors, supervisors and welders log beads; you read them.'}</p></div> : stored ? <EditBead key={stored.id} trial={trial.data} bead={stored} personId={person.id} /> : <NewBead key={search.toString()} trial={trial.data} copy={search.get('copy')} personId={person.id} />)}
      </div>
    </main>
  )
}

const Head = ({ title, about }: { title: string; about: string }) => {
  useTitle(title)
  return (
    <header className="px-4 pt-1 pb-4">
      <h1 className="font-narrow text-3xl font-semibold">{title}</h1>
      <p className="text-pretty text-soft">{about}</p>
    </header>
  )
}

/** The bead that the new one starts from: the one asked for, else the last, sent or waiting. */
function baseOf(trial: Trial, copy: string | null, personId: string): Pick<Bead, 'id' | 'number' | 'content'> | null {
  const waiting = readWaiting(personId, trial.id).filter(({ id }) => !trial.beads.some((bead) => bead.id === id)).map(({ id, content }, index) => ({ id, content, number: (trial.beads.at(-1)?.number ?? 0) + index + 1 }))
  const all = [...trial.beads, ...waiting]
  return all.find(({ id }) => id === copy) ?? (copy === 'none' ? null : (all.at(-1) ?? null))
}

function NewBead({ trial, copy, personId }: { trial: Trial; copy: string | null; personId: string }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const { system } = useUnits()
  const [base] = useState(() => baseOf(trial, copy, personId))
  const fresh = () => freshBead(base ? copyBead(base.content) : beadContentSchema.parse({}), base?.id ?? null)
  const [kept] = useState(() => {
    const drafts = readNewDrafts(personId, trial.id)
    // Copying the last goes on with whatever was left half written; copying a bead by choice, only with a copy of that one.
    return (copy === null ? drafts[0] : drafts.find(({ from }) => from === (base?.id ?? null))) ?? null
  })
  const [draft, setDraft] = useState<BeadDraft>(() => kept ?? fresh())
  const [pictures, setPictures] = useState<readonly File[]>([])
  const [resumed, setResumed] = useState(kept !== null)
  const from = trial.beads.find(({ id }) => id === draft.from) ?? (base?.id === draft.from ? base : null)
  const number = (trial.beads.at(-1)?.number ?? 0) + readWaiting(personId, trial.id).length + 1

  const change = (content: BeadContent) => {
    const next = { ...draft, content, at: new Date().toISOString() }
    setDraft(next)
    keepNewDraft(personId, trial.id, next)
  }
  const save = (content: BeadContent) => {
    // First onto this device, then on its way: a dropped network costs nothing.
    const safe = keepWaiting(personId, trial.id, [...readWaiting(personId, trial.id).filter(({ id }) => id !== draft.id), { id: draft.id, content, at: new Date().toISOString(), refusal: null }])
    if (!safe) return void sendAtOnce(content)
    holdPictures(draft.id, pictures)
    dropNewDraft(personId, trial.id, draft.from)
    void navigate(`/dial-in/${trial.id}`)
  }
  /** Where the device keeps nothing, the form stays until the server has the bead. */
  const sendAtOnce = async (content: BeadContent) => {
    try {
      await call('addBead', { params: { id: trial.id }, body: { id: draft.id, content } })
      await client.invalidateQueries({ queryKey: trialQuery(trial.id).queryKey })
      if (pictures.length > 0) await upload('addBeadPhotos', { params: { id: draft.id }, files: pictures })
      void navigate(`/dial-in/${trial.id}`)
    } catch (error) {
      sayProblem(error)
    }
  }
  return (
    <>
      <Head title={`Bead ${number}`} about={from ? `A copy of bead ${from.number}${from.content.score ? `, which scored ${from.content.score}` : ''}${from.content.faults.length > 0 ? ` (${faultsInWords(from.content.faults)})` : ''}. Change one thing.` : `The first bead of ${trial.number}, ${trial.title}.`} />
      {resumed && <Resumed said="You were writing this bead; it is as you left it." otherwise="Start anew" onOtherwise={() => { dropNewDraft(personId, trial.id, draft.from); setDraft(fresh()); setResumed(false) }} />}
      <BeadForm content={draft.content} onChange={change} before={from} system={system} pictures={pictures} onPictures={setPictures} onSave={save} saveLabel={`Save bead ${number}`} />
    </>
  )
}

/** What was typed before is here again, and the way out of it. */
function Resumed({ said, otherwise, onOtherwise }: { said: string; otherwise: string; onOtherwise: () => void }) {
  return (
    <div role="status" className="mx-4 mb-4 flex flex-wrap items-center justify-between gap-3 border-l-4 border-l-straw bg-straw-bg px-3 py-2">
      <p>{said}</p>
      <Button className="min-h-12" onClick={onOtherwise}>{otherwise}</Button>
    </div>
  )
}

function EditBead({ trial, bead, personId }: { trial: Trial; bead: Bead; personId: string }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const { system } = useUnits()
  const asStored = (): BeadDraft => ({ id: bead.id, content: bead.content, from: null, version: bead.version, at: bead.weldedAt })
  const [kept] = useState(() => readEdit(personId, trial.id, bead.id))
  const [draft, setDraft] = useState<BeadDraft>(() => kept ?? asStored())
  const [resumed, setResumed] = useState(kept !== null && !same(kept.content, bead.content))
  const [pictures, setPictures] = useState<readonly File[]>([])
  const [pending, setPending] = useState(false)
  const [refusal, setRefusal] = useState<string>()
  const [theirs, setTheirs] = useState<Bead | null>(null)
  const before = trial.beads.filter(({ number }) => number < bead.number).at(-1) ?? null
  const keep = (next: BeadDraft) => {
    setDraft(next)
    keepEdit(personId, trial.id, bead.id, next)
  }
  const save = async (content: BeadContent, version = draft.version ?? bead.version) => {
    setPending(true)
    setRefusal(undefined)
    try {
      const stored = await call('saveBead', { params: { id: bead.id }, body: { content }, ifMatch: version })
      keepEdit(personId, trial.id, bead.id, null)
      if (pictures.length > 0) await upload('addBeadPhotos', { params: { id: bead.id }, files: pictures }).catch(sayProblem)
      client.setQueryData(trialQuery(trial.id).queryKey, (known) => known && { ...known, beads: known.beads.map((one) => (one.id === stored.id ? stored : one)) })
      await client.invalidateQueries({ queryKey: trialQuery(trial.id).queryKey })
      say(`Bead ${bead.number} is saved`)
      void navigate(`/dial-in/${trial.id}?bead=${bead.number}`)
    } catch (error) {
      const problem = asProblem(error)
      const current = problem.isConflict ? beadSchema.safeParse(problem.current) : null
      if (current?.success) setTheirs(current.data)
      else setRefusal(problem.message)
    } finally {
      setPending(false)
    }
  }
  return (
    <>
      <Head title={`Bead ${bead.number}`} about={`Welded by ${bead.by.name}. What you change is kept on this device until it is saved.`} />
      {resumed && <Resumed said="You were changing this bead; it is as you left it." otherwise="Back to what is stored" onOtherwise={() => { keepEdit(personId, trial.id, bead.id, null); setDraft(asStored()); setResumed(false) }} />}
      {theirs && <TwoVersions mine={draft.content} theirs={theirs} onMine={() => { const { version } = theirs; setTheirs(null); keep({ ...draft, version }); void save(draft.content, version) }} onTheirs={() => { keep({ ...draft, content: theirs.content, version: theirs.version }); setTheirs(null) }} />}
      <BeadForm content={draft.content} onChange={(content) => keep({ ...draft, content, at: new Date().toISOString() })} before={before} system={system} pictures={pictures} onPictures={setPictures} onSave={(content) => void save(content)} pending={pending} refusal={refusal} saveLabel={`Save bead ${bead.number}`} />
    </>
  )
}

/** Somebody else saved first: what they have, what you have, and which of the two stays. */
function TwoVersions({ mine, theirs, onMine, onTheirs }: { mine: BeadContent; theirs: Bead; onMine: () => void; onTheirs: () => void }) {
  const rows = [
    ...changedSettings(theirs.content.settings, mine.settings).map(({ label, unit, before, after }) => ({ label, theirs: before === null ? 'not set' : `${before} ${unit}`, mine: after === null ? 'not set' : `${after} ${unit}` })),
    ...(theirs.content.score === mine.score ? [] : [{ label: 'Score', theirs: String(theirs.content.score ?? 'none'), mine: String(mine.score ?? 'none') }]),
    ...(same(theirs.content.faults, mine.faults) ? [] : [{ label: 'Faults', theirs: faultsInWords(theirs.content.faults) || 'none', mine: faultsInWords(mine.faults) || 'none' }]),
    ...(theirs.content.note === mine.note ? [] : [{ label: 'Note', theirs: theirs.content.note ?? 'none', mine: mine.note ?? 'none' }]),
    ...(same(theirs.content.measured, mine.measured) ? [] : [{ label: 'Measured', theirs: 'other figures', mine: 'your figures' }]),
  ]
  return (
    <section aria-label="Two versions" role="alert" className="mx-4 mb-4 border border-straw bg-straw-bg px-3 py-3">
      <p className="font-semibold">Somebody else saved this bead first. Nothing of yours is lost.</p>
      <dl className="my-2 space-y-1">
        {rows.map((row) => (
          <div key={row.label}><dt className="inline font-medium">{row.label}: </dt><dd className="inline">theirs {row.theirs}, yours {row.mine}</dd></div>
        ))}
        {rows.length === 0 && <p>Only the set-up differs.</p>}
      </dl>
      <div className="flex flex-wrap gap-2">
        <Button className="min-h-12" kind="primary" onClick={onMine}>Save mine over it</Button>
        <Button className="min-h-12" onClick={onTheirs}>Take theirs into the form</Button>
      </div>
    </section>
  )
}
