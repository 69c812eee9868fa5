import { mkdirSync, mkdtempSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { hashFiles, unlessStamped } from '../../../scripts/lib/hash.mjs'

let folder: string
beforeEach(() => { folder = mkdtempSync(path.join(tmpdir(), 'sidebend-hash-')) })
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const write = (name: string, text: string) => {
  mkdirSync(path.dirname(path.join(folder, name)), { recursive: true })
  writeFileSync(path.join(folder, name), text)
}

describe('hashFiles', () => {
  it('is the same for the same files, in whatever order they are named', () => {
    write('src/a.ts', 'one')
    write('src/deep/b.ts', 'two')
    write('index.html', 'three')
    const once = hashFiles(folder, ['src', 'index.html'])
    expect(once).toMatch(/^[0-9a-f]{64}$/)
    expect(hashFiles(folder, ['index.html', 'src'])).toBe(once)
  })

  it.each([
    ['a changed file', () => write('src/a.ts', 'changed')],
    ['a new file', () => write('src/c.ts', '')],
    ['a renamed file', () => renameSync(path.join(folder, 'src/a.ts'), path.join(folder, 'src/z.ts'))],
    ['a removed file', () => rmSync(path.join(folder, 'src/a.ts'))],
    ['text moved from one file to the next', () => { write('src/a.ts', 'on'); write('src/b.ts', 'etwo') }],
  ])('differs after %s', (_what, change) => {
    write('src/a.ts', 'one')
    write('src/b.ts', 'two')
    const before = hashFiles(folder, ['src'])
    change()
    expect(hashFiles(folder, ['src'])).not.toBe(before)
  })

  it('leaves out what it is not told of, and takes a missing name as absent', () => {
    write('src/a.ts', 'one')
    const before = hashFiles(folder, ['src', 'public'])
    write('other.ts', 'x')
    expect(hashFiles(folder, ['src', 'public'])).toBe(before)
    write('public/mark.svg', '<svg/>')
    expect(hashFiles(folder, ['src', 'public'])).not.toBe(before)
  })
})

describe('unlessStamped', () => {
  const stamp = () => path.join(folder, 'dist/client.stamp')

  it('works once for one hash and again for another', async () => {
    let times = 0
    const work = () => { times++ }
    expect(await unlessStamped(stamp(), 'h1', work)).toBe(true)
    expect(await unlessStamped(stamp(), 'h1', work)).toBe(false)
    expect(await unlessStamped(stamp(), 'h2', work)).toBe(true)
    expect(times).toBe(2)
    expect(readFileSync(stamp(), 'utf8')).toBe('h2')
  })

  it('does work again that failed half way, even when the sources then go back', async () => {
    await unlessStamped(stamp(), 'h1', () => undefined)
    await expect(unlessStamped(stamp(), 'h2', () => { throw new Error('cut short') })).rejects.toThrow('cut short')
    expect(await unlessStamped(stamp(), 'h1', () => undefined)).toBe(true)
  })
})
