/** Where files are kept: originals, thumbnails, released PDFs. One interface; disk today. */
export interface Storage {
  /** Keeps the bytes under the key for good before it resolves; a second put of a key replaces the first. */
  put: (key: string, bytes: Uint8Array) => Promise<void>
  /** @throws StoredFileMissing when nothing is kept under the key */
  get: (key: string) => Promise<Buffer>
  /** Removing what is not there is no error. */
  remove: (key: string) => Promise<void>
}

export class StoredFileMissing extends Error {
  constructor(key: string) {
    super(`nothing is stored under ${key}`)
  }
}

const KEY = /^[a-z0-9][a-z0-9-]*(\/[a-z0-9][a-z0-9-]*)*(\.[a-z0-9]{1,8})?$/

/** Keys are made by the program of letters, digits, hyphens and slashes; anything else is a fault of ours. @throws RangeError */
export function checkedKey(key: string): string {
  if (key.length > 200 || !KEY.test(key)) throw new RangeError(`not a storage key: ${JSON.stringify(key.slice(0, 80))}`)
  return key
}
