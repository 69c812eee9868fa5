import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { diskStorage } from '../../../../server/storage/disk.ts'
import type { Storage } from '../../../../server/routes/mount.ts'
import { StoredFileMissing } from '../../../../server/storage/storage.ts'

let root: string
let storage: Storage
beforeAll(async () => {
  root = await mkdtemp(path.join(tmpdir(), 'storage-'))
  storage = diskStorage(path.join(root, 'files'))
})
afterAll(() => rm(root, { recursive: true }))

describe('disk storage', () => {
  it('gives back the bytes that were put, and the newest of two', async () => {
    await storage.put('org-1/photos/a.jpg', Buffer.from([1, 2, 3]))
    await storage.put('org-1/photos/a.jpg', Buffer.from([4, 5]))
    expect([...(await storage.get('org-1/photos/a.jpg'))]).toEqual([4, 5])
  })

  it('leaves no part file behind', async () => {
    await storage.put('org-2/documents/b.pdf', Buffer.from('x'))
    expect(await readdir(path.join(root, 'files/org-2/documents'))).toEqual(['b.pdf'])
  })

  it('keeps a stream and gives one back; a source that throws leaves nothing', async () => {
    await storage.putStream('org-3/arc-data/a.csv', (async function* () {
      for (let at = 0; at < 5; at++) yield Promise.resolve(Buffer.from(`${at};`))
    })())
    expect(await readFile(path.join(root, 'files/org-3/arc-data/a.csv'), 'utf8')).toBe('0;1;2;3;4;')
    const pieces: Buffer[] = []
    for await (const piece of await storage.open('org-3/arc-data/a.csv')) pieces.push(piece as Buffer)
    expect(Buffer.concat(pieces).toString()).toBe('0;1;2;3;4;')
    await expect(storage.putStream('org-3/arc-data/b.csv', (async function* () {
      yield Promise.resolve(Buffer.from('half'))
      throw new Error('row 7')
    })())).rejects.toThrow('row 7')
    expect(await readdir(path.join(root, 'files/org-3/arc-data'))).toEqual(['a.csv'])
    await expect(storage.open('org-3/arc-data/b.csv')).rejects.toThrow(StoredFileMissing)
  })

  it('says which key is missing, and removes without complaint', async () => {
    await storage.put('org-1/c.pdf', Buffer.from('x'))
    await storage.remove('org-1/c.pdf')
    await storage.remove('org-1/c.pdf')
    await expect(storage.get('org-1/c.pdf')).rejects.toThrow(StoredFileMissing)
  })

  it.each(['../x', '/etc/passwd', 'a/../b', 'a//b', 'a/.b', 'A.jpg', '', 'a b', 'a/b.jpg/', 'a\u0000b', 'x'.repeat(201)])('refuses the key %j', async (key) => {
    await expect(storage.put(key, Buffer.from('x'))).rejects.toThrow(RangeError)
    await expect(storage.get(key)).rejects.toThrow(RangeError)
    await expect(storage.remove(key)).rejects.toThrow(RangeError)
    await expect(storage.open(key)).rejects.toThrow(RangeError)
  })
})
