import { randomUUID } from 'node:crypto'
import { mkdir, open, readFile, rename, rm, type FileHandle } from 'node:fs/promises'
import path from 'node:path'
import type { Storage } from '../routes/mount.ts'
import { checkedKey, StoredFileMissing } from './storage.ts'

const isMissing = (error: unknown): boolean => (error as { code?: unknown }).code === 'ENOENT'

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

/** Files under one folder. A file is written aside, synced and renamed, so a crash leaves the old file or the new one, never half of one. */
export function diskStorage(root: string): Storage {
  const at = (key: string): string => path.join(root, ...checkedKey(key).split('/'))
  const write = async (file: string, fill: (handle: FileHandle) => Promise<void>): Promise<void> => {
    const folder = path.dirname(file)
    await mkdir(folder, { recursive: true, mode: 0o700 })
    const aside = path.join(folder, `.${randomUUID()}.part`)
    try {
      const handle = await open(aside, 'wx', 0o600)
      try {
        await fill(handle)
        await handle.sync()
      } finally {
        await handle.close()
      }
      await rename(aside, file)
    } catch (error) {
      await rm(aside, { force: true })
      throw error
    }
    await syncFolder(folder)
  }
  return {
    put: async (key, bytes) => write(at(key), (handle) => handle.writeFile(bytes)),
    // Not a write stream: with one write at a time the source waits for the disk, and what it throws is what the caller gets.
    putStream: async (key, source) =>
      write(at(key), async (handle) => {
        for await (const piece of source) await handle.appendFile(piece)
      }),
    open: async (key) => {
      try {
        return (await open(at(key), 'r')).createReadStream()
      } catch (error) {
        throw isMissing(error) ? new StoredFileMissing(key) : error
      }
    },
    get: async (key) => {
      try {
        return await readFile(at(key))
      } catch (error) {
        throw isMissing(error) ? new StoredFileMissing(key) : error
      }
    },
    remove: async (key) => {
      await rm(at(key), { force: true })
    },
  }
}
