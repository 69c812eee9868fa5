import { useQuery } from '@tanstack/react-query'
import { Download } from 'lucide-react'
import { useState } from 'react'
import { Link, useNavigate, useParams } from 'react-router-dom'
import type { ArcRecording } from '@shared/schemas/arc-data.ts'
import { Button, buttonClass } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, RecordError, Skeleton } from '@/components/states.tsx'
import { TitleBlock } from '@/components/TitleBlock.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { hrefOf } from '@/lib/api.ts'
import { figure, fileSize, moment } from '@/lib/figures.ts'
import { recordingQuery, useRecordingActs } from '../api.ts'
import { ArcPlotView } from '../components/ArcPlotView.tsx'
import { AttachDialog } from '../components/AttachDialog.tsx'
import { ArcTimeSheet, FileSheet, MetersSheet, PowerSheet, PulseSheet, ReadingsSheet } from '../components/FigureSheets.tsx'

/** One recording: what it shows, and what it hangs on. */
export function ArcRecordingPage() {
  const { id = '' } = useParams()
  const { data: recording, error, refetch } = useQuery(recordingQuery(id))
  const trail = [{ label: 'Arc data', to: '/arc-data' }, { label: recording?.fileName ?? 'Recording' }]
  if (error && !recording)
    return (
      <>
        <Breadcrumb trail={trail} />
        <RecordError title="The recording can’t be shown" error={error} onRetry={() => void refetch()} />
      </>
    )
  if (!recording) return <Skeleton label="Reading the recording" rows={8} />
  const { figures, attachment, attachedTo } = recording
  return (
    <>
      <Breadcrumb trail={trail} />
      <TitleBlock
        kind="Arc recording"
        number={recording.fileName}
        cells={[
          { label: 'Attached to', children: attachedTo === null ? 'nothing yet' : attachment.couponId ? <Link className="text-link" to={`/coupons/${attachment.couponId}`}>{attachedTo}</Link> : attachedTo },
          { label: 'Recorded', children: `${figure(figures.duration, 2)} s, ${figure(figures.rows, 0)} samples` },
          { label: 'Sample rate', children: figures.samplesPerSecond === null ? 'not told' : `${figure(Math.round(figures.samplesPerSecond))} a second` },
          { label: 'Uploaded', children: `${recording.by.name}, ${moment(recording.uploadedAt)}` },
        ]}
      />
      <Acts recording={recording} />
      <div className="mt-4 space-y-4">
        <Sheet title="Volts and amperes">
          <ArcPlotView key={recording.id} recording={recording} />
        </Sheet>
        <PowerSheet recording={recording} />
        <MetersSheet figures={figures} />
        <PulseSheet figures={figures} />
        <ReadingsSheet figures={figures} />
        <ArcTimeSheet figures={figures} />
        <FileSheet recording={recording} />
      </div>
    </>
  )
}

function Acts({ recording }: { recording: ArcRecording }) {
  const navigate = useNavigate()
  const acts = useRecordingActs(recording)
  const [open, setOpen] = useState<'attach' | 'remove' | 'energy' | null>(null)
  const close = () => setOpen(null)
  const may = (act: string) => recording.may.includes(act)
  const energy = `${figure(recording.figures.energy / 1000, 2)} kJ`
  return (
    <div className="no-print mt-3 flex flex-wrap items-center gap-2">
      {may('attach') && (
        <Button kind={recording.attachedTo === null ? 'primary' : 'secondary'} onClick={() => setOpen('attach')}>
          {recording.attachedTo === null ? 'Attach to a pass or bead' : 'Attach elsewhere'}
        </Button>
      )}
      {may('write-energy') && (
        <Button kind="primary" onClick={() => setOpen('energy')}>
          Write the energy into the pass
        </Button>
      )}
      <a className={buttonClass('secondary')} href={hrefOf('readArcFile', { id: recording.id })} download={recording.fileName}>
        <Download size={16} aria-hidden="true" />
        The file, {fileSize(recording.bytes)}
      </a>
      {may('remove') && (
        <Button kind="quiet" onClick={() => setOpen('remove')}>
          Remove
        </Button>
      )}
      {open === 'attach' && <AttachDialog recording={recording} onClose={close} />}
      <Dialog
        title="Write the energy into the pass"
        isOpen={open === 'energy'}
        onClose={close}
        footer={
          <>
            <Button onClick={close}>Not now</Button>
            <Button kind="primary" pending={acts.writeEnergy.isPending} onClick={() => acts.writeEnergy.mutate(undefined, { onSuccess: ({ number }) => (say(`${energy} written into ${number}`), close()), onError: sayProblem })}>
              Write it
            </Button>
          </>
        }
      >
        <p>
          {energy} become the instantaneous energy of {recording.attachedTo}{recording.attachment.weldLength === null ? '' : `, and ${figure(recording.attachment.weldLength)} mm its length where none is recorded`}. The heat input of that pass is then worked out from the energy. It can be changed on the run sheet until the coupon is certified.
        </p>
      </Dialog>
      <Dialog
        title="Remove the recording"
        isOpen={open === 'remove'}
        onClose={close}
        footer={
          <>
            <Button onClick={close}>Keep it</Button>
            <Button kind="danger" pending={acts.remove.isPending} onClick={() => acts.remove.mutate(undefined, { onSuccess: () => (say(`${recording.fileName} was removed`), void navigate('/arc-data')), onError: sayProblem })}>
              Remove it
            </Button>
          </>
        }
      >
        <p>{recording.fileName} and all that was worked out from it go for good. An energy that was written into a pass stays there.</p>
      </Dialog>
    </div>
  )
}
