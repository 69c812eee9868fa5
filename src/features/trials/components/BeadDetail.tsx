import { useState } from 'react'
import type { MachineMode } from '@shared/schemas/machines.ts'
import type { Bead, Trial } from '@shared/schemas/trials.ts'
import { MEASURE, MEASURES, travelSpread } from '@shared/trials/bead-values.ts'
import { measuredFromRecording } from '@shared/trials/from-recording.ts'
import { faultsInWords, SCORE_WORDS } from '@shared/trials/faults.ts'
import { formatNumber } from '@shared/units/format.ts'
import { SHOWN_UNIT } from '@shared/units/convert.ts'
import { ArcRecordings } from '@/components/arc/ArcRecordings.tsx'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { useUnits } from '@/hooks/units.ts'
import { hrefOf } from '@/lib/api.ts'
import { same } from '@/lib/draft/paths.ts'
import { moment } from '@/lib/figures.ts'
import { asProblem } from '@/lib/problem.ts'
import { useMachineMode, useRecordings, useTrialActs } from '../api.ts'
import { measuredText, settingText, setUpInWords } from '../words.ts'

/** One bead whole: settings, figures, faults, note, photos, recordings of its arc. */
export function BeadDetail({ trial, bead, onPromote, onGone }: { trial: Trial; bead: Bead; onPromote: () => void; onGone: () => void }) {
  const { system } = useUnits()
  const { machine, mode } = useMachineMode(bead.content.machineId, bead.content.modeKey)
  const acts = useTrialActs(trial)
  const [removing, setRemoving] = useState(false)
  const records = trial.may.includes('record')
  const { content } = bead
  const worked = content.measured.travelSpeed === null ? travelSpread(content) : null
  const speed = SHOWN_UNIT[system].travelSpeed
  return (
    <div className="space-y-4" id="bead">
      <Sheet title={`Bead ${bead.number}`} aside={`${bead.by.name}, ${moment(bead.weldedAt)}`}>
        <div className="grid gap-x-8 gap-y-4 px-4 py-3 md:grid-cols-2">
          <div>
            <p className="text-pretty">{setUpInWords(content, machine, mode, system).join(' · ') || <span className="text-soft">No set-up stated.</span>}</p>
            <Settings bead={bead} mode={mode} />
          </div>
          <div className="space-y-2">
            <p className="text-lg font-semibold">{content.score === null ? 'Not scored' : `Score ${content.score}: ${SCORE_WORDS[content.score] ?? ''}`}</p>
            {content.faults.length > 0 && <p>{faultsInWords(content.faults)}</p>}
            {content.note && <p className="text-pretty whitespace-pre-line">{content.note}</p>}
            <dl className="space-y-0.5">
              {MEASURES.flatMap((measure) => {
                const text = measuredText(content.measured[measure], measure, system)
                return text === null ? [] : [<div key={measure} className="flex justify-between gap-4 border-b border-hair py-0.5"><dt className="text-soft">{MEASURE[measure].label}, measured</dt><dd>{text}</dd></div>]
              })}
              {worked && <div className="flex justify-between gap-4 border-b border-hair py-0.5"><dt className="text-soft">Travel, from length and time</dt><dd>{formatNumber(worked.lo, 'travelSpeed', speed)} {speed}</dd></div>}
            </dl>
          </div>
        </div>
        {bead.photos.length > 0 && (
          <ul className="grid grid-cols-2 gap-3 border-t border-hair px-4 py-3 sm:grid-cols-4">
            {bead.photos.map((photo) => (
              <li key={photo.id}>
                <a href={hrefOf('readBeadPhoto', { id: photo.id })} target="_blank" rel="noreferrer" className="block"><img src={hrefOf('readBeadThumbnail', { id: photo.id })} alt={`Bead ${bead.number}: ${photo.fileName}`} loading="lazy" className="aspect-4/3 w-full border border-rule object-cover" /></a>
                {records && <Button kind="quiet" aria-label={`Remove ${photo.fileName}`} onClick={() => acts.removePhoto.mutate(photo.id, { onSuccess: () => say(`${photo.fileName} was removed`), onError: sayProblem })}>Remove</Button>}
              </li>
            ))}
          </ul>
        )}
        {(records || trial.may.includes('promote')) && (
          <div className="no-print flex flex-wrap gap-x-4 gap-y-2 border-t border-hair px-4 py-3">
            {records && <ButtonLink to={`/dial-in/${trial.id}/bead?copy=${bead.id}`} className="max-sm:min-h-12">Copy this bead</ButtonLink>}
            {records && <ButtonLink to={`/dial-in/${trial.id}/bead?edit=${bead.id}`} className="max-sm:min-h-12">Correct it</ButtonLink>}
            {trial.may.includes('promote') && <Button className="max-sm:min-h-12" onClick={onPromote}>Make it a procedure</Button>}
            {records && <Button kind="quiet" className="max-sm:min-h-12" onClick={() => setRemoving(true)}>Remove it</Button>}
          </div>
        )}
      </Sheet>
      <ArcRecordings of={{ beadId: bead.id }} />
      {records && <TakeFigures trial={trial} bead={bead} />}
      <Dialog
        title={`Remove bead ${bead.number}`} isOpen={removing} onClose={() => setRemoving(false)}
        footer={<><Button onClick={() => setRemoving(false)}>Keep it</Button><Button kind="danger" pending={acts.removeBead.isPending} onClick={() => acts.removeBead.mutate({ id: bead.id, version: bead.version }, { onSuccess: () => { say(`Bead ${bead.number} was removed`); onGone() } })}>Remove bead {bead.number}</Button></>}
      >
        <FormError message={acts.removeBead.isError ? asProblem(acts.removeBead.error).message : undefined} />
        <p>Bead {bead.number} and its photos are removed for good. Recordings of its arc stay, attached to nothing. A bad bead is worth keeping: it is what ends a range.</p>
      </Dialog>
    </div>
  )
}

/** Offers the figures of the latest recording as the bead's measured ones, where they differ. */
function TakeFigures({ trial, bead }: { trial: Trial; bead: Bead }) {
  const { saveBead } = useTrialActs(trial)
  const [recording] = useRecordings(bead.id)
  if (!recording) return null
  const measured = measuredFromRecording(bead.content.measured, recording.figures)
  if (same(measured, bead.content.measured)) return null
  const { pulse, current, voltage } = recording.figures
  const said = `${pulse ? `peak ${Math.round(pulse.peakCurrent)} A, background ${Math.round(pulse.backgroundCurrent)} A, ` : ''}mean ${Math.round(current.mean)} A and ${voltage.mean.toFixed(1)} V`
  return (
    <div className="no-print flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border border-plum bg-plum-bg px-4 py-3">
      <p className="text-pretty">{recording.fileName} says {said}. Taken over as measured, they let current and drop be compared from bead to bead.</p>
      <Button className="max-sm:min-h-12" pending={saveBead.isPending} onClick={() => saveBead.mutate({ id: bead.id, version: bead.version, content: { ...bead.content, measured } }, { onSuccess: () => say(`Bead ${bead.number} has the recording’s figures`), onError: sayProblem })}>Take them over</Button>
    </div>
  )
}

function Settings({ bead, mode }: { bead: Bead; mode: MachineMode | null }) {
  if (bead.content.settings.length === 0) return <p className="mt-2 text-soft">No setting was noted.</p>
  return (
    <dl className="mt-2">
      {bead.content.settings.map(({ control, label, value, unit }) => (
        <div key={control} className="flex justify-between gap-4 border-b border-hair py-1 last:border-b-0"><dt>{label}</dt><dd className="font-semibold">{settingText(value, mode?.controls.find(({ key }) => key === control))} <span className="font-normal text-soft">{unit}</span></dd></div>
      ))}
    </dl>
  )
}
