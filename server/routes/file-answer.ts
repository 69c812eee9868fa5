import { Readable, pipeline } from 'node:stream'
import type { Response } from 'express'

/** A name that is safe in a header; the browser takes the UTF-8 form. */
const disposition = (how: 'inline' | 'attachment', name: string): string =>
  `${how}; filename="${name.replace(/[^\w. -]/g, '_')}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`)}`

export interface FileFacts {
  /** A stream for what is too large to hold; `length` then says how long it is. */
  bytes: Buffer | Readable
  length?: number
  mediaType: string
  name: string
  how: 'inline' | 'attachment'
  /** Hash of the bytes; a browser that has them is told so. */
  sha256?: string
}

/**
 * A file as a route's answer, sent once its transaction is committed. Type and name are ours, the browser may not guess,
 * and nothing in the file may run or load anything.
 */
export class FileAnswer {
  readonly facts: FileFacts
  constructor(facts: FileFacts) {
    this.facts = facts
  }

  send(res: Response): void {
    const { bytes, length, mediaType, name, how, sha256 } = this.facts
    res.set({
      'Content-Type': mediaType,
      'Content-Disposition': disposition(how, name),
      'X-Content-Type-Options': 'nosniff',
      'Content-Security-Policy': "default-src 'none'; sandbox",
      // Kept by the browser, asked about every time: a signed-out browser shows nothing.
      'Cache-Control': 'private, no-cache',
      ...(sha256 && { ETag: `"${sha256}"` }),
    })
    if (!(bytes instanceof Readable)) {
      res.send(bytes)
      return
    }
    if (res.req.fresh) {
      bytes.destroy()
      res.status(304).end()
      return
    }
    if (length !== undefined) res.set('Content-Length', String(length))
    // A reader who leaves in the middle is no fault; one whom the disk fails sees the connection end short.
    pipeline(bytes, res, () => undefined)
  }
}
