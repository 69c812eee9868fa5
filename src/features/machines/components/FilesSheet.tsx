import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { FileText, Upload, X } from 'lucide-react'
import { useRef, useState } from 'react'
import { Button } from '@/components/Button.tsx'
import { ErrorState, Progress } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { call, hrefOf, upload } from '@/lib/api.ts'
import { fileSize, moment } from '@/lib/figures.ts'
import { query } from '@/lib/query.ts'

const ACCEPT = 'image/jpeg,image/png,image/heic,image/heif,.heic,.heif,application/pdf'

/** Certificates and pictures of a machine, under its calibration. */
export function FilesSheet({ machineId, manages }: { machineId: string; manages: boolean }) {
  const client = useQueryClient()
  const options = query('listMachineFiles', { params: { id: machineId } })
  const files = useQuery(options)
  const [share, setShare] = useState<number | null>(null)
  const stop = useRef<AbortController | null>(null)
  const pick = useRef<HTMLInputElement>(null)
  const again = () => client.invalidateQueries({ queryKey: options.queryKey })
  const send = useMutation({
    mutationFn: (chosen: readonly File[]) => {
      stop.current = new AbortController()
      setShare(0)
      return upload('addMachineFiles', { params: { id: machineId }, files: chosen, signal: stop.current.signal, onProgress: setShare })
    },
    onError: (error) => !(error instanceof DOMException) && sayProblem(error),
    onSettled: async () => {
      setShare(null)
      await again()
    },
  })
  const remove = useMutation({ mutationFn: (id: string) => call('removeMachineFile', { params: { id } }), onError: sayProblem, onSettled: again })
  const items = files.data?.items ?? []
  return (
    <div className="border-t border-hair px-4 py-3">
      <h3 className="font-medium">Certificates and pictures</h3>
      {files.isError && <ErrorState compact error={files.error} onRetry={() => void files.refetch()} />}
      {files.data && items.length === 0 && <p className="mt-1 text-soft">{manages ? 'Keep the certificate here: whoever doubts a figure finds what it rests on.' : 'No certificate is kept here.'}</p>}
      {items.length > 0 && (
        <ul className="mt-1.5">
          {items.map(({ id, fileName, bytes, sha256, uploadedAt, uploadedBy }) => (
            <li key={id} className="flex items-start justify-between gap-3 border-b border-hair py-2 last:border-b-0">
              <p className="min-w-0 break-words">
                <a href={hrefOf('readMachineFile', { id })} className="text-link inline-flex items-center gap-1.5">
                  <FileText size={15} aria-hidden="true" className="shrink-0" />
                  {fileName}
                </a>
                <span className="block text-sm text-soft" title={`SHA-256 ${sha256}`}>
                  {fileSize(bytes)} · {uploadedBy.name}, {moment(uploadedAt)} · SHA-256 {sha256.slice(0, 12)}…
                </span>
              </p>
              {manages && (
                <button type="button" aria-label={`Remove ${fileName}`} className="flex size-9 shrink-0 items-center justify-center rounded text-soft hover:text-ink" onClick={() => remove.mutate(id, { onSuccess: () => say(`${fileName} was removed`) })}>
                  <X size={16} aria-hidden="true" />
                </button>
              )}
            </li>
          ))}
        </ul>
      )}
      {manages && (
        <div className="no-print mt-2 flex flex-wrap items-center gap-x-3 gap-y-2">
          <Button icon={<Upload size={16} aria-hidden="true" />} onClick={() => pick.current?.click()} disabled={share !== null}>
            Add a file
          </Button>
          {share === null ? <p className="text-soft">PDF, JPEG, PNG or HEIC, up to 25 MB each.</p> : <div className="grow"><Progress label="Sending" {...(share < 1 && { value: share })} onCancel={() => stop.current?.abort()} /></div>}
          <input
            ref={pick}
            type="file"
            multiple
            accept={ACCEPT}
            className="hidden"
            aria-label="Choose certificates or pictures"
            onChange={(event) => {
              const chosen = [...(event.target.files ?? [])]
              event.target.value = ''
              if (chosen.length > 0) send.mutate(chosen)
            }}
          />
        </div>
      )}
    </div>
  )
}
