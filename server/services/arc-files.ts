import { createHash, randomUUID } from 'node:crypto'
import type { Readable } from 'node:stream'
import { ArcReader, type ArcReading } from '@shared/arc-data/reader.ts'
import type { ArcChoice, ArcLayout, ArcPlot } from '@shared/schemas/arc-data.ts'
import type { Storage } from '../routes/mount.ts'

export interface KeptRecording extends ArcReading {
  name: string
  storageKey: string
  bytes: number
  sha256: string
}

/**
 * Writes a recording to storage and reads it on the way, piece by piece. A piece of 64 kB takes about a millisecond to read, so other requests
 * are answered in between and no thread of its own is needed.
 * @throws ArcDataError when it can't be read; then nothing stays in storage
 */
export async function keepRecording(storage: Storage, organizationId: string, { name, stream, choice }: { name: string; stream: Readable; choice: ArcChoice }): Promise<KeptRecording> {
  const storageKey = `${organizationId}/arc-data/${randomUUID()}.csv`
  const hash = createHash('sha256')
  const reader = new ArcReader({ choice })
  let bytes = 0
  let reading: ArcReading | undefined
  await storage.putStream(
    storageKey,
    (async function* () {
      // Not destroyed when a row is refused: the rest of a form still has to be taken in before its sender hears the answer.
      for await (const piece of stream.iterator({ destroyOnReturn: false }) as AsyncIterable<Uint8Array>) {
        hash.update(piece)
        bytes += piece.length
        reader.push(piece)
        yield piece
      }
      // Before the file is kept for good: one that can't be read never is.
      reading = reader.finish()
    })(),
  )
  if (!reading) throw new Error('a recording was kept without having been read')
  return { ...reading, name, storageKey, bytes, sha256: hash.digest('hex') }
}

/**
 * The plot of a part of a kept recording, read again.
 * @param isWanted asked between pieces; false ends the reading early
 */
export async function plotWindow(stream: Readable, layout: ArcLayout, window: { from: number; to: number }, isWanted: () => boolean): Promise<ArcPlot> {
  const reader = new ArcReader({ layout, window })
  for await (const piece of stream) {
    reader.push(piece as Uint8Array)
    if (reader.done || !isWanted()) break
  }
  return reader.finish().plot
}
