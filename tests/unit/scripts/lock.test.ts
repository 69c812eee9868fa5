import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { isAlive, processMark, withLock } from '../../../scripts/lib/lock.mjs'

let folder: string
beforeEach(() => { folder = mkdtempSync(path.join(tmpdir(), 'sidebend-lock-')) })
afterEach(() => rmSync(folder, { recursive: true, force: true }))

describe('withLock', () => {
  const lock = () => path.join(folder, 'lock')

  it('lets one at a time in', async () => {
    let inside = 0
    let most = 0
    const work = async () => {
      most = Math.max(most, ++inside)
      await new Promise((resolve) => setTimeout(resolve, 20))
      inside--
    }
    await Promise.all([1, 2, 3].map(() => withLock(lock(), work)))
    expect(most).toBe(1)
  })

  it.each([
    ['a process that is gone', '999999999 1'],
    ['an earlier process with an id that is used again', `${process.pid} 1`],
    ['a writer that was killed before it wrote', ''],
  ])('takes over from %s', async (_what, text) => {
    writeFileSync(lock(), text)
    expect(await withLock(lock(), () => 'in', { seconds: 10 })).toBe('in')
  })

  it('names the process that holds it when the wait is over', async () => {
    writeFileSync(lock(), `${process.pid} ${processMark(process.pid) ?? ''}`)
    await expect(withLock(lock(), () => 'in', { seconds: 0 })).rejects.toThrow(`process ${process.pid}`)
  })

  it('is let go when the work fails', async () => {
    await expect(withLock(lock(), () => { throw new Error('broke') })).rejects.toThrow('broke')
    expect(await withLock(lock(), () => 'in', { seconds: 0 })).toBe('in')
  })
})

describe('isAlive', () => {
  it('tells this process from one that had its id before', () => {
    expect(isAlive(process.pid)).toBe(true)
    expect(isAlive(process.pid, processMark(process.pid))).toBe(true)
    expect(isAlive(process.pid, '1')).toBe(false)
    expect(isAlive(999_999_999)).toBe(false)
  })
})
