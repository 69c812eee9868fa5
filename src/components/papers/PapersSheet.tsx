import { useMutation } from '@tanstack/react-query'
import { FileText, Upload, X } from 'lucide-react'
import { useRef, useState } from 'react'
import type { z } from 'zod'
import type { certificateFileSchema } from '@shared/schemas/heats.ts'
import { Button } from '@/components/Button.tsx'
import { Dialog } from '@/components/Dialog.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { Progress } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { fileSize, moment } from '@/lib/figures.ts'

export type Paper = z.output<typeof certificateFileSchema>
const ACCEPT = 'image/jpeg,image/png,image/heic,image/heif,.heic,.heif,application/pdf'

export interface PapersProps {
  /** What to say while there is none. */
  none: string
  papers: readonly Paper[]
  hrefOf: (id: string) => string
  manages: boolean
  send: (files: readonly File[], progress: { signal: AbortSignal; onProgress: (share: number) => void }) => Promise<unknown>
  remove: (id: string) => Promise<unknown>
  /** After something was sent or removed. */
  onChanged: () => Promise<unknown> | void
}

/** Certificates and pictures that belong to a record: listed with their hash, added with progress, removed after a question. */
export function Papers({ none, papers, hrefOf, manages, send, remove, onChanged }: PapersProps) {
  const [share, setShare] = useState<number | null>(null)
  const [asked, setAsked] = useState<Paper | null>(null)
  const stop = useRef<AbortController | null>(null)
  const pick = useRef<HTMLInputElement>(null)
  const sending = useMutation({
    mutationFn: (chosen: readonly File[]) => {
      stop.current = new AbortController()
      setShare(0)
      return send(chosen, { signal: stop.current.signal, onProgress: setShare })
    },
    onError: (error) => !(error instanceof DOMException) && sayProblem(error),
    onSettled: async () => {
      setShare(null)
      await onChanged()
    },
  })
  const removing = useMutation({
    mutationFn: (paper: Paper) => remove(paper.id),
    onSuccess: (_nothing, { fileName }) => {
      say(`${fileName} was removed`)
      setAsked(null)
    },
    onError: sayProblem,
    onSettled: () => onChanged(),
  })
  return (
    <>
      <div className="px-4 py-3">
        {papers.length === 0 && <p className="text-soft">{none}</p>}
        <ul>
          {papers.map((paper) => (
            <li key={paper.id} className="flex items-start justify-between gap-3 border-b border-hair py-2 last:border-b-0">
              <p className="min-w-0 break-words">
                <a href={hrefOf(paper.id)} className="text-link inline-flex items-center gap-1.5">
                  <FileText size={15} aria-hidden="true" className="shrink-0" />
                  {paper.fileName}
                </a>
                <span className="block text-sm text-soft" title={`SHA-256 ${paper.sha256}`}>
                  {fileSize(paper.bytes)} · {paper.uploadedBy.name}, {moment(paper.uploadedAt)} · SHA-256 {paper.sha256.slice(0, 12)}…
                </span>
              </p>
              {manages && (
                <button type="button" aria-label={`Remove ${paper.fileName}`} className="no-print flex size-9 shrink-0 items-center justify-center rounded text-soft hover:text-ink" onClick={() => setAsked(paper)}>
                  <X size={16} aria-hidden="true" />
                </button>
              )}
            </li>
          ))}
        </ul>
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
                if (chosen.length > 0) sending.mutate(chosen)
              }}
            />
          </div>
        )}
      </div>
      {asked && (
        <Dialog
          title="Remove this file?"
          isOpen
          onClose={() => setAsked(null)}
          footer={
            <>
              <Button onClick={() => setAsked(null)}>Keep it</Button>
              <Button kind="danger" pending={removing.isPending} onClick={() => removing.mutate(asked)}>
                Remove
              </Button>
            </>
          }
        >
          <p>{asked.fileName} goes for good; nothing else is changed.</p>
        </Dialog>
      )}
    </>
  )
}

/** The same as a sheet of its own. */
export function PapersSheet({ title, ...papers }: PapersProps & { title: string }) {
  return (
    <Sheet id="papers" title={title}>
      <Papers {...papers} />
    </Sheet>
  )
}
