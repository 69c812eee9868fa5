import { useQueryClient } from '@tanstack/react-query'
import { Upload } from 'lucide-react'
import { useRef, useState, type DragEvent } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { Button, ButtonLink } from '@/components/Button.tsx'
import { FormError } from '@/components/fields/Field.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Breadcrumb, EmptyState, ErrorState, PageHead, Progress } from '@/components/states.tsx'
import { sayProblem } from '@/components/toast.tsx'
import { useMay } from '@/hooks/session.ts'
import { call } from '@/lib/api.ts'
import { fileSize } from '@/lib/figures.ts'
import { recordingQuery } from '../api.ts'
import { ColumnChoice } from '../components/ColumnChoice.tsx'
import { useSending } from '../sending.ts'

/** Where a recording is uploaded, or why it can't be with these roles: said before a file is chosen. */
export function NewArcRecordingPage() {
  const records = useMay('arc.record')
  if (records) return <NewArcRecording />
  return (
    <>
      <PageHead title="Not for your roles" />
      <EmptyState title="You read the recordings; others upload them" step={<ButtonLink to="/arc-data">Back to the list</ButtonLink>}>
        <p>Hand the file to the welder, inspector or engineer of the weld.</p>
      </EmptyState>
    </>
  )
}

/** Choose a file, look at its columns, send it. `couponId`, `runRowId` or `beadId` in the address attach it at once. */
function NewArcRecording() {
  const navigate = useNavigate()
  const client = useQueryClient()
  const [search] = useSearchParams()
  const sending = useSending()
  const { file, preview, share, problem } = sending
  const [over, setOver] = useState(false)
  const pick = useRef<HTMLInputElement>(null)
  const guess = preview?.guess ?? null
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    const [first] = event.dataTransfer.files
    if (first) void sending.take(first)
  }
  const send = async () => {
    let recording = await sending.send()
    if (!recording) return
    const [couponId, runRowId, beadId] = ['couponId', 'runRowId', 'beadId'].map((name) => search.get(name))
    if (couponId || beadId) {
      try {
        recording = await call('attachArcRecording', { params: { id: recording.id }, ifMatch: recording.version, body: { couponId: couponId ?? null, runRowId: couponId ? (runRowId ?? null) : null, beadId: couponId ? null : (beadId ?? null) } })
      } catch (error) {
        // The recording is kept all the same; its page offers to attach it.
        sayProblem(error)
      }
    }
    client.setQueryData(recordingQuery(recording.id).queryKey, recording)
    void client.invalidateQueries({ queryKey: ['listArcRecordings'] })
    void navigate(`/arc-data/${recording.id}`, { replace: true })
  }
  return (
    <>
      <Breadcrumb trail={[{ label: 'Arc data', to: '/arc-data' }, { label: 'Upload' }]} />
      <PageHead title="Upload a recording">Volts and amperes as text, one sample a row: CSV or any usual export of a logger or power source.</PageHead>
      <div className="space-y-4">
        <div
          onDragOver={(event) => {
            event.preventDefault()
            setOver(true)
          }}
          onDragLeave={() => setOver(false)}
          onDrop={drop}
          className={`flex flex-wrap items-center gap-x-3 gap-y-2 border border-dashed bg-sheet px-4 py-6 max-sm:[&_button]:min-h-12 max-sm:[&_button]:grow ${over ? 'border-ink bg-straw-bg' : 'border-edge'}`}
        >
          <Button kind={file ? 'secondary' : 'primary'} icon={<Upload size={16} aria-hidden="true" />} disabled={share !== null} onClick={() => pick.current?.click()}>
            {file ? 'Choose another file' : 'Choose a file'}
          </Button>
          <p className="min-w-0 break-words text-soft">{over ? 'Let go to take it.' : file ? <><span className="font-medium text-ink">{file.name}</span>, {fileSize(file.size)}</> : 'or drop it here. The file is kept untouched.'}</p>
          <input
            ref={pick}
            type="file"
            accept=".csv,.txt,.tsv,.dat,.asc,.log,text/plain,text/csv"
            className="hidden"
            aria-label="Choose a recording"
            onChange={(event) => {
              const [first] = event.target.files ?? []
              event.target.value = ''
              if (first) void sending.take(first)
            }}
          />
        </div>
        {preview?.refusal && (
          <p role="alert" className="border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">{preview.refusal}</p>
        )}
        {guess && (
          <Sheet title="Columns" aside={guess.sure && !guess.needsRate ? 'found' : 'please check'}>
            <div className="space-y-4 px-4 py-4">
              {guess.doubts.length > 0 && (
                <div className="border-l-[3px] border-l-straw bg-straw-bg px-3 py-2" role="status">
                  {guess.doubts.map((doubt) => (
                    <p key={doubt}>{doubt}</p>
                  ))}
                </div>
              )}
              <ColumnChoice guess={guess} choice={sending.choice} onChoose={sending.choose} />
            </div>
          </Sheet>
        )}
        {/* What is wrong with the file is one sentence; what is wrong with the server has a request to name. */}
        {problem && (problem.status >= 400 && problem.status < 500 ? <FormError message={problem.message} /> : <ErrorState compact error={problem} />)}
        {guess &&
          (share === null ? (
            <div className="flex flex-wrap gap-2">
              <Button kind="primary" disabled={guess.needsRate} onClick={() => void send()}>
                Upload and read
              </Button>
              {guess.needsRate && <p className="self-center text-soft">Give the sample rate first.</p>}
            </div>
          ) : (
            <Progress label={share < 1 ? `Sending ${file?.name ?? ''}` : 'Sent; the last rows are being read'} {...(share < 1 ? { value: share } : {})} onCancel={sending.cancel} />
          ))}
        {!file && (
          <div className="max-w-prose text-soft">
            <p>Any order of columns, comma, semicolon, tab, bar or space between them, decimal point or comma. Without a time column you are asked for the sample rate. Millions of rows are no matter.</p>
          </div>
        )}
      </div>
    </>
  )
}
