/** Bytes of a text file as one byte a character: the separators and figures of a table are ASCII in every encoding taken here. */
import type { ArcLayout } from '../schemas/arc-data.ts'
import { ArcDataError } from './problem.ts'

export type Encoding = ArcLayout['encoding']

/**
 * The encoding of a file by its first bytes, and how many of them are its mark.
 * @throws ArcDataError when they are no text
 */
export function encodingOf(head: Uint8Array): { encoding: Encoding; mark: number } {
  const [a, b, c] = head
  if (a === 0xff && b === 0xfe) return { encoding: 'utf-16le', mark: 2 }
  if (a === 0xfe && b === 0xff) return { encoding: 'utf-16be', mark: 2 }
  const mark = a === 0xef && b === 0xbb && c === 0xbf ? 3 : 0
  const looked = head.subarray(mark, 2048)
  let even = 0
  let odd = 0
  let control = 0
  looked.forEach((byte, index) => {
    if (byte === 0 && index % 2 === 0) even++
    else if (byte === 0) odd++
    else if (byte < 32 && byte !== 9 && byte !== 10 && byte !== 13) control++
  })
  const half = looked.length / 2
  if (odd > half * 0.7 && even < half * 0.1) return { encoding: 'utf-16le', mark }
  if (even > half * 0.7 && odd < half * 0.1) return { encoding: 'utf-16be', mark }
  // A stray byte or two happens in loggers' exports; more is no text.
  if (even + odd + control > 2 + looked.length / 50) throw new ArcDataError('This is not a text file: it holds bytes that no table of figures has. Export the recording as CSV or text and choose that file.')
  return { encoding: isUtf8(head) ? 'utf-8' : 'windows-1252', mark }
}

function isUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: true })
    return true
  } catch {
    return false
  }
}

/** Takes every second byte of UTF-16, whatever the pieces; a character beyond Latin-1 becomes `?`. Other encodings pass as they are. */
export class Narrower {
  private readonly wide: boolean
  private readonly lowFirst: boolean
  private kept = -1
  constructor(encoding: Encoding) {
    this.wide = encoding === 'utf-16le' || encoding === 'utf-16be'
    this.lowFirst = encoding === 'utf-16le'
  }

  push(bytes: Uint8Array): Uint8Array {
    if (!this.wide || bytes.length === 0) return bytes
    const narrow = new Uint8Array((bytes.length + (this.kept < 0 ? 0 : 1)) >> 1)
    let at = 0
    let from = 0
    const put = (first: number, second: number) => {
      const [low, high] = this.lowFirst ? [first, second] : [second, first]
      narrow[at++] = high === 0 ? low : 63
    }
    if (this.kept >= 0) put(this.kept, bytes[from++] ?? 0)
    for (; from + 1 < bytes.length; from += 2) put(bytes[from] ?? 0, bytes[from + 1] ?? 0)
    this.kept = from < bytes.length ? (bytes[from] ?? 0) : -1
    return narrow
  }
}
