import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as sleep } from 'node:timers/promises'
import { Refusal } from './steps.mjs'

/**
 * Start time of a process since boot, in clock ticks: with the id it names one process, even after ids are used again.
 * @param {number} pid
 * @returns {string | null} null when there is no such process (or no /proc to ask)
 */
export function processMark(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8')
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
    // Ended, and only waiting for its parent to take notice.
    if (fields[0] === 'Z' || fields[0] === 'X') return null
    return fields[19] ?? null
  } catch {
    return null
  }
}

/**
 * @param {number} pid
 * @param {string | null} [mark] as processMark gave it; omitted: any process with that id
 * @returns {boolean}
 */
export function isAlive(pid, mark = null) {
  try {
    process.kill(pid, 0)
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EPERM') return false
  }
  const now = processMark(pid)
  if (now === null && existsSync('/proc/self/stat')) return false
  return !mark || now === mark
}

/** @param {string} file */
function holder(file) {
  try {
    const [pid, mark] = readFileSync(file, 'utf8').split(' ')
    return Number(pid) > 0 ? { pid: Number(pid), mark: mark ?? null } : null
  } catch {
    return null
  }
}

/**
 * Lets one process at a time do `work`; a lock whose holder has died is taken over.
 * @template T
 * @param {string} file
 * @param {() => T | Promise<T>} work
 * @param {{ seconds?: number }} [options] how long to wait for another holder
 * @returns {Promise<T>}
 * @throws {Refusal} when the other holder does not finish in time
 */
export async function withLock(file, work, { seconds = 120 } = {}) {
  mkdirSync(path.dirname(file), { recursive: true })
  const own = `${process.pid} ${processMark(process.pid) ?? ''}`
  const end = Date.now() + seconds * 1000
  for (let unread = 0; ; ) {
    try {
      writeFileSync(file, own, { flag: 'wx' })
      break
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error
    }
    const other = holder(file)
    // An empty lock is one that is being written, or one whose writer was killed at that very moment.
    unread = other ? 0 : unread + 1
    if ((other && !isAlive(other.pid, other.mark)) || unread > 20) rmSync(file, { force: true })
    else if (Date.now() > end) throw new Refusal(`Another run (process ${other?.pid ?? '?'}) has held ${file} for ${seconds} s. Stop that run, or delete the file if there is none, and try again.`)
    else await sleep(100)
  }
  try {
    return await work()
  } finally {
    rmSync(file, { force: true })
  }
}
