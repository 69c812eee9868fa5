import { Camera, X } from 'lucide-react'
import { useState, type FormEvent, type ReactNode } from 'react'
import type { Bead, BeadContent } from '@shared/schemas/trials.ts'
import { checkBead } from '@shared/trials/check-bead.ts'
import { changedSettings, circumstancesOf, compareBeads } from '@shared/trials/compare-beads.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import { Button } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { TextArea } from '@/components/fields/text.tsx'
import { useMachineMode } from '../api.ts'
import { AdviceList, FigureTable } from '../components/Compared.tsx'
import { setUpInWords, settingOf } from '../words.ts'
import { Measured } from './Measured.tsx'
import { SetUp } from './SetUp.tsx'
import { Stepper } from './Stepper.tsx'
import { FaultChips, ScoreKeys } from './Verdict.tsx'

export interface BeadFormProps {
  content: BeadContent
  onChange: (content: BeadContent) => void
  /** The bead that it is compared with: the one before, or the one as stored. */
  before: Pick<Bead, 'number' | 'content'> | null
  system: UnitSystem
  pictures: readonly File[]
  onPictures: (files: readonly File[]) => void
  onSave: (content: BeadContent) => void
  pending?: boolean
  refusal?: string | undefined
  saveLabel: string
  /** Above the buttons: what becomes of it without a network. */
  foot?: ReactNode
}

const Part = ({ title, aside, children }: { title: string; aside?: ReactNode; children: ReactNode }) => (
  <section aria-label={title} className="border-t border-rule px-4 py-4">
    <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-3">
      <h2 className="sheet-head">{title}</h2>
      {aside && <p className="text-sm text-soft">{aside}</p>}
    </div>
    {children}
  </section>
)

/** The form between two beads: settings by steps, faults by taps, one note, one photo; everything else as on the bead before. */
export function BeadForm({ content, onChange, before, system, pictures, onPictures, onSave, pending = false, refusal, saveLabel, foot }: BeadFormProps) {
  const { machine, mode } = useMachineMode(content.machineId, content.modeKey)
  const [unread, setUnread] = useState<Readonly<Record<string, string>>>({})
  const [tried, setTried] = useState(false)
  const complaints = checkBead(content)
  const errors = { ...(tried ? Object.fromEntries(complaints.map(({ field, message }) => [field, message])) : {}), ...unread }
  const blocking = [...complaints.map(({ message }) => message), ...Object.values(unread)]
  const noteUnread = (field: string, message: string | null) =>
    setUnread((known) => {
      if ((known[field] ?? null) === message) return known
      const rest = Object.fromEntries(Object.entries(known).filter(([key]) => key !== field))
      return message === null ? rest : { ...rest, [field]: message }
    })

  const controls = mode?.controls ?? []
  const rows = controls.length > 0 ? controls.map((control) => ({ control: control.key, label: control.label, unit: control.unit, sets: control.sets, known: control })) : content.settings.map(({ control, label, unit, sets }) => ({ control, label, unit, sets, known: null }))
  const setSetting = (row: (typeof rows)[number], value: number | null) => {
    noteUnread(`settings.${row.control}`, null)
    const rest = content.settings.filter(({ control }) => control !== row.control)
    const order = rows.map(({ control }) => control)
    const next = value === null ? rest : [...rest, { control: row.control, label: row.label, sets: row.sets, unit: row.unit, value }]
    onChange({ ...content, settings: next.sort((one, other) => order.indexOf(one.control) - order.indexOf(other.control)) })
  }
  const changes = before ? changedSettings(before.content.settings, content.settings).length : 0
  const compared = before ? compareBeads(before.content, content, mode) : null
  const pulsed = content.settings.some(({ sets }) => sets === 'pulseFrequency') || controls.some(({ sets }) => sets === 'pulseFrequency')
  const words = setUpInWords(content, machine, mode, system)
  const moved = before ? circumstancesOf(content).filter(({ text }, index) => text !== circumstancesOf(before.content)[index]?.text) : []

  const submit = (event: FormEvent) => {
    event.preventDefault()
    setTried(true)
    if (pending || blocking.length > 0) return
    onSave(content)
  }
  const setUp = <SetUp content={content} onChange={onChange} machine={machine} system={system} errors={errors} onUnread={noteUnread} />
  return (
    <form noValidate onSubmit={submit}>
      {before === null && words.length < 3 ? (
        <Part title="Set-up" aside="stays for the next beads">{setUp}</Part>
      ) : (
        <details className="border-t border-rule px-4 py-3" open={before === null || ['machineId', 'gas', 'wireDiameter', 'thickness', 'stickOut'].some((field) => errors[field]) || undefined}>
          <summary className="min-h-12 cursor-pointer py-1">
            <span className="sheet-head">Set-up</span>
            <span className="block text-pretty text-soft">{words.join(' · ')}</span>
            {moved.length > 0 && <span className="block text-sm font-medium text-straw-deep">Changed: {moved.map(({ label }) => label.toLowerCase()).join(', ')}</span>}
          </summary>
          <div className="pt-3 pb-2">{setUp}</div>
        </details>
      )}
      <Part title="On the panel" aside={before ? (changes === 0 ? `as on bead ${before.number}` : changes === 1 ? 'one thing changed' : `${changes} things changed`) : undefined}>
        {rows.length === 0 && <p className="text-soft">{content.machineId === null ? 'Choose the machine and its mode in the set-up; its knobs appear here.' : content.modeKey === null ? 'Choose the mode in the set-up; its knobs appear here.' : machine === undefined ? 'Reading the panel.' : 'The register lists no controls for this mode. An engineer adds them on the machine’s page.'}</p>}
        <div className="-ml-4 space-y-1">
          {rows.map((row) => (
            <Stepper key={row.control} label={row.label} unit={row.unit} control={row.known} value={settingOf(content, row.control)?.value ?? null} before={before ? (settingOf(before.content, row.control)?.value ?? null) : null} onChange={(value) => setSetting(row, value)} onUnread={(message) => noteUnread(`settings.${row.control}`, message)} />
          ))}
        </div>
        {changes > 1 && <p className="mt-2 text-sm text-straw-deep">With more than one thing changed, the bead can’t tell which of them did it, unless the others were only brought along.</p>}
        {compared && changes > 0 && (
          <div className="mt-3 space-y-3" aria-live="polite">
            <AdviceList advice={compared.advice} onDial={(control, value) => { const row = rows.find((one) => one.control === control); if (row) setSetting(row, value) }} />
            {compared.problems.map((problem) => <p key={problem} className="font-medium text-oxide">{problem}</p>)}
            {pulsed && <FigureTable comparison={compared} labels={[`bead ${before?.number ?? ''}`, 'now']} brief />}
          </div>
        )}
      </Part>
      <Part title="How it came out">
        <div className="space-y-5">
          <ScoreKeys value={content.score} onChange={(score) => onChange({ ...content, score })} />
          <FaultChips value={content.faults} onChange={(faults) => onChange({ ...content, faults })} pulsed={pulsed} />
          <TextArea label="Note" description="Say it or type it: the sound, the profile, what you would turn next." rows={3} maxLength={2000} autoCapitalize="sentences" value={content.note ?? ''} onChange={(event) => onChange({ ...content, note: event.target.value === '' ? null : event.target.value })} />
          <div>
            <label className="inline-flex min-h-12 w-full cursor-pointer items-center justify-center gap-2 rounded border border-ink bg-sheet px-4 font-semibold focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-steel">
              <Camera size={20} aria-hidden="true" />
              Take a photo
              <input type="file" accept="image/*" capture="environment" multiple className="sr-only" onChange={(event) => { onPictures([...pictures, ...(event.target.files ?? [])]); event.target.value = '' }} />
            </label>
            {pictures.length > 0 && (
              <ul className="mt-2 space-y-1" aria-label="Photos to send">
                {pictures.map((file, index) => (
                  <li key={`${file.name} ${index}`} className="flex items-center justify-between gap-3">
                    <span className="min-w-0 truncate text-soft">{file.name}</span>
                    <button type="button" aria-label={`Leave out ${file.name}`} className="flex size-12 shrink-0 items-center justify-center text-soft" onClick={() => onPictures(pictures.filter((_, at) => at !== index))}><X size={18} aria-hidden="true" /></button>
                  </li>
                ))}
              </ul>
            )}
          </div>
        </div>
      </Part>
      <details className="border-t border-rule px-4 py-3" open={Object.keys(errors).some((field) => field.startsWith('measured')) || undefined}>
        <summary className="flex min-h-12 cursor-pointer items-center gap-3"><span className="sheet-head">Measured</span><span className="text-sm text-soft">volts, amps, feed, travel</span></summary>
        <div className="pt-2 pb-2"><Measured value={content.measured} onChange={(measured) => onChange({ ...content, measured })} system={system} errors={errors} onUnread={noteUnread} pulsed={pulsed} /></div>
      </details>
      <div className="sticky bottom-0 space-y-2 border-t border-ink bg-sheet px-4 py-3">
        <FormError message={refusal ?? (tried && blocking.length > 0 ? blocking.join(' ') : undefined)} />
        {foot}
        <Button kind="primary" type="submit" pending={pending} className="min-h-14 w-full text-lg!">{saveLabel}</Button>
      </div>
    </form>
  )
}
