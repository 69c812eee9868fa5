/** A recording on its way to the server: how its columns look, what a person says of them, how far it is. */
import { useCallback, useRef, useState } from 'react'
import { guessLayout, HEAD_BYTES, type LayoutGuess } from '@shared/arc-data/layout.ts'
import { ArcDataError } from '@shared/arc-data/problem.ts'
import type { ArcChoice, ArcRecording } from '@shared/schemas/arc-data.ts'
import { upload } from '@/lib/api.ts'
import { asProblem, type ProblemError } from '@/lib/problem.ts'

interface Preview {
  guess: LayoutGuess | null
  /** Why no table was found, in a sentence. */
  refusal: string | null
}

/** Three different columns to choose from: what is known stays, what is open takes the first that is free. */
export function columnsToStartFrom({ time = -1, current, voltage }: ArcChoice): { time: number; current: number; voltage: number } {
  const free = (...taken: readonly (number | undefined)[]) => [0, 1, 2].find((column) => !taken.includes(column)) ?? 0
  const first = current ?? free(time, voltage)
  const second = voltage === undefined || voltage === first ? free(first, time) : voltage
  return { time: time === first || time === second ? -1 : time, current: first, voltage: second }
}

/** What the first lines of a file say, read in the browser before a byte is sent. */
function previewOf(head: Uint8Array, whole: boolean, choice: ArcChoice): Preview {
  try {
    return { guess: guessLayout(head, choice, whole), refusal: null }
  } catch (error) {
    if (!(error instanceof ArcDataError)) throw error
    // Columns can still be chosen where only their meaning is open.
    if (error.asks !== 'columns') return { guess: null, refusal: error.message }
    try {
      const forced = guessLayout(head, { ...choice, ...columnsToStartFrom({ ...error.found, ...choice }) }, whole)
      return { guess: { ...forced, sure: false, doubts: [error.message] }, refusal: null }
    } catch {
      return { guess: null, refusal: error.message }
    }
  }
}

export interface Sending {
  file: File | null
  preview: Preview | null
  choice: ArcChoice
  /** 0 to 1 while it is sent; null else. */
  share: number | null
  problem: ProblemError | null
  take: (file: File) => Promise<void>
  choose: (change: ArcChoice) => void
  send: () => Promise<ArcRecording | null>
  cancel: () => void
}

export function useSending(): Sending {
  const [file, setFile] = useState<File | null>(null)
  const [head, setHead] = useState<{ bytes: Uint8Array; whole: boolean } | null>(null)
  const [choice, setChoice] = useState<ArcChoice>({})
  const [share, setShare] = useState<number | null>(null)
  const [problem, setProblem] = useState<ProblemError | null>(null)
  const stop = useRef<AbortController | null>(null)
  const take = useCallback(async (next: File) => {
    setProblem(null)
    setChoice({})
    setFile(next)
    const bytes = new Uint8Array(await next.slice(0, HEAD_BYTES).arrayBuffer())
    setHead({ bytes, whole: next.size <= HEAD_BYTES })
  }, [])
  const choose = useCallback((change: ArcChoice) => {
    setProblem(null)
    setChoice((before) => ({ ...before, ...change }))
  }, [])
  const send = useCallback(async () => {
    if (!file) return null
    const control = new AbortController()
    stop.current = control
    setProblem(null)
    setShare(0)
    try {
      return await upload('addArcRecording', { query: choice, files: [file], signal: control.signal, onProgress: setShare })
    } catch (error) {
      if (!(error instanceof DOMException && error.name === 'AbortError')) setProblem(asProblem(error))
      return null
    } finally {
      setShare(null)
    }
  }, [file, choice])
  const cancel = useCallback(() => stop.current?.abort(), [])
  return { file, preview: head && previewOf(head.bytes, head.whole, choice), choice, share, problem, take, choose, send, cancel }
}
