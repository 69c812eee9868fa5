/** Files on their way to a coupon, one request a file, so that one that is refused does not hold back the others. */
import { useCallback, useRef, useState } from 'react'
import type { Photo } from '@shared/schemas/records.ts'
import { upload } from '@/lib/api.ts'
import { fileSize } from '@/lib/figures.ts'
import { asProblem } from '@/lib/problem.ts'

export interface Sending {
  id: number
  name: string
  bytes: number
  /** 0 to 1 */
  share: number
  state: 'waiting' | 'sending' | 'refused'
  /** Why it was refused, in a sentence. */
  refusal: string | null
}

const MOST_BYTES = 25 * 1024 * 1024
const ENDINGS = /\.(jpe?g|jpe|jfif|png|hei[cf]|hif|pdf)$/i
const KINDS = /^(image\/(jpeg|png|hei[cf])|application\/pdf)$/

/** What can be said of a file before a byte is sent; null where only its content can tell. */
export function refusalOf({ name, size, type }: Pick<File, 'name' | 'size' | 'type'>): string | null {
  if (size === 0) return `${name} is empty. Choose the file again; it may not have been copied whole.`
  if (size > MOST_BYTES) return `${name} is ${fileSize(size)}; at most 25 MB are taken. Make the picture smaller, or split the paper.`
  if (!KINDS.test(type) && !ENDINGS.test(name)) return `${name} is not a photo or a paper that is kept here. Photos are kept as JPEG, PNG or HEIC, papers as PDF.`
  return null
}

/** Sends files one after the other; progress and refusals stand in `files` until they are dismissed. */
export function useUploads(couponId: string, onAdded: (photos: Photo[]) => void): { files: readonly Sending[]; send: (files: readonly File[]) => void; cancel: (id: number) => void; dismiss: (id: number) => void } {
  const [files, setFiles] = useState<readonly Sending[]>([])
  const next = useRef(1)
  const line = useRef<Promise<void>>(Promise.resolve())
  const stops = useRef(new Map<number, AbortController>())
  const put = useCallback((id: number, part: Partial<Sending>) => setFiles((before) => before.map((one) => (one.id === id ? { ...one, ...part } : one))), [])
  const dismiss = useCallback((id: number) => setFiles((before) => before.filter((one) => one.id !== id)), [])

  const transfer = useCallback(
    async (id: number, file: File, stop: AbortController) => {
      if (stop.signal.aborted) return
      put(id, { state: 'sending' })
      try {
        const { items } = await upload('addPhotos', { params: { id: couponId }, files: [file], signal: stop.signal, onProgress: (share) => put(id, { share }) })
        dismiss(id)
        onAdded(items)
      } catch (error) {
        if (error instanceof DOMException && error.name === 'AbortError') return dismiss(id)
        put(id, { state: 'refused', refusal: asProblem(error).message })
      } finally {
        stops.current.delete(id)
      }
    },
    [couponId, dismiss, onAdded, put],
  )

  const send = useCallback(
    (chosen: readonly File[]) => {
      for (const file of chosen) {
        const id = next.current++
        const refusal = refusalOf(file)
        setFiles((before) => [...before, { id, name: file.name, bytes: file.size, share: 0, state: refusal ? 'refused' : 'waiting', refusal }])
        if (refusal) continue
        const stop = new AbortController()
        stops.current.set(id, stop)
        line.current = line.current.then(() => transfer(id, file, stop))
      }
    },
    [transfer],
  )
  const cancel = useCallback(
    (id: number) => {
      stops.current.get(id)?.abort()
      stops.current.delete(id)
      dismiss(id)
    },
    [dismiss],
  )
  return { files, send, cancel, dismiss }
}
