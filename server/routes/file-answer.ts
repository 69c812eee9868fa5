import type { Response } from 'express'

/** A name that is safe in a header; the browser takes the UTF-8 form. */
const disposition = (how: 'inline' | 'attachment', name: string): string =>
  `${how}; filename="${name.replace(/[^\w. -]/g, '_')}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`)}`

export interface FileFacts {
  bytes: Buffer
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
    const { bytes, mediaType, name, how, sha256 } = this.facts
    res.set({
      'Content-Type': mediaType,
      'Content-Disposition': disposition(how, name),
      'X-Content-Type-Options': 'nosniff',
      'Content-Security-Policy': "default-src 'none'; sandbox",
      // Kept by the browser, asked about every time: a signed-out browser shows nothing.
      'Cache-Control': 'private, no-cache',
      ...(sha256 && { ETag: `"${sha256}"` }),
    })
    res.send(bytes)
  }
}
