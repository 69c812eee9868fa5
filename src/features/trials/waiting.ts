/** Sends beads that wait, in the order in which they were welded; what fails for want of a network is tried again by itself. */
import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useEffect, useRef, useState } from 'react'
import { sayProblem } from '@/components/toast.tsx'
import { call, upload } from '@/lib/api.ts'
import { retryDelay } from '@/lib/draft/saving.ts'
import { asProblem } from '@/lib/problem.ts'
import { trialQuery } from './api.ts'
import { dropPictures, heldPictures, keepWaiting, readWaiting, type WaitingBead } from './kept.ts'

export interface Waiting {
  beads: readonly WaitingBead[]
  /** Tries since the last success. */
  failures: number
  sendNow: () => void
  /** Takes a bead off the line, to correct or to drop it. */
  take: (id: string) => void
}

/** Beads of one trial that wait on this device. */
export function useWaiting(personId: string, trialId: string): Waiting {
  const client = useQueryClient()
  const [beads, setBeads] = useState<readonly WaitingBead[]>(() => readWaiting(personId, trialId))
  const [failures, setFailures] = useState(0)
  const busy = useRef(false)

  const put = useCallback(
    (next: readonly WaitingBead[]) => {
      keepWaiting(personId, trialId, next)
      setBeads(next)
    },
    [personId, trialId],
  )

  const send = useCallback(async () => {
    if (busy.current) return
    busy.current = true
    try {
      for (const bead of readWaiting(personId, trialId)) {
        if (bead.refusal !== null) continue
        try {
          const stored = await call('addBead', { params: { id: trialId }, body: { id: bead.id, content: bead.content } })
          client.setQueryData(trialQuery(trialId).queryKey, (trial) => (trial && !trial.beads.some(({ id }) => id === stored.id) ? { ...trial, beads: [...trial.beads, stored] } : trial))
          put(readWaiting(personId, trialId).filter(({ id }) => id !== bead.id))
          setFailures(0)
          const files = heldPictures(bead.id)
          if (files.length > 0) {
            // The bead is kept whatever becomes of its pictures.
            await upload('addBeadPhotos', { params: { id: bead.id }, files }).catch(sayProblem)
            dropPictures(bead.id)
          }
          await client.invalidateQueries({ queryKey: trialQuery(trialId).queryKey })
          void client.invalidateQueries({ queryKey: ['listTrials'] })
        } catch (error) {
          const problem = asProblem(error)
          if (problem.status >= 400 && problem.status < 500 && ![401, 408, 429].includes(problem.status)) {
            put(readWaiting(personId, trialId).map((one) => (one.id === bead.id ? { ...one, refusal: problem.message } : one)))
            continue
          }
          setFailures((count) => count + 1)
          return
        }
      }
    } finally {
      busy.current = false
    }
  }, [client, personId, put, trialId])

  const open = beads.some(({ refusal }) => refusal === null)
  useEffect(() => {
    if (!open) return
    const timer = setTimeout(() => void send(), failures === 0 ? 0 : retryDelay(failures))
    const online = () => void send()
    window.addEventListener('online', online)
    return () => {
      clearTimeout(timer)
      window.removeEventListener('online', online)
    }
  }, [open, failures, send])

  return { beads, failures, sendNow: () => void send(), take: (id) => put(readWaiting(personId, trialId).filter((one) => one.id !== id)) }
}
