import { useState, type ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { geometryOf } from '@shared/calculations/joint-geometry.ts'
import type { Revision, RevisionState } from '@shared/schemas/records.ts'
import type { ProcessBlock } from '@shared/schemas/welding.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Caution, HAZARD_LIST, Responsibility } from '@/components/Caution.tsx'
import { JointDrawing } from '@/components/joint/JointDrawing.tsx'
import { CardBody } from '@/components/panel-card/CardBody.tsx'
import { CardChoices } from '@/components/panel-card/CardChoices.tsx'
import { NO_CHOICE, usePanelCard, type CardChoice } from '@/components/panel-card/use-panel-card.ts'
import { Stamp } from '@/components/Stamp.tsx'
import { useRemembered } from '@/hooks/remembered.ts'
import { cellsOf, dialsOf, type Dial } from '../shop.ts'
import { ShopPasses } from './ShopPasses.tsx'

export interface ShopCardProps {
  revision: Revision
  system: UnitSystem
  /** "JOB-002 J1", when opened for a joint of a job. */
  joint?: string | undefined
  /** Whether the look-up finds that this procedure covers the joint; null while not known. */
  fitsJoint?: boolean | null
  /** The revision that is in force, where this one is not. */
  inForce?: { id: string; revision: string } | null
  /** When it was read from the server. */
  readAt?: string | null
}

const WHY: Record<Exclude<RevisionState, 'approved'>, string> = {
  draft: 'This is a draft. Nobody has approved it.',
  'in-review': 'This is still in review. Nobody has approved it.',
  superseded: 'This revision was replaced.',
  withdrawn: 'This procedure was withdrawn.',
}

/** One procedure for one joint, in one column, read at arm's length with a glove on. */
export function ShopCard({ revision, system, joint, fitsJoint = null, inForce, readAt }: ShopCardProps) {
  const { variables, title } = revision.content
  const { processes } = variables
  const [tab, setTab] = useState(0)
  const [open, setOpen] = useState<'sketch' | 'passes' | null>(null)
  const block = processes[tab] ?? processes[0]
  const approved = revision.state === 'approved'
  const signed = [...revision.signatures].reverse().find(({ meaning }) => meaning === 'approved')
  const ended = [...revision.signatures].reverse().find(({ meaning }) => meaning === 'withdrawn')
  if (!block) return null
  return (
    <div className={approved ? '' : 'border-t-8 border-oxide'}>
      <header className="border-b border-rule px-5 pt-4 pb-4">
        <p className="font-narrow tracking-[0.055em] text-soft uppercase">{joint ?? title}</p>
        <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
          <h1 className="font-narrow text-3xl font-semibold">
            {revision.number} {revision.revision}
          </h1>
          <Stamp state={revision.state} />
        </div>
        {joint && <p className="mt-1 text-pretty text-soft">{title}</p>}
      </header>
      {revision.state !== 'approved' && (
        <Stop title="Do not weld to this">
          {WHY[revision.state]} {ended?.reason}{' '}
          {inForce && (
            <Link to={`/shop/${inForce.id}`} className="inline-flex min-h-12 items-center font-semibold underline underline-offset-4">
              Open revision {inForce.revision}, which is in force
            </Link>
          )}
        </Stop>
      )}
      {approved && fitsJoint === false && <Stop title="Not for this joint">What this procedure states does not cover the joint{joint ? ` ${joint}` : ''}. Look the joint up again, or ask the supervisor.</Stop>}
      {processes.length > 1 && (
        <div role="group" aria-label="Process" className="grid auto-cols-fr grid-flow-col border-b border-rule">
          {processes.map(({ id, process }, index) => (
            <button key={id} type="button" aria-pressed={index === tab} onClick={() => setTab(index)} className={`min-h-14 border-b-4 font-narrow text-xl font-semibold ${index === tab ? 'border-figure' : 'border-transparent text-soft'}`}>
              {process ?? `Process ${index + 1}`}
            </button>
          ))}
        </div>
      )}
      <dl className="grid grid-cols-2 gap-x-4 gap-y-3 border-b border-rule px-5 py-5">
        {cellsOf(variables, block, system).map(({ label, value }) => (
          <div key={label} className="min-w-0">
            <dt className="font-narrow text-base tracking-[0.055em] text-soft uppercase">{label}</dt>
            <dd className="text-lg break-words whitespace-pre-line">{value}</dd>
          </div>
        ))}
      </dl>
      <Settings key={block.id} revision={revision} block={block} system={system} approved={approved} />
      <div className="space-y-4 px-5 py-5">
        <div className="grid grid-cols-2 gap-3">
          <Key pressed={open === 'sketch'} onPress={() => setOpen(open === 'sketch' ? null : 'sketch')}>
            Joint sketch
          </Key>
          <Key pressed={open === 'passes'} onPress={() => setOpen(open === 'passes' ? null : 'passes')}>
            Passes
          </Key>
        </div>
        {open === 'sketch' && (
          <figure aria-label="Joint sketch" className="border border-rule py-2">
            <JointDrawing geometry={geometryOf(variables, system)} maxHeight={150} />
          </figure>
        )}
        {open === 'passes' && <ShopPasses block={block} system={system} />}
        <Caution hazards={HAZARD_LIST.filter((hazard) => hazard !== 'gas' || block.shieldingGas !== null)} />
        {approved && signed && (
          <p className="text-soft">
            Approved by {signed.person.name}
            {readAt ? `. Read from the server at ${readAt}.` : '.'}
          </p>
        )}
        <Responsibility />
      </div>
    </div>
  )
}

function Stop({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div role="alert" className="border-b-4 border-oxide bg-oxide-bg px-5 py-4">
      <p className="font-narrow text-3xl font-semibold text-oxide uppercase">{title}</p>
      <div className="mt-1 text-pretty">{children}</div>
    </div>
  )
}

function Key({ pressed, onPress, children }: { pressed: boolean; onPress: () => void; children: ReactNode }) {
  return (
    <button type="button" aria-expanded={pressed} onClick={onPress} className={`min-h-14 border-2 border-ink px-2 font-narrow text-xl font-semibold tracking-[0.05em] uppercase ${pressed ? 'bg-ink text-paper' : ''}`}>
      {children}
    </button>
  )
}

const isChoice = (value: unknown): value is string | null => value === null || typeof value === 'string'

/** The settings of the machine in front of the welder, which this device remembers; until one is chosen, what the procedure itself says. */
function Settings({ revision, block, system, approved }: { revision: Revision; block: ProcessBlock; system: UnitSystem; approved: boolean }) {
  const [machine, setMachine] = useRemembered<string | null>('shop.machine', null, isChoice)
  const [rest, setRest] = useState(NO_CHOICE)
  // A machine of another trade, remembered from the last procedure, is no choice for this one.
  const wanted: CardChoice = { ...rest, machine }
  const offered = usePanelCard(revision, block, NO_CHOICE).machines
  const choice = offered.some(({ id }) => id === machine) ? wanted : { ...rest, machine: null }
  const state = usePanelCard(revision, block, choice)
  const change = (next: CardChoice) => {
    setRest(next)
    if (next.machine !== choice.machine) setMachine(next.machine)
  }
  return (
    <>
      {offered.length > 0 && (
        <section aria-label="Machine" className="no-print border-b border-rule px-5 py-4">
          <CardChoices state={state} choice={choice} onChange={change} />
        </section>
      )}
      {choice.machine === null || !approved ? <Dials block={block} system={system} approved={approved} /> : <CardBody state={state} />}
    </>
  )
}

/** What to dial, figure by figure; with the window drawn where the panel's scale is known. */
function Dials({ block, system, approved }: { block: ProcessBlock; system: UnitSystem; approved: boolean }) {
  const { head, dials, caution } = dialsOf(block, system)
  return (
    <section aria-label={head} className="border-b border-rule px-5 pt-4">
      <h2 className="font-narrow text-lg font-medium tracking-[0.055em] text-soft uppercase">{head}</h2>
      {dials.length === 0 && <p className="pt-2 pb-5">The procedure states no settings for this process. Ask the engineer before you strike an arc.</p>}
      <ul>
        {dials.map((dial, index) => (
          <DialRow key={`${dial.label} ${index}`} dial={dial} approved={approved} />
        ))}
      </ul>
      {caution && <p className="mb-5 border-2 border-straw px-3.5 py-2.5 text-straw-deep">{caution}</p>}
    </section>
  )
}

function DialRow({ dial: { label, hint, figure, unit, window }, approved }: { dial: Dial; approved: boolean }) {
  return (
    <li className="border-b border-rule py-3 last:border-b-0">
      <div className="flex items-end justify-between gap-4">
        <p className="min-w-0 pb-1 text-lg break-words">
          {label}
          {hint && <span className="block text-base text-soft">{hint}</span>}
        </p>
        <p className="shrink-0 text-right">
          <span className={`font-narrow font-semibold tabular-nums ${figure.length > 8 ? 'text-3xl' : 'text-4xl'} ${approved ? 'text-figure' : 'text-soft line-through'}`}>{figure}</span> <span className="text-soft">{unit}</span>
        </p>
      </div>
      {window && (
        <div role="img" aria-label={`${label}: the window that may be dialled lies from ${Math.round(window.from * 100)} to ${Math.round(window.to * 100)} per cent of the scale`} className="relative mt-1.5 h-2.5 bg-hair">
          <span className="absolute inset-y-0 bg-figure" style={{ left: `${window.from * 100}%`, width: `${Math.max(1.5, (window.to - window.from) * 100)}%` }} />
        </div>
      )}
    </li>
  )
}
