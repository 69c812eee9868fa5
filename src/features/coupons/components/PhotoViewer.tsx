import { ChevronLeft, ChevronRight, X } from 'lucide-react'
import { Button as AriaButton, Dialog, Modal, ModalOverlay } from 'react-aria-components'
import type { Photo } from '@shared/schemas/records.ts'
import { hrefOf } from '@/lib/api.ts'
import { fileSize, moment } from '@/lib/figures.ts'

const KEY = 'flex size-12 shrink-0 items-center justify-center rounded border border-bar-soft text-bar-text hover:bg-bar-raised disabled:opacity-35'
/** What every browser draws; a HEIC is shown by its JPEG. */
const DRAWN = ['image/jpeg', 'image/png']

/** One photo over the whole window: arrow keys go on, Esc closes. */
export function PhotoViewer({ photos, at, onMove, onClose }: { photos: readonly Photo[]; at: number; onMove: (at: number) => void; onClose: () => void }) {
  const shown = photos.map((photo, index) => ({ photo, index })).filter(({ photo }) => photo.hasThumbnail)
  const place = shown.findIndex(({ index }) => index === at)
  const photo = photos[at]
  if (!photo) return null
  const go = (by: 1 | -1) => {
    const next = shown[place + by]
    if (next) onMove(next.index)
  }
  return (
    <ModalOverlay isOpen onOpenChange={(open) => !open && onClose()} isDismissable className="no-print fixed inset-0 z-40 bg-bar text-bar-text">
      <Modal className="size-full">
        <Dialog aria-label={`Photo ${place + 1} of ${shown.length}: ${photo.caption || photo.fileName}`} className="on-bar flex size-full flex-col outline-none">
          {/* Arrow keys reach the dialog from whatever in it has the focus. */}
          <div
            role="presentation"
            className="flex size-full flex-col"
            onKeyDown={(event) => {
              if (event.key === 'ArrowRight') go(1)
              if (event.key === 'ArrowLeft') go(-1)
            }}
          >
            <header className="flex items-center justify-between gap-3 px-3 py-2">
              <p className="font-narrow text-xl font-semibold">
                {place + 1} <span className="text-bar-soft">of {shown.length}</span>
              </p>
              <AriaButton slot="close" aria-label="Close" autoFocus className={KEY}>
                <X size={22} aria-hidden="true" />
              </AriaButton>
            </header>
            <div className="flex min-h-0 grow items-center gap-2 px-3">
              <button type="button" aria-label="The photo before" disabled={place <= 0} className={`${KEY} max-sm:hidden`} onClick={() => go(-1)}>
                <ChevronLeft size={24} aria-hidden="true" />
              </button>
              <div className="flex h-full min-w-0 grow items-center justify-center">
                <img key={photo.id} src={hrefOf(DRAWN.includes(photo.mediaType) ? 'readPhoto' : 'readThumbnail', { id: photo.id })} alt={photo.caption || photo.fileName} className="max-h-full max-w-full object-contain" />
              </div>
              <button type="button" aria-label="The next photo" disabled={place >= shown.length - 1} className={`${KEY} max-sm:hidden`} onClick={() => go(1)}>
                <ChevronRight size={24} aria-hidden="true" />
              </button>
            </div>
            <footer className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2 px-4 py-3">
              <div className="min-w-0">
                <p className="text-lg break-words">{photo.caption || photo.fileName}</p>
                <p className="text-sm break-all text-bar-soft">
                  {[photo.tag, photo.takenAt && `taken ${moment(photo.takenAt)}`, photo.width && `${photo.width} × ${photo.height}`, fileSize(photo.bytes), `added by ${photo.uploadedBy.name}`].filter(Boolean).join(' · ')}
                  <span className="block">SHA-256 {photo.sha256}</span>
                </p>
              </div>
              <div className="flex items-center gap-2">
                <button type="button" aria-label="Back" disabled={place <= 0} className={`${KEY} sm:hidden`} onClick={() => go(-1)}>
                  <ChevronLeft size={24} aria-hidden="true" />
                </button>
                <button type="button" aria-label="On" disabled={place >= shown.length - 1} className={`${KEY} sm:hidden`} onClick={() => go(1)}>
                  <ChevronRight size={24} aria-hidden="true" />
                </button>
                <a href={hrefOf('readPhoto', { id: photo.id })} download={photo.fileName} className="inline-flex min-h-12 items-center underline underline-offset-4">
                  Keep the original
                </a>
              </div>
            </footer>
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  )
}
