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
