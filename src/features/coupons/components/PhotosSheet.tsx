import { useQuery } from '@tanstack/react-query'
import { Camera, FileText, Upload, X } from 'lucide-react'
import { useRef, useState, type DragEvent } from 'react'
import type { Coupon, Photo } from '@shared/schemas/records.ts'
import { Button } from '@/components/Button.tsx'
import { Sheet } from '@/components/Sheet.tsx'
import { ErrorState, Progress } from '@/components/states.tsx'
import { say, sayProblem } from '@/components/toast.tsx'
import { hrefOf } from '@/lib/api.ts'
import { fileSize, moment } from '@/lib/figures.ts'
import { photosQuery, usePhotoActs } from '../api.ts'
import { useUploads, type Sending } from '../uploads.ts'
import { PhotoViewer } from './PhotoViewer.tsx'

const ACCEPT = 'image/jpeg,image/png,image/heic,image/heif,.heic,.heif,application/pdf'

/** Photos and papers of the coupon: dropped, picked or taken; each with its caption, tag and fingerprint. */
export function PhotosSheet({ coupon }: { coupon: Coupon }) {
  const photos = useQuery(photosQuery(coupon.id))
  const acts = usePhotoActs(coupon.id)
  const may = coupon.may.includes('photograph')
  const { files, send, cancel, dismiss } = useUploads(coupon.id, acts.added)
  const [over, setOver] = useState(false)
  const [seen, setSeen] = useState<number | null>(null)
  const pick = useRef<HTMLInputElement>(null)
  const shoot = useRef<HTMLInputElement>(null)
  const items = photos.data?.items ?? []
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    send([...event.dataTransfer.files])
  }
  const take = (input: HTMLInputElement) => {
    send([...(input.files ?? [])])
    input.value = ''
  }
  const remove = (photo: Photo) => acts.remove.mutate(photo.id, { onSuccess: () => say(`${photo.fileName} was removed`), onError: sayProblem })
  return (
    <Sheet id="photos" title="Photos and papers" aside={items.length === 0 ? 'none yet' : `${items.length} kept`}>
      {may && (
        <div
          onDragOver={(event) => {
            event.preventDefault()
            setOver(true)
          }}
          onDragLeave={() => setOver(false)}
          onDrop={drop}
          className={`no-print border-b border-hair px-4 py-4 ${over ? 'bg-straw-bg' : ''}`}
        >
          <div className={`flex flex-wrap items-center gap-x-3 gap-y-2 border border-dashed px-4 py-4 max-sm:[&_button]:min-h-12 max-sm:[&_button]:grow ${over ? 'border-ink' : 'border-edge'}`}>
            <Button icon={<Upload size={16} aria-hidden="true" />} onClick={() => pick.current?.click()}>
              Choose files
            </Button>
            <Button icon={<Camera size={16} aria-hidden="true" />} onClick={() => shoot.current?.click()}>
              Take a photo
            </Button>
            <p className="text-soft">{over ? 'Let go to add them.' : 'or drop them here. JPEG, PNG, HEIC or PDF, up to 25 MB each; the original is kept untouched.'}</p>
            <input ref={pick} type="file" multiple accept={ACCEPT} className="hidden" aria-label="Choose photos or papers" onChange={(event) => take(event.target)} />
            <input ref={shoot} type="file" accept="image/*" capture="environment" className="hidden" aria-label="Take a photo" onChange={(event) => take(event.target)} />
          </div>
          {files.length > 0 && (
            <ul className="mt-3 space-y-2" aria-label="Files on their way">
              {files.map((file) => (
                <SendingRow key={file.id} file={file} onCancel={() => cancel(file.id)} onDismiss={() => dismiss(file.id)} />
              ))}
            </ul>
          )}
        </div>
      )}
      {photos.isError && <div className="px-4 py-3"><ErrorState compact error={photos.error} onRetry={() => void photos.refetch()} /></div>}
      {photos.data && items.length === 0 && <p className="px-4 py-3 text-soft">{may ? 'Photograph the set-up, each macro and the bent specimens: whoever reads the record later sees what was tested.' : 'No photo was kept with this coupon.'}</p>}
      {items.length > 0 && (
        <ul className="grid grid-cols-2 gap-x-4 gap-y-5 px-4 py-4 sm:grid-cols-3 xl:grid-cols-4">
          {items.map((photo, index) => (
            <li key={photo.id} className="min-w-0">
              <Thumb photo={photo} onOpen={() => setSeen(index)} />
              {may ? (
                <Captioned key={`${photo.caption} ${photo.tag}`} photo={photo} onChange={(change) => acts.change.mutate({ id: photo.id, ...change }, { onError: sayProblem })} onRemove={() => remove(photo)} />
              ) : (
                <p className="mt-1.5 break-words">
                  {photo.caption || <span className="text-soft">{photo.fileName}</span>}
                  {photo.tag && <span className="block text-sm text-soft">{photo.tag}</span>}
                </p>
              )}
              <p className="mt-1 text-xs text-soft">
                {photo.takenAt ? `taken ${moment(photo.takenAt)}` : `added ${moment(photo.uploadedAt)}`}
                <span className="block truncate" title={`SHA-256 ${photo.sha256}`}>
                  {fileSize(photo.bytes)} · SHA-256 {photo.sha256.slice(0, 12)}…
                </span>
              </p>
            </li>
          ))}
        </ul>
      )}
      {seen !== null && items[seen] && <PhotoViewer photos={items} at={seen} onMove={setSeen} onClose={() => setSeen(null)} />}
    </Sheet>
  )
}

function SendingRow({ file, onCancel, onDismiss }: { file: Sending; onCancel: () => void; onDismiss: () => void }) {
  if (file.state === 'refused') {
    return (
      <li role="alert" className="flex items-start justify-between gap-3 border-l-[3px] border-l-oxide bg-oxide-bg px-3 py-2">
        <p className="min-w-0 break-words">{file.refusal}</p>
        <button type="button" aria-label={`Dismiss ${file.name}`} className="flex size-7 shrink-0 items-center justify-center rounded" onClick={onDismiss}>
          <X size={15} aria-hidden="true" />
        </button>
      </li>
    )
  }
  return (
    <li>
      <Progress label={`${file.name}, ${fileSize(file.bytes)}${file.state === 'waiting' ? ', waiting' : file.share >= 1 ? ', being checked' : ''}`} {...(file.share >= 1 ? {} : { value: file.share })} onCancel={onCancel} />
    </li>
  )
}

function Thumb({ photo, onOpen }: { photo: Photo; onOpen: () => void }) {
  const name = photo.caption || photo.fileName
  const frame = 'flex aspect-[4/3] w-full items-center justify-center overflow-hidden border border-rule bg-paper'
  if (!photo.hasThumbnail) {
    return (
      <a href={hrefOf('readPhoto', { id: photo.id })} className={`${frame} flex-col gap-1.5 text-soft hover:border-ink`} aria-label={`Open the paper ${name}`}>
        <FileText size={28} aria-hidden="true" />
        <span className="font-narrow font-semibold">PDF</span>
      </a>
    )
  }
  return (
    <button type="button" className={`${frame} hover:border-ink`} aria-label={`Look at ${name}`} onClick={onOpen}>
      <img src={hrefOf('readThumbnail', { id: photo.id })} alt="" loading="lazy" className="size-full object-cover" />
    </button>
  )
}

function Captioned({ photo, onChange, onRemove }: { photo: Photo; onChange: (change: { caption?: string; tag?: string }) => void; onRemove: () => void }) {
  const [caption, setCaption] = useState(photo.caption)
  const [tag, setTag] = useState(photo.tag)
  return (
    <div className="mt-1.5 space-y-1">
      <input className="box" aria-label={`Caption of ${photo.fileName}`} placeholder="Caption" maxLength={400} value={caption} onChange={(event) => setCaption(event.target.value)} onBlur={() => caption.trim() !== photo.caption && onChange({ caption: caption.trim() })} onKeyDown={(event) => event.key === 'Enter' && event.currentTarget.blur()} />
      <div className="flex gap-1">
        <input className="box" aria-label={`Tag of ${photo.fileName}`} placeholder="Tag, e.g. S2, macro" maxLength={80} value={tag} onChange={(event) => setTag(event.target.value)} onBlur={() => tag.trim() !== photo.tag && onChange({ tag: tag.trim() })} onKeyDown={(event) => event.key === 'Enter' && event.currentTarget.blur()} />
        <button type="button" aria-label={`Remove ${photo.fileName}`} className="flex size-9 shrink-0 items-center justify-center rounded text-soft hover:text-ink" onClick={onRemove}>
          <X size={15} aria-hidden="true" />
        </button>
      </div>
    </div>
  )
}
